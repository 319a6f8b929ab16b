-- The audit trail is append-only: the database itself refuses change and deletion.
CREATE TRIGGER audit_entries_no_update BEFORE UPDATE ON audit_entries
BEGIN
  SELECT RAISE(ABORT, 'the audit trail is append-only');
END;
--> statement-breakpoint
CREATE TRIGGER audit_entries_no_delete BEFORE DELETE ON audit_entries
BEGIN
  SELECT RAISE(ABORT, 'the audit trail is append-only');
END;
