import { describe, expect, it } from 'vitest'
import { mailsPageSchema } from '../../../shared/schemas/account'
import { mails } from '../../../server/db/schema'
import { runMailQueue } from '../../../server/mail/mail-queue'
import { createSmtpSender } from '../../../server/mail/smtp-sender'
import { updateMail } from '../../../server/modules/mails/mails.queries'
import { auditTrail } from '../../support/audit-trail'
import { movingClock } from '../../support/clock'
import { plainText, startMailServer } from '../../support/mail-server'
import { type Browser, makePerson, signedIn } from '../../support/people'
import { freshApp } from '../../support/server-app'

const EMAIL = 'new@people.test'
const invited = { email: EMAIL, name: 'Ünal', role: 'engineer', organisationId: 'tests' }

async function start(environment: Record<string, string> = {}) {
  const clock = movingClock()
  const server = freshApp({ now: clock.now, environment })
  const admin = makePerson(server.parts, { role: 'admin', name: 'Administrator' })
  const office = await signedIn(server.app, admin)
  await office.post('/api/admin/invitations').send(invited).expect(201)
  const { id } = server.db.select().from(mails).get()!
  return { ...server, clock, office, id }
}

async function outbox(office: Browser) {
  const { body } = await office.get('/api/admin/mails').expect(200)
  return mailsPageSchema.parse(body)
}

describe('without an SMTP server', () => {
  it('mail is kept, and an administrator reads it as a file with its link', async () => {
    const { office, db, id } = await start()
    expect((await outbox(office)).items[0]).toMatchObject({
      ...{ id, recipient: EMAIL, state: 'kept', subject: 'You are invited to Toehold' },
    })
    const answer = await office.get(`/api/admin/mails/${id}`).responseType('blob').expect(200)
    expect(answer.headers['content-type']).toMatch(/^message\/rfc822/)
    expect(answer.headers['content-disposition']).toBe('attachment; filename=mail.eml')
    const file = (answer.body as Buffer).toString('utf8')
    expect(file).toMatch(/^To: new@people\.test\r$/m)
    expect(plainText(file)).toContain('Hello Ünal,')
    expect(plainText(file)).toMatch(/http:\/\/localhost:3000\/invite\/[\w-]{43}/)
    expect(auditTrail(db).at(-1)).toBe('Administrator: mail.read: You are invited to Toehold')
  })

  it('mail stays in the outbox when it is tried again', async () => {
    const { office, id } = await start()
    const { body } = await office.post(`/api/admin/mails/${id}/retry`).expect(409)
    expect(body.message).toContain('no SMTP server is set')
  })
})

describe('with an SMTP server', () => {
  it('mail is sent in the background, and its text is not kept', async () => {
    const server = await startMailServer()
    const environment = { SMTP_URL: server.url, MAIL_FROM: 'toehold@mail.test' }
    const { office, db, id, clock } = await start(environment)
    expect((await outbox(office)).items[0]!.state).toBe('waiting')
    const sender = createSmtpSender(server.url, 'toehold@mail.test')
    await runMailQueue({ db, sender, now: clock.now })
    sender.close()
    expect(plainText(server.received[0]!.message)).toContain('/invite/')
    expect((await outbox(office)).items[0]).toMatchObject({ state: 'sent', sentAt: clock.now() })
    await office.get(`/api/admin/mails/${id}`).expect(409)
    await office.post(`/api/admin/mails/${id}/retry`).expect(409)
  })

  it('mail that failed is shown with its reason, and can be tried again', async () => {
    const environment = { SMTP_URL: 'smtp://127.0.0.1:1', MAIL_FROM: 'toehold@mail.test' }
    const { office, db, id } = await start(environment)
    updateMail(db, id, { state: 'failed', tries: 12, nextTryAt: null, lastError: 'no such box' })
    expect((await outbox(office)).items[0]).toMatchObject({ tries: 12, lastError: 'no such box' })
    await office.post(`/api/admin/mails/${id}/retry`).expect(204)
    expect((await outbox(office)).items[0]).toMatchObject({ state: 'waiting', tries: 0 })
    expect(auditTrail(db).at(-1)).toBe('Administrator: mail.retried: You are invited to Toehold')
  })
})

it('a mail that is not there is not found', async () => {
  const { office } = await start()
  await office.get('/api/admin/mails/nothing').expect(404)
  await office.post('/api/admin/mails/nothing/retry').expect(404)
})
