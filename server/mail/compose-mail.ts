import { mailTexts, mailWords, type MailTexts } from '../../shared/texts/mail.en'

export type MailKind = keyof typeof mailTexts

export interface MailContent {
  readonly subject: string
  readonly text: string
  readonly html: string
}

export interface MailFilling {
  /** Address of the program, for the signature. */
  readonly appUrl: string
  /** Where the link leads. */
  readonly link?: string
  readonly values: Readonly<Record<string, string>>
}

/** One mail as plain text and as HTML; every value is escaped in the HTML. */
export function composeMail(kind: MailKind, { appUrl, link, values }: MailFilling): MailContent {
  const texts: MailTexts = mailTexts[kind]
  const plain = (template: string) => fill(template, values)
  const escaped = (template: string) => escapeHtml(fill(template, values))
  const signature = mailWords.signature.replace('{address}', appUrl)
  const hasLink = link !== undefined && texts.action !== undefined

  const text = [
    ...texts.before.map(plain),
    ...(hasLink ? [`${plain(texts.action)}:\n${link}`] : []),
    ...texts.after.map(plain),
    `-- \n${signature}`,
  ].join('\n\n')
  const html = [
    ...texts.before.map((line) => paragraph(escaped(line))),
    ...(hasLink ? [paragraph(button(link, escaped(texts.action)))] : []),
    ...texts.after.map((line) => paragraph(escaped(line))),
    paragraph(escapeHtml(signature)),
  ].join('\n')
  return { subject: oneLine(plain(texts.subject)), text: `${text}\n`, html: page(html) }
}

/** Only known names are filled in, so that a brace in somebody's name stays a brace. */
function fill(template: string, values: MailFilling['values']): string {
  return template.replace(/\{(\w+)\}/g, (placeholder, name: string) =>
    Object.hasOwn(values, name) ? oneLine(values[name]!) : placeholder,
  )
}

/** A value never begins a new line: it could pass for a sentence of ours. */
function oneLine(value: string): string {
  return value.replace(/\s+/g, ' ').trim()
}

const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
}

function escapeHtml(text: string): string {
  return text.replace(/[&<>"']/g, (sign) => ENTITIES[sign]!)
}

const paragraph = (html: string) => `<p style="margin:0 0 16px">${html}</p>`

function button(link: string, words: string): string {
  const look =
    'display:inline-block;padding:10px 18px;background:#1F6F8B;color:#FFFFFF;text-decoration:none'
  return `<a href="${escapeHtml(link)}" style="${look}">${words}</a>`
}

function page(body: string): string {
  const look =
    "font:16px/1.5 'IBM Plex Sans',sans-serif;color:#1B2A33;background:#F7F6F2;padding:24px"
  return `<!doctype html>\n<html lang="en"><body style="${look}">\n${body}\n</body></html>\n`
}
