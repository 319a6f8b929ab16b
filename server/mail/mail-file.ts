import { createTransport } from 'nodemailer'

export interface StoredMail {
  readonly id: string
  readonly recipient: string
  readonly subject: string
  readonly text: string
  readonly html: string
  readonly createdAt: number
}

/** The parts of a message as nodemailer takes them; the same whether it is sent or shown. */
export function messageOf(mail: StoredMail, from: string) {
  return {
    from,
    to: { name: '', address: mail.recipient },
    subject: mail.subject,
    text: mail.text,
    html: mail.html,
    date: new Date(mail.createdAt),
    // The same at every try, so that a receiver can tell a repeated delivery.
    messageId: `<${mail.id}@${domainOf(from)}>`,
    headers: { 'Auto-Submitted': 'auto-generated' },
    disableFileAccess: true,
    disableUrlAccess: true,
  }
}

/** The mail as an .eml file. */
export async function mailFile(mail: StoredMail, from: string): Promise<Buffer> {
  const composer = createTransport({ streamTransport: true, buffer: true, newline: 'windows' })
  const { message } = await composer.sendMail(messageOf(mail, from))
  return message as Buffer
}

function domainOf(from: string): string {
  return /@([\w.-]+)/.exec(from)?.[1] ?? 'localhost'
}
