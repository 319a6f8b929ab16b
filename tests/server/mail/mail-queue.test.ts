import { createServer, type AddressInfo } from 'node:net'
import { eq } from 'drizzle-orm'
import { describe, expect, it, onTestFinished } from 'vitest'
import type { Db } from '../../../server/db/client'
import { mails } from '../../../server/db/schema'
import { composeMail } from '../../../server/mail/compose-mail'
import { delayAfter, MOST_TRIES, queueMail, runMailQueue } from '../../../server/mail/mail-queue'
import { startMailWorker } from '../../../server/mail/mail-worker'
import { createSmtpSender } from '../../../server/mail/smtp-sender'
import { HOUR, MINUTE, movingClock } from '../../support/clock'
import { plainText, startMailServer } from '../../support/mail-server'
import { freshDatabase } from '../../support/server-app'

const FROM = 'Toehold <toehold@mail.test>'
const values = { name: 'Jörg <b>', changed: '2031-03-03 21:45 UTC' }
const content = composeMail('passwordChanged', { appUrl: 'https://toehold.example', values })

function queueWith(smtpUrl: string) {
  const { db } = freshDatabase()
  const clock = movingClock()
  const sender = createSmtpSender(smtpUrl, FROM)
  onTestFinished(sender.close)
  const put = (recipient = 'engineer.a@people.test') =>
    queueMail(db, { isSmtp: true, from: FROM }, clock.now(), { recipient, ...content })
  const run = () => runMailQueue({ db, sender, now: clock.now })
  return { db, clock, sender, put, run }
}

const stateOf = (db: Db, id: string) => db.select().from(mails).where(eq(mails.id, id)).get()!

/** A port that nobody listens on. */
async function deadPort(): Promise<number> {
  const server = createServer()
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve))
  const { port } = server.address() as AddressInfo
  await new Promise((resolve) => server.close(resolve))
  return port
}

describe('the mail queue', () => {
  it('hands its mail to an SMTP server, as plain text and HTML', async () => {
    const server = await startMailServer()
    const { db, put, run, clock } = queueWith(server.url)
    const id = put()
    await run()
    const [mail] = server.received
    expect(mail).toMatchObject({ from: 'toehold@mail.test', to: ['engineer.a@people.test'] })
    expect(mail!.message).toMatch(/^From: Toehold <toehold@mail\.test>\r$/m)
    expect(mail!.message).toMatch(/^Subject: Your password at Toehold was changed\r$/m)
    expect(mail!.message).toMatch(/^Date: Mon, 03 Mar 2031 22:00:00 \+0000\r$/m)
    expect(mail!.message).toContain('Content-Type: text/html')
    expect(plainText(mail!.message)).toContain('Hello Jörg <b>,')
    expect(stateOf(db, id)).toMatchObject({ state: 'sent', tries: 1, sentAt: clock.now() })
  })

  it('keeps no text of what was sent, for it may hold a link', async () => {
    const server = await startMailServer()
    const { db, put, run } = queueWith(server.url)
    const id = put()
    await run()
    expect(stateOf(db, id)).toMatchObject({ text: '', html: '', nextTryAt: null })
  })

  it('sends each mail once', async () => {
    const server = await startMailServer()
    const { put, run, clock } = queueWith(server.url)
    put()
    await run()
    clock.advance(HOUR)
    await run()
    expect(server.received).toHaveLength(1)
  })

  it('tries again later while nobody answers, and gives up in the end', async () => {
    const { db, put, run, clock } = queueWith(`smtp://127.0.0.1:${await deadPort()}`)
    const id = put()
    await run()
    expect(stateOf(db, id)).toMatchObject({
      state: 'waiting',
      tries: 1,
      nextTryAt: clock.now() + MINUTE,
    })
    expect(stateOf(db, id).lastError).toContain('ECONNREFUSED')
    await run()
    expect(stateOf(db, id).tries).toBe(1)
    for (let tries = 1; tries < MOST_TRIES; tries++) {
      clock.advance(delayAfter(tries))
      await run()
    }
    expect(stateOf(db, id)).toMatchObject({ state: 'failed', tries: MOST_TRIES, nextTryAt: null })
  })

  it('waits longer after each try, an hour at most', () => {
    expect([1, 2, 3].map(delayAfter)).toEqual([MINUTE, 2 * MINUTE, 4 * MINUTE])
    expect(delayAfter(11)).toBe(HOUR)
  })

  it('sends what waited once the server is back', async () => {
    let isBack = false
    const server = await startMailServer({
      onMailFrom: (_address, _session, done) => {
        done(isBack ? undefined : Object.assign(new Error('later'), { responseCode: 451 }))
      },
    })
    const { db, put, run, clock } = queueWith(server.url)
    const id = put()
    await run()
    expect(stateOf(db, id).state).toBe('waiting')
    isBack = true
    clock.advance(MINUTE)
    await run()
    expect(stateOf(db, id)).toMatchObject({ state: 'sent', tries: 2, lastError: '' })
  })

  it('gives up at once on a recipient that is refused for good, and sends the others', async () => {
    const server = await startMailServer({
      onRcptTo: ({ address }, _session, done) => {
        const isUnknown = address.startsWith('unknown')
        done(isUnknown ? Object.assign(new Error('no such box'), { responseCode: 550 }) : undefined)
      },
    })
    const { db, put, run } = queueWith(server.url)
    const ids = [put('unknown@people.test'), put('known@people.test')]
    await run()
    expect(ids.map((id) => stateOf(db, id).state)).toEqual(['failed', 'sent'])
    expect(stateOf(db, ids[0]!).lastError).toContain('no such box')
  })

  it('keeps trying while the server refuses the password, which is not the mail’s fault', async () => {
    const server = await startMailServer({
      authOptional: false,
      onAuth: (_auth, _session, done) => {
        done(Object.assign(new Error('wrong password'), { responseCode: 535 }))
      },
    })
    const { db, put, run } = queueWith(server.url.replace('//', '//user:word@'))
    const id = put()
    await run()
    expect(stateOf(db, id).state).toBe('waiting')
  })

  it('leaves alone what is kept in the outbox', async () => {
    const server = await startMailServer()
    const { db, run, clock } = queueWith(server.url)
    const mail = { recipient: 'a@people.test', ...content }
    const id = queueMail(db, { isSmtp: false, from: FROM }, clock.now(), mail)
    await run()
    expect(stateOf(db, id)).toMatchObject({ state: 'kept', text: content.text })
    expect(server.received).toEqual([])
  })
})

describe('the mail worker', () => {
  it('sends what is put into the queue while it runs, and stops', async () => {
    const server = await startMailServer()
    const { db, sender, put, clock } = queueWith(server.url)
    const logger = { error: () => undefined }
    const worker = startMailWorker({ db, sender, now: clock.now, logger }, 5)
    put()
    await expect.poll(() => server.received.length).toBe(1)
    await worker.stop()
    put('late@people.test')
    await new Promise((resolve) => setTimeout(resolve, 50))
    expect(server.received).toHaveLength(1)
  })

  it('goes on after a run that failed, and tells the log', async () => {
    const { db, clock } = queueWith('smtp://127.0.0.1:1')
    const told: unknown[] = []
    let isBroken = true
    const now = () => {
      if (isBroken) throw new Error('no clock')
      return clock.now()
    }
    const sent: string[] = []
    const sender = { send: ({ id }: { id: string }) => Promise.resolve(void sent.push(id)) }
    const logger = { error: (line: unknown) => void told.push(line) }
    const worker = startMailWorker({ db, sender, now, logger }, 5)
    await expect.poll(() => told.length).toBeGreaterThan(0)
    isBroken = false
    const mail = { recipient: 'a@people.test', ...content }
    const id = queueMail(db, { isSmtp: true, from: FROM }, clock.now(), mail)
    await expect.poll(() => sent).toEqual([id])
    await worker.stop()
  })
})
