import { createTransport } from 'nodemailer'
import { messageOf, type StoredMail } from './mail-file'

const SECOND = 1000

/** Hands a mail to a server; throws where that fails. */
export interface MailSender {
  readonly send: (mail: StoredMail) => Promise<void>
  readonly close: () => void
}

/** Sends over SMTP, one connection for one run of the queue. */
export function createSmtpSender(smtpUrl: string, from: string): MailSender {
  const transport = createTransport({
    url: smtpUrl,
    connectionTimeout: 10 * SECOND,
    greetingTimeout: 10 * SECOND,
    socketTimeout: 30 * SECOND,
  })
  return {
    send: async (mail) => {
      await transport.sendMail(messageOf(mail, from))
    },
    close: () => {
      transport.close()
    },
  }
}
