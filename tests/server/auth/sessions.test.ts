import request, { type Response } from 'supertest'
import { describe, expect, it } from 'vitest'
import { ownSessionsSchema, sessionAnswerSchema } from '../../../shared/schemas/account'
import { forgetExpired } from '../../../server/auth/housekeeping'
import { sessions } from '../../../server/db/schema'
import { updateAccount } from '../../../server/modules/accounts/accounts.queries'
import { DAY, movingClock } from '../../support/clock'
import { browser, type Browser, makePerson, ORIGIN, PASSWORD, signedIn } from '../../support/people'
import { freshApp, SECRET } from '../../support/server-app'

const cookiesOf = (answer: Response) => (answer.headers['set-cookie'] ?? []) as unknown as string[]

async function accountIn(agent: Browser) {
  const { body } = await agent.get('/api/session').expect(200)
  return sessionAnswerSchema.parse(body).account
}

async function sessionsOf(agent: Browser) {
  const { body } = await agent.get('/api/account/sessions').expect(200)
  return ownSessionsSchema.parse(body).sessions
}

function start() {
  const clock = movingClock()
  const server = freshApp({ now: clock.now })
  return { ...server, clock, person: makePerson(server.parts, { name: 'Engineer A' }) }
}

describe('signing in', () => {
  it('gives whoever is signed in, and nobody before', async () => {
    const { app, person } = start()
    const agent = browser(app)
    expect(await accountIn(agent)).toBeNull()
    const { body } = await agent
      .post('/api/session')
      .send({ email: `  ${person.email.toUpperCase()} `, password: PASSWORD })
      .expect(200)
    expect(sessionAnswerSchema.parse(body).account).toMatchObject({
      id: person.id,
      email: person.email,
      role: 'engineer',
      organisation: { name: 'Organisation of the tests' },
    })
    expect(await accountIn(agent)).toEqual(body.account)
  })

  it('sets a cookie that no script reads and no foreign page sends', async () => {
    const { app, person } = start()
    const credentials = { email: person.email, password: PASSWORD }
    const answer = await request(app).post('/api/session').send(credentials)
    const [cookie] = cookiesOf(answer)
    expect(cookie).toMatch(/^toehold-session=[a-z0-9]{40}; HttpOnly; Max-Age=1209600; Path=\/; /)
    expect(cookie).toContain('SameSite=Lax')
    expect(cookie).not.toContain('Secure')
  })

  it('binds the cookie to https and this host where the program is reached by https', async () => {
    const environment = { APP_URL: 'https://toehold.example', SESSION_SECRET: SECRET }
    const { app, parts } = freshApp({ environment })
    const { email } = makePerson(parts)
    const answer = await request(app).post('/api/session').send({ email, password: PASSWORD })
    expect(cookiesOf(answer)[0]).toMatch(/^__Host-toehold-session=.*; Path=\/; .*; Secure$/)
    expect(cookiesOf(answer)[0]).not.toContain('Domain')
  })

  it('ends the session that the browser had before', async () => {
    const { app, db, person } = start()
    const agent = await signedIn(app, person)
    await agent.post('/api/session').send({ email: person.email, password: PASSWORD }).expect(200)
    expect(db.select().from(sessions).all()).toHaveLength(1)
  })

  it('leaves nothing in the database that opens a session', async () => {
    const { app, db, person } = start()
    const credentials = { email: person.email, password: PASSWORD }
    const answer = await request(app).post('/api/session').send(credentials)
    const id = /=([a-z0-9]+);/.exec(cookiesOf(answer)[0]!)![1]!
    const [stored] = db.select().from(sessions).all()
    expect(stored!.id).not.toContain(id)
    const forged = await request(app)
      .get('/api/session')
      .set('Cookie', `toehold-session=${stored!.id}`)
    expect(forged.body).toEqual({ account: null })
  })
})

describe('a session', () => {
  it('ends two weeks after its last use', async () => {
    const { app, person, clock } = start()
    const agent = await signedIn(app, person)
    clock.advance(14 * DAY)
    const answer = await agent.get('/api/session')
    expect(answer.body).toEqual({ account: null })
    expect(cookiesOf(answer)[0]).toMatch(/^toehold-session=; .*Max-Age=0/)
  })

  it('is renewed by use in its second half, and not before', async () => {
    const { app, person, clock } = start()
    const agent = await signedIn(app, person)
    clock.advance(6 * DAY)
    expect(cookiesOf(await agent.get('/api/session'))).toEqual([])
    clock.advance(7 * DAY)
    expect(cookiesOf(await agent.get('/api/session'))[0]).toContain('Max-Age=1209600')
    clock.advance(13 * DAY)
    expect((await accountIn(agent))?.id).toBe(person.id)
  })

  it('ends when its owner signs out, and stays ended for whoever kept the cookie', async () => {
    const { app, person } = start()
    const credentials = { email: person.email, password: PASSWORD }
    const opened = await request(app).post('/api/session').send(credentials)
    const cookie = cookiesOf(opened)[0]!.split(';')[0]!
    const call = () => request(app).get('/api/session').set('Cookie', cookie)
    expect((await call()).body.account.id).toBe(person.id)
    await request(app).delete('/api/session').set({ Cookie: cookie, Origin: ORIGIN }).expect(204)
    expect((await call()).body).toEqual({ account: null })
  })

  it('ends at once when the account is deactivated', async () => {
    const { app, db, person, clock } = start()
    const agent = await signedIn(app, person)
    updateAccount(db, person.id, { deactivatedAt: clock.now() })
    await agent.get('/api/account/sessions').expect(401)
    expect(db.select().from(sessions).all()).toEqual([])
  })

  it('follows the role of the account from one request to the next', async () => {
    const { app, db, person } = start()
    const agent = await signedIn(app, person)
    await agent.get('/api/admin/people').expect(403)
    updateAccount(db, person.id, { role: 'admin' })
    await agent.get('/api/admin/people').expect(200)
  })

  it.each(['toehold-session=%', '%=%; toehold-session=', 'a=%E0%A4%A', 'toehold-session=é'])(
    'is not made up from the cookie %s',
    async (cookie) => {
      const { app } = start()
      const header = Buffer.from(cookie).toString('latin1')
      const { body } = await request(app).get('/api/session').set('Cookie', header).expect(200)
      expect(body).toEqual({ account: null })
    },
  )

  it('is forgotten by the housekeeping once it has ended', async () => {
    const { app, db, person, parts, clock } = start()
    await signedIn(app, person)
    forgetExpired(parts)
    expect(db.select().from(sessions).all()).toHaveLength(1)
    clock.advance(14 * DAY)
    forgetExpired(parts)
    expect(db.select().from(sessions).all()).toEqual([])
  })
})

describe('the own sessions', () => {
  it('are listed with the one that asks, and without anybody else’s', async () => {
    const { app, person, parts, clock } = start()
    await signedIn(app, makePerson(parts))
    const first = await signedIn(app, person)
    clock.advance(1000)
    const second = await browser(app).set('User-Agent', 'Phone')
    await second.post('/api/session').send({ email: person.email, password: PASSWORD })
    const listed = await sessionsOf(second)
    expect(listed.map(({ userAgent, isThis }) => [userAgent, isThis])).toEqual([
      ['Phone', true],
      ['', false],
    ])
    // The library keeps ends in whole seconds, of the machine's own clock.
    const lasts = listed[0]!.expiresAt - listed[0]!.createdAt
    expect(Math.abs(lasts - 14 * DAY)).toBeLessThanOrEqual(1000)
    expect((await sessionsOf(first)).map(({ isThis }) => isThis)).toEqual([false, true])
  })

  it('have names that open nothing', async () => {
    const { app, person } = start()
    const [session] = await sessionsOf(await signedIn(app, person))
    const cookie = `toehold-session=${session!.id}`
    const { body } = await request(app).get('/api/session').set('Cookie', cookie)
    expect(body).toEqual({ account: null })
  })

  it('can be ended one by one, but not those of others', async () => {
    const { app, person, parts, clock } = start()
    const lost = await signedIn(app, person)
    clock.advance(1000)
    const kept = await signedIn(app, person)
    const stranger = await signedIn(app, makePerson(parts))
    const handle = (await sessionsOf(kept)).find(({ isThis }) => !isThis)!.id
    await stranger.delete(`/api/account/sessions/${handle}`).expect(404)
    await kept.delete(`/api/account/sessions/${handle}`).expect(204)
    expect(await accountIn(lost)).toBeNull()
    expect(await accountIn(kept)).not.toBeNull()
  })

  it('can all be ended at once', async () => {
    const { app, person } = start()
    const agents = [await signedIn(app, person), await signedIn(app, person)]
    await agents[0]!.delete('/api/account/sessions').expect(204)
    for (const agent of agents) expect(await accountIn(agent)).toBeNull()
  })

  it('end with a new password, but for the one that sets it', async () => {
    const { app, person } = start()
    const other = await signedIn(app, person)
    const agent = await signedIn(app, person)
    const next = 'another password of the tests'
    await agent.put('/api/account/password').send({ current: PASSWORD, next }).expect(204)
    expect(await accountIn(other)).toBeNull()
    expect(await accountIn(agent)).not.toBeNull()
    await signedIn(app, person, next)
    const old = { email: person.email, password: PASSWORD }
    await browser(app).post('/api/session').send(old).expect(401)
  })
})

describe('the own account', () => {
  it('changes what is its own, and nothing else', async () => {
    const { app, person } = start()
    const agent = await signedIn(app, person)
    const change = { name: 'Engineer C', timeZone: 'Europe/Lisbon', unitSystem: 'us' }
    const { body } = await agent.patch('/api/account').send(change).expect(200)
    expect(body).toMatchObject({ ...change, role: 'engineer' })
    await agent.patch('/api/account').send({ role: 'admin' }).expect(400)
  })

  it('refuses a time zone in which no time can be printed', async () => {
    const { app, person } = start()
    const agent = await signedIn(app, person)
    const { body } = await agent.patch('/api/account').send({ timeZone: 'Quay/Low' }).expect(422)
    expect(body.fields[0]).toMatchObject({ path: 'timeZone', value: 'Quay/Low' })
  })

  it('keeps its password when the present one is wrong, and sends no password back', async () => {
    const { app, person } = start()
    const agent = await signedIn(app, person)
    const guess = { current: 'a wrong guess at it', next: 'another password of the tests' }
    const answer = await agent.put('/api/account/password').send(guess).expect(422)
    expect(answer.body.fields[0].path).toBe('current')
    expect(answer.text).not.toContain('wrong guess')
    await signedIn(app, person)
  })

  it.each(['short', 'x'.repeat(11), 'x'.repeat(201)])(
    'refuses the new password %s',
    async (next) => {
      const { app, person } = start()
      const agent = await signedIn(app, person)
      const { body } = await agent.put('/api/account/password').send({ current: PASSWORD, next })
      expect(body).toMatchObject({ code: 'invalid-input', fields: [{ path: 'next' }] })
      expect(JSON.stringify(body)).not.toContain(next)
    },
  )
})
