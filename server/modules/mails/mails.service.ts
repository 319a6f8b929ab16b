import { PAGE_SIZE } from '../../../shared/schemas/paging'
import { ConflictError, NotFoundError } from '../../errors'
import { mailFile } from '../../mail/mail-file'
import type { ServerParts } from '../../parts'
import { type Author, recordAudit } from '../audit/record-audit'
import { countMails, findMail, listMails, type MailRow, updateMail } from './mails.queries'

type Parts = Pick<ServerParts, 'db' | 'now' | 'mail'>

export function pageOfMails({ db }: Parts, page: number) {
  const items = listMails(db, { offset: (page - 1) * PAGE_SIZE, limit: PAGE_SIZE })
  return { items, page, pageSize: PAGE_SIZE, total: countMails(db) }
}

/**
 * The .eml file of a mail that did not leave. Its link opens something, so that reading it is noted.
 *
 * @throws NotFoundError, or ConflictError for a mail that was sent: its content is not kept.
 */
export async function readMailFile(parts: Parts, author: Author, id: string): Promise<Buffer> {
  const mail = parts.db.transaction((tx) => {
    const found = mailOf({ ...parts, db: tx }, id)
    if (found.state === 'sent') throw new ConflictError('mail: it was sent; its text is not kept')
    recordAudit(tx, author, parts.now(), about('mail.read', found))
    return found
  })
  return mailFile(mail, parts.mail.from)
}

/**
 * Puts a mail that did not leave back into the queue.
 *
 * @throws NotFoundError, or ConflictError if it was sent or no SMTP server is set.
 */
export function retryMail(parts: Parts, author: Author, id: string): void {
  parts.db.transaction((tx) => {
    const mail = mailOf({ ...parts, db: tx }, id)
    if (mail.state === 'sent') throw new ConflictError('mail: it was sent already')
    if (!parts.mail.isSmtp) {
      throw new ConflictError('mail: no SMTP server is set; the mail stays in the outbox')
    }
    updateMail(tx, id, { state: 'waiting', tries: 0, nextTryAt: parts.now() })
    recordAudit(tx, author, parts.now(), about('mail.retried', mail))
  })
}

function mailOf({ db }: Pick<Parts, 'db'>, id: string): MailRow {
  const mail = findMail(db, id)
  if (!mail) throw new NotFoundError(`mail: "${id}" does not exist`)
  return mail
}

function about(action: string, { id, subject }: MailRow) {
  return { action, subjectType: 'mail', subjectId: id, subjectName: subject }
}
