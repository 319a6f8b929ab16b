import type { Db } from '../../server/db/client'
import { mails } from '../../server/db/schema'

/** The path of the link in the newest mail to somebody, such as `/invite/…`. */
export function linkFor(db: Db, recipient: string): string {
  const texts = db
    .select()
    .from(mails)
    .all()
    .filter((mail) => mail.recipient === recipient)
    .flatMap(({ text }) => /https?:\/\/[^/]+(\/(?:invite|reset)\/[\w-]+)/.exec(text)?.[1] ?? [])
  const link = texts.at(-1)
  if (link === undefined) throw new Error(`no link was sent to ${recipient}`)
  return link
}

/** The token at the end of a link. */
export function tokenOf(link: string): string {
  return link.split('/').at(-1)!
}
