import type { Db } from '../../db/client'
import { composeMail } from '../../mail/compose-mail'
import { queueMail } from '../../mail/mail-queue'
import { momentText } from '../../mail/moment-text'
import type { ServerParts } from '../../parts'

/** Tells the owner of an account that its password is another one now. */
export function queuePasswordChanged(
  db: Db,
  { mail, appUrl, now }: Pick<ServerParts, 'mail' | 'appUrl' | 'now'>,
  { email, name }: { readonly email: string | null; readonly name: string },
): void {
  if (email === null) return
  const values = { name, changed: momentText(now()) }
  const content = composeMail('passwordChanged', { appUrl, values })
  queueMail(db, mail, now(), { recipient: email, ...content })
}
