import type { Clock } from '../../clock'
import type { Db } from '../../db/client'
import { write } from '../../db/write'
import { type AuditNote, recordAudit } from '../audit/record-audit'
import { touchProject } from './projects.queries'

/** What the services of projects work with. */
export interface ProjectWork {
  readonly db: Db
  readonly now: Clock
}

/** Whoever changes something: always an account, because rows name who made them. */
export interface Doer {
  readonly accountId: string
  readonly name: string
}

/** One change under way: its transaction, who makes it and when. */
export interface Deed {
  readonly tx: Db
  readonly by: Doer
  readonly at: number
}

/** Makes a change as a whole, or not at all. */
export function change<Result>(
  { db, now }: ProjectWork,
  { accountId, name }: Doer,
  make: (deed: Deed) => Result,
): Result {
  return write(db, (tx) => make({ tx, by: { accountId, name }, at: now() }))
}

/**
 * Writes the audit trail of a change in a project, and lets the project count as changed; its
 * version stays, because nothing of its own fields did change.
 */
export function noteChange(
  { tx, by, at }: Deed,
  projectId: string,
  note: Omit<AuditNote, 'projectId'>,
): void {
  touchProject(tx, { id: projectId, updatedAt: at, updatedBy: by.accountId })
  recordAudit(tx, by, at, { ...note, projectId })
}
