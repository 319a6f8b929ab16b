import { and, asc, count, desc, eq, lte } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { mails } from '../../db/schema'

export type MailRow = typeof mails.$inferSelect

export function insertMail(db: Db, mail: typeof mails.$inferInsert): void {
  db.insert(mails).values(mail).run()
}

export function findMail(db: Db, id: string): MailRow | undefined {
  return db.select().from(mails).where(eq(mails.id, id)).get()
}

export function updateMail(db: Db, id: string, change: Partial<MailRow>): void {
  db.update(mails).set(change).where(eq(mails.id, id)).run()
}

/** Mails whose next try is due, the oldest first. */
export function listDueMails(db: Db, now: number, most: number): MailRow[] {
  return db
    .select()
    .from(mails)
    .where(and(eq(mails.state, 'waiting'), lte(mails.nextTryAt, now)))
    .orderBy(asc(mails.nextTryAt), asc(mails.createdAt))
    .limit(most)
    .all()
}

export function listMails(db: Db, { offset, limit }: { offset: number; limit: number }) {
  const { id, recipient, subject, state, tries, lastError, createdAt, sentAt } = mails
  return db
    .select({ id, recipient, subject, state, tries, lastError, createdAt, sentAt })
    .from(mails)
    .orderBy(desc(createdAt), desc(id))
    .limit(limit)
    .offset(offset)
    .all()
}

export function countMails(db: Db): number {
  return db.select({ total: count() }).from(mails).get()?.total ?? 0
}

export function deleteMail(db: Db, id: string): void {
  db.delete(mails).where(eq(mails.id, id)).run()
}

export function deleteMailsTo(db: Db, recipient: string): void {
  db.delete(mails).where(eq(mails.recipient, recipient)).run()
}
