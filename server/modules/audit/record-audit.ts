import type { Db } from '../../db/client'
import { insertAuditEntry } from './audit.queries'

/** Who acts: an account, or the program itself. */
export interface Author {
  readonly accountId: string | null
  readonly name: string
}

/** The program itself, for seeds and one-time links. */
export const PROGRAM: Author = { accountId: null, name: 'Toehold' }

/** Whoever sends a request without being signed in. */
export const ANONYMOUS: Author = { accountId: null, name: '' }

/** One line of the audit trail. */
export interface AuditNote {
  /** Verb in the past, with its subject: `scenario.saved`, `person.deactivated`. */
  readonly action: string
  readonly subjectType: string
  readonly subjectId: string
  readonly subjectName?: string
  readonly projectId?: string | null
  readonly fromVersion?: number | null
  readonly toVersion?: number | null
  /** Whatever else a reader needs; never a password or a token. */
  readonly detail?: Readonly<Record<string, unknown>>
}

/**
 * Writes a line of the audit trail. Services call it inside the transaction that makes the change, so
 * that neither is without the other.
 */
export function recordAudit(db: Db, author: Author, at: number, note: AuditNote): void {
  insertAuditEntry(db, {
    at,
    actorId: author.accountId,
    actorName: author.name,
    action: note.action,
    subjectType: note.subjectType,
    subjectId: note.subjectId,
    subjectName: note.subjectName ?? '',
    projectId: note.projectId ?? null,
    fromVersion: note.fromVersion ?? null,
    toVersion: note.toVersion ?? null,
    detail: note.detail ?? {},
  })
}
