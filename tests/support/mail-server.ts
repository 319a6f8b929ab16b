import type { AddressInfo } from 'node:net'
import { SMTPServer, type SMTPServerOptions } from 'smtp-server'
import { onTestFinished } from 'vitest'

export interface Received {
  readonly from: string
  readonly to: readonly string[]
  readonly message: string
}

export interface MailServer {
  /** Value of `SMTP_URL`. */
  readonly url: string
  readonly received: readonly Received[]
  readonly close: () => Promise<void>
}

/** A real SMTP server in this process; it ends with the test. */
export async function startMailServer(options: SMTPServerOptions = {}): Promise<MailServer> {
  const received: Received[] = []
  const server = new SMTPServer({
    authOptional: true,
    disabledCommands: ['STARTTLS'],
    logger: false,
    onData: (stream, session, done) => {
      const chunks: Buffer[] = []
      stream.on('data', (chunk: Buffer) => chunks.push(chunk))
      stream.on('end', () => {
        const { mailFrom, rcptTo } = session.envelope
        received.push({
          from: mailFrom === false ? '' : mailFrom.address,
          to: rcptTo.map(({ address }) => address),
          message: Buffer.concat(chunks).toString('utf8'),
        })
        done()
      })
    },
    ...options,
  })
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.server.address() as AddressInfo
  const close = () => new Promise<void>((resolve) => server.close(() => resolve()))
  onTestFinished(close)
  return { url: `smtp://127.0.0.1:${port}`, received, close }
}

/** The plain text of a message, its lines put together again. */
export function plainText(message: string): string {
  const [, part = message] =
    /Content-Type: text\/plain[^]*?\r\n\r\n([^]*?)\r\n--/.exec(message) ?? []
  const isQuoted = /text\/plain[^]*?quoted-printable/.test(message)
  return isQuoted ? unquoted(part) : part
}

function unquoted(text: string): string {
  const bytes = text
    .replace(/=\r\n/g, '')
    .replace(/=([0-9A-F]{2})/g, (_, hex: string) => String.fromCharCode(parseInt(hex, 16)))
  return Buffer.from(bytes, 'latin1').toString('utf8')
}
