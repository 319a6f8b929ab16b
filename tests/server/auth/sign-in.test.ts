import type { Express } from 'express'
import request from 'supertest'
import { describe, expect, it, vi } from 'vitest'
import { beginAttempt, LIMITS } from '../../../server/auth/attempts/attempts'
import { createKeyedHash } from '../../../server/auth/keyed-hash'
import { createPasswords, type Passwords } from '../../../server/auth/passwords'
import { attempts } from '../../../server/db/schema'
import { TooManyRequestsError } from '../../../server/errors'
import { updateAccount } from '../../../server/modules/accounts/accounts.queries'
import { signIn } from '../../../server/modules/accounts/sign-in.service'
import { auditTrail } from '../../support/audit-trail'
import { HOUR, MINUTE, movingClock, SECOND } from '../../support/clock'
import { makePerson, PASSWORD } from '../../support/people'
import { CHEAP_PASSWORDS, freshApp, SECRET } from '../../support/server-app'

const WRONG = 'not the password of the tests'

function start() {
  const clock = movingClock()
  const server = freshApp({ now: clock.now })
  return { ...server, clock, person: makePerson(server.parts, { name: 'Engineer A' }) }
}

interface Try {
  readonly email: string
  readonly password?: string
  readonly sender?: string
}

function attempt(app: Express, { email, password = WRONG, sender = '198.51.100.1' }: Try) {
  return request(app).post('/api/session').set('X-Forwarded-For', sender).send({ email, password })
}

/** Fails until the server asks to wait. */
async function failUntilSlowed(app: Express, wanted: Try) {
  for (let count = 0; count < LIMITS.pair.free; count++) await attempt(app, wanted).expect(401)
  return attempt(app, wanted).expect(429)
}

describe('a wrong password', () => {
  it('is answered exactly as an unknown address and a deactivated account', async () => {
    const { app, db, parts, person, clock } = start()
    const gone = makePerson(parts)
    updateAccount(db, gone.id, { deactivatedAt: clock.now() })
    const answers = [
      await attempt(app, { email: person.email }),
      await attempt(app, { email: 'nobody@people.test', password: PASSWORD }),
      await attempt(app, { email: gone.email, password: PASSWORD }),
      await attempt(app, { email: 'no address at all', password: PASSWORD }),
    ]
    for (const { status, body } of answers) {
      expect({ status, body }).toEqual({ status: 401, body: answers[0]!.body })
      expect(body.code).toBe('sign-in-required')
    }
  })

  it('costs one comparison, whether the address is known or not', async () => {
    const { parts, person } = start()
    const compare = vi.fn<Passwords['fits']>((...args) => CHEAP_PASSWORDS.fits(...args))
    const watched = { ...parts, passwords: { ...CHEAP_PASSWORDS, fits: compare } }
    for (const email of [person.email, 'nobody@people.test']) {
      const outcome = signIn(watched, { email, password: WRONG }, 'sender')
      await expect(outcome).rejects.toThrow('Address or password is not right.')
    }
    expect(compare).toHaveBeenCalledTimes(2)
    expect(compare).toHaveBeenLastCalledWith(WRONG, null)
  })
})

describe('repeated attempts', () => {
  it('have to wait longer and longer, and say how long', async () => {
    const { app, person, clock } = start()
    const first = await failUntilSlowed(app, person)
    expect(first.headers['retry-after']).toBe('1')
    expect(first.body.code).toBe('too-many-requests')
    const waits: number[] = []
    for (let count = 0; count < 12; count++) {
      clock.advance(waits.length === 0 ? SECOND : waits.at(-1)! * SECOND)
      await attempt(app, person).expect(401)
      waits.push(Number((await attempt(app, person).expect(429)).headers['retry-after']))
    }
    expect(waits.slice(0, 5)).toEqual([2, 4, 8, 16, 32])
    expect(waits.at(-1)).toBe(LIMITS.pair.longest / SECOND)
  })

  it('never keep the owner out who waits as long as was said', async () => {
    const { app, person, clock } = start()
    const slowed = await failUntilSlowed(app, person)
    const right = { ...person, password: PASSWORD }
    await attempt(app, right).expect(429)
    clock.advance(Number(slowed.headers['retry-after']) * SECOND)
    await attempt(app, right).expect(200)
    await attempt(app, person).expect(401)
  })

  it('never slow the owner who comes from elsewhere', async () => {
    const { app, person } = start()
    for (const sender of ['198.51.100.1', '198.51.100.2', '2001:db8::1']) {
      await failUntilSlowed(app, { ...person, sender })
    }
    await attempt(app, { ...person, password: PASSWORD, sender: '203.0.113.9' }).expect(200)
  })

  it('count when they come at the same moment', async () => {
    const { app, person } = start()
    const answers = await Promise.all(Array.from({ length: 12 }, () => attempt(app, person)))
    const refused = answers.filter(({ status }) => status === 429)
    expect(refused).toHaveLength(12 - LIMITS.pair.free)
  })

  it('at many addresses slow their sender a little, and only for moments', async () => {
    const { app, person, clock } = start()
    for (let count = 0; count < LIMITS.sender.free; count++) {
      await attempt(app, { email: `guess-${count}@people.test` }).expect(401)
    }
    const slowed = await attempt(app, { email: 'one-more@people.test' }).expect(429)
    expect(Number(slowed.headers['retry-after'])).toBe(1)
    await attempt(app, { ...person, sender: '203.0.113.9', password: PASSWORD }).expect(200)
    clock.advance(SECOND)
    await attempt(app, { ...person, password: PASSWORD }).expect(200)
  })

  it('from one IPv6 network count together', async () => {
    const { app, person } = start()
    await failUntilSlowed(app, { ...person, sender: '2001:db8:1:2::1' })
    await attempt(app, { ...person, sender: '2001:db8:1:2:ffff::9' }).expect(429)
    await attempt(app, { ...person, sender: '2001:db8:1:3::1' }).expect(401)
  })

  it('are forgotten after an hour', async () => {
    const { app, person, clock } = start()
    await failUntilSlowed(app, person)
    clock.advance(HOUR + SECOND)
    for (let count = 0; count < LIMITS.pair.free; count++) await attempt(app, person).expect(401)
  })

  it('are kept without the address that was tried', async () => {
    const { app, db, person } = start()
    await attempt(app, person)
    const rows = db.select().from(attempts).all()
    expect(rows).toHaveLength(2)
    expect(JSON.stringify(rows)).not.toMatch(/people\.test|198\.51/)
  })

  it('are limited where the present password is guessed at as well', async () => {
    const { parts } = start()
    const on = { purpose: 'password', target: 'account', sender: 'sender' } as const
    for (let count = 0; count < LIMITS.pair.free; count++) beginAttempt(parts, on)
    expect(() => beginAttempt(parts, on)).toThrow(TooManyRequestsError)
  })

  it('cannot be passed off as coming from elsewhere by whoever is no proxy', async () => {
    const { app, person } = start()
    app.set('trust proxy', false)
    for (let count = 0; count < LIMITS.pair.free; count++) {
      await attempt(app, { ...person, sender: `198.51.100.${count}` }).expect(401)
    }
    await attempt(app, { ...person, sender: '203.0.113.9' }).expect(429)
  })
})

describe('the audit trail of sign-ins', () => {
  it('has each sign-in, and one line for a series of failures', async () => {
    const { app, db, person, clock } = start()
    await failUntilSlowed(app, person)
    clock.advance(MINUTE)
    await attempt(app, { ...person, password: PASSWORD }).expect(200)
    expect(auditTrail(db)).toEqual([
      ': account.sign-in-slowed: Engineer A',
      'Engineer A: account.signed-in: Engineer A',
    ])
  })
})

describe('passwords', () => {
  it('are argon2id at the cost that OWASP asks for', () => {
    const stored = createPasswords().hashNow('high water at seven')
    expect(stored).toMatch(/^\$argon2id\$v=19\$m=19456,t=2,p=1\$/)
  })

  it('fit themselves alone, however the keyboard writes their letters', async () => {
    const stored = await CHEAP_PASSWORDS.hash('ｆlut am Kai é')
    expect(await CHEAP_PASSWORDS.fits('flut am Kai e\u0301', stored)).toBe(true)
    expect(await CHEAP_PASSWORDS.fits('flut am Kai e', stored)).toBe(false)
    expect(await CHEAP_PASSWORDS.fits('nobody signs in with this', null)).toBe(false)
  })

  it('get a salt of their own each', async () => {
    const both = [await CHEAP_PASSWORDS.hash(PASSWORD), await CHEAP_PASSWORDS.hash(PASSWORD)]
    expect(both[0]).not.toBe(both[1])
  })
})

describe('a keyed hash', () => {
  it('depends on secret, purpose and text, and on where one ends and the other begins', () => {
    const hash = createKeyedHash(SECRET)
    const others = [
      createKeyedHash(`${SECRET}x`)('session', 'text'),
      hash('invitation', 'text'),
      hash('session', 'text2'),
      hash('sessio', 'ntext'),
    ]
    expect(hash('session', 'text')).toMatch(/^[\w-]{43}$/)
    expect(others).not.toContain(hash('session', 'text'))
  })
})
