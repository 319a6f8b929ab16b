import { describe, expect, it } from 'vitest'
import {
  invitationSchema,
  invitationsSchema,
  invitationViewSchema,
} from '../../../shared/schemas/account'
import { auditEntries, invitations } from '../../../server/db/schema'
import { updateAccount } from '../../../server/modules/accounts/accounts.queries'
import { firstAdministratorLink } from '../../../server/modules/invitations/first-administrator.service'
import { auditTrail } from '../../support/audit-trail'
import { DAY, movingClock, SECOND } from '../../support/clock'
import { linkFor, tokenOf } from '../../support/links'
import { browser, type Browser, makePerson, signedIn } from '../../support/people'
import { freshApp } from '../../support/server-app'

const EMAIL = 'new@people.test'
const invited = { email: EMAIL, name: 'Engineer N', role: 'engineer', organisationId: 'tests' }
const accepted = { name: 'Engineer N', password: 'another password of the tests' }

async function start() {
  const clock = movingClock()
  const server = freshApp({ now: clock.now })
  const admin = makePerson(server.parts, { role: 'admin', name: 'Administrator' })
  return { ...server, clock, office: await signedIn(server.app, admin) }
}

async function invite(office: Browser, change: object = {}) {
  const { body } = await office.post('/api/admin/invitations').send({ ...invited, ...change })
  return invitationSchema.parse(body)
}

const addressOf = (link: string) => `/api/invitations/${tokenOf(link)}`

describe('an invitation', () => {
  it('is sent by mail, shows what it offers, and makes an account that is signed in', async () => {
    const { app, db, office } = await start()
    await invite(office)
    const link = linkFor(db, EMAIL)
    expect(link).toMatch(/^\/invite\/[\w-]{43}$/)
    const agent = browser(app)
    const view = invitationViewSchema.parse((await agent.get(addressOf(link)).expect(200)).body)
    expect(view).toMatchObject({ email: EMAIL, name: 'Engineer N', role: 'engineer' })
    const { body } = await agent.post(addressOf(link)).send(accepted).expect(201)
    expect(body.account).toMatchObject({ email: EMAIL, name: 'Engineer N', mayCheck: false })
    expect((await agent.get('/api/session')).body).toEqual(body)
    await signedIn(app, { email: EMAIL }, accepted.password)
  })

  it('works once, even for two who come at the same moment', async () => {
    const { app, db, office } = await start()
    await invite(office)
    const address = addressOf(linkFor(db, EMAIL))
    const answers = await Promise.all(
      [1, 2, 3].map(() => browser(app).post(address).send(accepted)),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 404, 404])
    await browser(app).get(address).expect(404)
  })

  it('works for seven days', async () => {
    const { app, db, office, clock } = await start()
    await invite(office)
    const address = addressOf(linkFor(db, EMAIL))
    clock.advance(7 * DAY - SECOND)
    await browser(app).get(address).expect(200)
    clock.advance(SECOND)
    await browser(app).get(address).expect(404)
    await browser(app).post(address).send(accepted).expect(404)
    const { body } = await office.get('/api/admin/invitations').expect(200)
    expect(invitationsSchema.parse(body).invitations[0]!.state).toBe('expired')
  })

  it('ends when it is revoked, and cannot be revoked twice', async () => {
    const { app, db, office } = await start()
    const { id } = await invite(office)
    await office.delete(`/api/admin/invitations/${id}`).expect(204)
    await browser(app)
      .post(addressOf(linkFor(db, EMAIL)))
      .send(accepted)
      .expect(404)
    await office.delete(`/api/admin/invitations/${id}`).expect(409)
    await office.delete('/api/admin/invitations/nothing').expect(404)
  })

  it('replaces an earlier one to the same address', async () => {
    const { app, db, office } = await start()
    await invite(office)
    const first = linkFor(db, EMAIL)
    await invite(office, { role: 'trainer' })
    await browser(app).get(addressOf(first)).expect(404)
    const second = await browser(app)
      .get(addressOf(linkFor(db, EMAIL)))
      .expect(200)
    expect(second.body.role).toBe('trainer')
  })

  it('gives a checker both permissions', async () => {
    const { office } = await start()
    expect(await invite(office, { role: 'checker' })).toMatchObject({
      mayCheck: true,
      mayApprove: true,
    })
  })

  it('is stored without anything that could be used', async () => {
    const { db, office } = await start()
    await invite(office)
    const stored = JSON.stringify(db.select().from(invitations).all())
    expect(stored).not.toContain(tokenOf(linkFor(db, EMAIL)))
  })

  it('is not made for an address that has an account, nor for an unknown organisation', async () => {
    const { office, parts } = await start()
    const { email } = makePerson(parts)
    const taken = await office.post('/api/admin/invitations').send({ ...invited, email })
    expect(taken.body.code).toBe('conflict')
    expect(taken.body.message).toContain('has an account already')
    const lost = await office
      .post('/api/admin/invitations')
      .send({ ...invited, organisationId: 'nowhere' })
      .expect(422)
    expect(lost.body.fields[0]).toMatchObject({ path: 'organisationId', value: 'nowhere' })
  })

  it('goes to the address that was invited, and to no other', async () => {
    const { app, db, office } = await start()
    await invite(office)
    const address = addressOf(linkFor(db, EMAIL))
    const other = { ...accepted, email: 'other@people.test' }
    const { body } = await browser(app).post(address).send(other).expect(422)
    expect(body.fields[0].path).toBe('email')
  })

  it('leaves its lines in the audit trail, without the address', async () => {
    const { app, db, office } = await start()
    await invite(office)
    await browser(app)
      .post(addressOf(linkFor(db, EMAIL)))
      .send(accepted)
      .expect(201)
    expect(auditTrail(db).slice(1)).toEqual([
      'Administrator: invitation.sent: Engineer N',
      'Engineer N: invitation.accepted: Engineer N',
    ])
    expect(JSON.stringify(db.select().from(auditEntries).all())).not.toContain(EMAIL)
  })
})

describe('the link of the first administrator', () => {
  it('is made while there is no active administrator, and makes one', async () => {
    const { app, parts, db } = freshApp()
    const link = firstAdministratorLink(parts)!
    expect(link).toMatch(/^http:\/\/localhost:3000\/invite\/[\w-]{43}$/)
    const agent = browser(app)
    const view = await agent.get(addressOf(link)).expect(200)
    expect(view.body).toMatchObject({ email: '', role: 'admin' })
    await agent.post(addressOf(link)).send(accepted).expect(422)
    await agent
      .post(addressOf(link))
      .send({ ...accepted, email: EMAIL })
      .expect(201)
    await agent.get('/api/admin/people').expect(200)
    expect(firstAdministratorLink(parts)).toBeNull()
    expect(auditTrail(db)[0]).toBe('Toehold: invitation.printed: ')
  })

  it('ends when the next start makes another one', async () => {
    const { app, parts } = freshApp()
    const first = firstAdministratorLink(parts)!
    const second = firstAdministratorLink(parts)!
    await browser(app).get(addressOf(first)).expect(404)
    await browser(app).get(addressOf(second)).expect(200)
  })

  it('ends when the next start finds an administrator', async () => {
    const { app, parts } = freshApp()
    const link = firstAdministratorLink(parts)!
    makePerson(parts, { role: 'admin' })
    expect(firstAdministratorLink(parts)).toBeNull()
    await browser(app).get(addressOf(link)).expect(404)
  })

  it('is made again where the only administrator is deactivated', () => {
    const { parts, db } = freshApp()
    const { id } = makePerson(parts, { role: 'admin' })
    updateAccount(db, id, { deactivatedAt: 1 })
    expect(firstAdministratorLink(parts)).not.toBeNull()
  })
})
