import { newId } from '../auth/tokens'
import type { Db } from '../db/client'
import { insertMail, listDueMails, type MailRow, updateMail } from '../modules/mails/mails.queries'
import type { MailContent } from './compose-mail'
import type { MailSender } from './smtp-sender'

const MINUTE = 60_000

/** Mails of one run; the rest follows in the next one. */
const MOST_AT_ONCE = 20

/** Tries before a mail counts as failed: with the delays below about seven hours. */
export const MOST_TRIES = 12

/** Delay after a failed try: one minute, doubling, an hour at most [ms]. */
export function delayAfter(tries: number): number {
  return Math.min(60 * MINUTE, MINUTE * 2 ** (tries - 1))
}

/** How mail leaves: over SMTP, or not at all, kept in the local outbox. */
export interface MailWay {
  readonly isSmtp: boolean
  readonly from: string
}

export interface OutgoingMail extends MailContent {
  readonly recipient: string
}

/** Puts a mail into the queue, in the transaction of the change that it tells about. */
export function queueMail(db: Db, way: MailWay, at: number, mail: OutgoingMail): string {
  const id = newId()
  insertMail(db, {
    id,
    ...mail,
    state: way.isSmtp ? 'waiting' : 'kept',
    nextTryAt: way.isSmtp ? at : null,
    createdAt: at,
  })
  return id
}

export interface QueueParts {
  readonly db: Db
  readonly sender: Pick<MailSender, 'send'>
  readonly now: () => number
}

/** Sends what is due, one after the other. A mail may arrive twice, but is never lost. */
export async function runMailQueue(parts: QueueParts): Promise<void> {
  for (const mail of listDueMails(parts.db, parts.now(), MOST_AT_ONCE)) await trySend(parts, mail)
}

async function trySend({ db, sender, now }: QueueParts, mail: MailRow): Promise<void> {
  const tries = mail.tries + 1
  try {
    await sender.send(mail)
    // What was sent is not kept: it holds a link that only its reader may use.
    const emptied = { text: '', html: '', nextTryAt: null, lastError: '' }
    updateMail(db, mail.id, { ...emptied, state: 'sent', tries, sentAt: now() })
  } catch (error) {
    const isOver = isRefusedForGood(error) || tries >= MOST_TRIES
    updateMail(db, mail.id, {
      state: isOver ? 'failed' : 'waiting',
      tries,
      nextTryAt: isOver ? null : now() + delayAfter(tries),
      lastError: describe(error),
    })
  }
}

/** The receiving server will not take this mail, however often it is tried. */
function isRefusedForGood(error: unknown): boolean {
  if (!(error instanceof Error)) return false
  const { code, responseCode } = error as { code?: unknown; responseCode?: unknown }
  const isAboutTheMail = code === 'EENVELOPE' || code === 'EMESSAGE'
  return isAboutTheMail && Number(responseCode) >= 500
}

function describe(error: unknown): string {
  return (error instanceof Error ? error.message : String(error)).slice(0, 300)
}
