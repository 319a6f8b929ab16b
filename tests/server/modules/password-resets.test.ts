import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { sql } from 'drizzle-orm'
import { LIMITS } from '../../../server/auth/attempts/attempts'
import type { Db } from '../../../server/db/client'
import { mails, passwordResets } from '../../../server/db/schema'
import { updateAccount } from '../../../server/modules/accounts/accounts.queries'
import { auditTrail } from '../../support/audit-trail'
import { HOUR, MINUTE, movingClock } from '../../support/clock'
import { linkFor, tokenOf } from '../../support/links'
import { browser, makePerson, PASSWORD, signedIn } from '../../support/people'
import { freshApp } from '../../support/server-app'

/** Rows that the connection has written so far. */
function changesOf(db: Db): number {
  return db.get<{ total: number }>(sql`select total_changes() as total`).total
}

const NEXT = 'another password of the tests'

function start() {
  const clock = movingClock()
  const server = freshApp({ now: clock.now })
  const person = makePerson(server.parts, { name: 'Engineer A' })
  const ask = (email: string, sender = '198.51.100.1') =>
    request(server.app).post('/api/password-resets').set('X-Forwarded-For', sender).send({ email })
  const newest = () => `/api/password-resets/${tokenOf(linkFor(server.db, person.email))}`
  return { ...server, clock, person, ask, newest }
}

describe('asking for a new password', () => {
  it('sends a link to a known address, and answers alike for any other', async () => {
    const { db, ask, parts, person } = start()
    const gone = makePerson(parts)
    updateAccount(db, gone.id, { deactivatedAt: 1 })
    const answers = [
      await ask(person.email),
      await ask('nobody@people.test'),
      await ask(gone.email),
    ]
    for (const { status, text } of answers)
      expect({ status, text }).toEqual({ status: 202, text: '' })
    const sent = db.select().from(mails).all()
    expect(sent.map(({ recipient, state }) => [recipient, state])).toEqual([[person.email, 'kept']])
    expect(db.select().from(passwordResets).all()).toHaveLength(1)
  })

  it('writes and throws away for an unknown address what it writes for a known one', async () => {
    const { parts, person, ask } = start()
    const writes = async (email: string, sender: string) => {
      const before = changesOf(parts.db)
      await ask(email, sender)
      return changesOf(parts.db) - before
    }
    const known = await writes(person.email, '198.51.100.1')
    const unknown = await writes('nobody@people.test', '198.51.100.2')
    expect(unknown).toBeGreaterThanOrEqual(known - 1)
  })

  it('sends three links at most that are open at once', async () => {
    const { db, ask, person, clock } = start()
    for (let count = 0; count < 6; count++) await ask(person.email, `198.51.100.${count}`)
    expect(db.select().from(mails).all()).toHaveLength(3)
    clock.advance(HOUR)
    await ask(person.email)
    expect(db.select().from(mails).all()).toHaveLength(4)
  })

  it('slows a sender who asks again and again', async () => {
    const { ask } = start()
    for (let count = 0; count < LIMITS.pair.free; count++) await ask('a@people.test').expect(202)
    await ask('a@people.test').expect(429)
  })
})

describe('a link for a new password', () => {
  it('sets it, ends every session, and tells the owner', async () => {
    const { app, db, ask, newest, person } = start()
    const agent = await signedIn(app, person)
    await ask(person.email)
    const address = newest()
    const view = await browser(app).get(address).expect(200)
    expect(view.body.name).toBe('Engineer A')
    await browser(app).post(address).send({ password: NEXT }).expect(204)
    await agent.get('/api/account/sessions').expect(401)
    await signedIn(app, person, NEXT)
    const old = { email: person.email, password: PASSWORD }
    await browser(app).post('/api/session').send(old).expect(401)
    const subjects = db
      .select()
      .from(mails)
      .all()
      .map(({ subject }) => subject)
    expect(subjects.at(-1)).toBe('Your password at Toehold was changed')
    expect(auditTrail(db)).toContain('Engineer A: password-reset.used: Engineer A')
  })

  it('works once, even for two who come at the same moment', async () => {
    const { app, ask, newest, person } = start()
    await ask(person.email)
    const address = newest()
    const answers = await Promise.all(
      [1, 2, 3].map(() => browser(app).post(address).send({ password: NEXT })),
    )
    expect(answers.map(({ status }) => status).sort()).toEqual([204, 404, 404])
  })

  it('works for an hour', async () => {
    const { app, ask, newest, person, clock } = start()
    await ask(person.email)
    clock.advance(59 * MINUTE)
    await browser(app).get(newest()).expect(200)
    clock.advance(MINUTE)
    await browser(app).get(newest()).expect(404)
    await browser(app).post(newest()).send({ password: NEXT }).expect(404)
  })

  it('ends with the other links when one of them is used, and when the password is changed', async () => {
    const { app, ask, newest, person } = start()
    await ask(person.email)
    const first = newest()
    await ask(person.email)
    await browser(app).post(newest()).send({ password: NEXT }).expect(204)
    await browser(app).post(first).send({ password: NEXT }).expect(404)
    await ask(person.email)
    const agent = await signedIn(app, person, NEXT)
    await agent.put('/api/account/password').send({ current: NEXT, next: PASSWORD }).expect(204)
    await browser(app).get(newest()).expect(404)
  })

  it('is stored without anything that could be used', async () => {
    const { db, ask, newest, person } = start()
    await ask(person.email)
    const stored = JSON.stringify(db.select().from(passwordResets).all())
    expect(stored).not.toContain(tokenOf(newest()))
  })

  it('that was made up is none', async () => {
    const { app } = start()
    await browser(app).get('/api/password-resets/made-up').expect(404)
    await browser(app).post('/api/password-resets/made-up').send({ password: NEXT }).expect(404)
  })
})
