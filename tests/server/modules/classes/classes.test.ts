import { sql } from 'drizzle-orm'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { forgetExpired } from '../../../../server/auth/housekeeping'
import type { ClassItem, ClassState } from '../../../../shared/schemas/class'
import { CLASS_LASTS } from '../../../../shared/schemas/class'
import type { Problem } from '../../../../shared/schemas/problem'
import { ASKED, follow, guessOf, listening, phone, SHOWN } from '../../../support/classes'
import { browser, makePerson, signedIn } from '../../../support/people'
import { freshApp } from '../../../support/server-app'

const START = Date.UTC(2031, 2, 3, 12)

/** One server for the whole file; each test has a trainer and a class of its own. */
const clock = { now: START }
let server: ReturnType<typeof freshApp>
const tidying: (() => void)[] = []
beforeAll(() => {
  server = freshApp({ now: () => clock.now, atEnd: (tidy) => tidying.push(tidy) })
})
afterAll(() => {
  tidying.reverse().forEach((tidy) => {
    tidy()
  })
})

/** A trainer whose class is open. */
async function startedClass() {
  const trainer = await signedIn(server.app, makePerson(server.parts, { role: 'trainer' }))
  const { body } = await trainer.post('/api/classes').expect(201)
  const { code, address } = body as ClassItem
  const path = `/api/classes/${code}`
  const phones = browser(server.app)
  const tell = (scene: object) => trainer.put(`${path}/scene`).send(scene)
  const guess = (n: number, value: number, changes: object = {}) =>
    phones.put(`${path}/guess`).send(guessOf(n, value, changes))
  const room = async () => ((await trainer.get(path).expect(200)).body as ClassState).room
  return { ...server, trainer, code, address, path, phones, tell, guess, room }
}

const fieldOf = (answer: { body: unknown }) => (answer.body as Problem).fields[0]

describe('a class', () => {
  it('is opened by trainers, under a code without signs that look alike', async () => {
    const { app, parts, code, address, trainer } = await startedClass()
    expect(code).toMatch(/^[CDFGHJKMNPQRTWXY34679]{6}$/)
    expect(address).toBe(`http://localhost:3000/class/${code}`)
    const { body } = await trainer.get('/api/classes').expect(200)
    expect(body).toEqual({
      classes: [{ code, address, openedAt: START, expiresAt: START + CLASS_LASTS }],
    })
    await browser(app).post('/api/classes').expect(401)
    for (const role of ['admin', 'engineer', 'checker', 'viewer'] as const) {
      const other = await signedIn(app, makePerson(parts, { role }))
      await other.post('/api/classes').expect(403)
    }
  })

  it('is led by whoever opened it, and found by its code however it is typed', async () => {
    const { app, parts, code, tell, phones } = await startedClass()
    await tell(ASKED).expect(200)
    const other = await signedIn(app, makePerson(parts, { role: 'trainer' }))
    await other.put(`/api/classes/${code}/scene`).send(ASKED).expect(404)
    await other.post(`/api/classes/${code}/closing`).expect(404)
    const typed = `${code.slice(0, 3)} ${code.slice(3)}`.toLowerCase()
    const { body } = await phones.get(`/api/classes/${encodeURIComponent(typed)}`).expect(200)
    expect((body as ClassState).scene).toEqual({ ...ASKED, answer: null })
    await phones.get('/api/classes/CCCCCC').expect(404)
  })

  it('says nothing new when it is told the same again', async () => {
    const { tell } = await startedClass()
    expect((await tell(ASKED)).body).toMatchObject({ step: 1 })
    expect((await tell(ASKED)).body).toMatchObject({ step: 1 })
    expect((await tell(SHOWN)).body).toMatchObject({ step: 2 })
    const wrong = await tell({ ...ASKED, guess: { ...ASKED.guess, max: -1 } }).expect(400)
    expect(fieldOf(wrong)).toMatchObject({ path: 'guess.max', value: -1, allowed: 'more than min' })
  })

  it('is over after four hours, and then its rows are deleted', async () => {
    const { db, path, tell, guess, phones, trainer } = await startedClass()
    const openedAt = clock.now
    await tell(ASKED)
    await guess(1, 0.3).expect(200)
    clock.now = openedAt + CLASS_LASTS - 1
    await guess(1, 0.4).expect(200)
    clock.now += 1
    await guess(1, 0.5).expect(409)
    await tell(SHOWN).expect(409)
    expect((await phones.get(path)).body).toMatchObject({ status: 'over' })
    expect((await trainer.get('/api/classes')).body).toEqual({ classes: [] })
    forgetExpired({ db, now: () => clock.now })
    await phones.get(path).expect(404)
    expect(db.all(sql`select * from class_guesses`)).toEqual([])
  })

  it('takes nothing once it is closed, and the audit trail says who opened and closed it', async () => {
    const { db, code, path, trainer, tell, guess } = await startedClass()
    await tell(ASKED)
    const { body } = await trainer.post(`${path}/closing`).expect(200)
    expect(body).toMatchObject({ status: 'closed' })
    await guess(1, 0.3).expect(409)
    await trainer.post(`${path}/closing`).expect(409)
    const deeds = sql`select action, subject_name as name from audit_entries where subject_name = ${code}`
    expect(db.all(deeds)).toEqual([
      { action: 'class.opened', name: code },
      { action: 'class.closed', name: code },
    ])
  })
})

describe('a guess', () => {
  it('counts once for each phone and scene, and the latest counts until the answer is shown', async () => {
    const { tell, guess, room, path, phones } = await startedClass()
    await guess(1, 0.3).expect(409)
    await tell(ASKED)
    await guess(1, 0.3).expect(200)
    await guess(2, 0.05)
    // Noise of a slider: 70 steps of 0.01 are a little more than 0.7.
    await guess(3, 70 * 0.01).expect(200)
    const changed = await guess(1, 0.7).expect(200)
    expect((changed.body as ClassState).room).toMatchObject({ guesses: 3, dots: [] })
    const dots = [
      { value: 0.05, count: 1 },
      { value: 0.7, count: 2 },
    ]
    expect(await room()).toMatchObject({ guesses: 3, dots })
    await tell(SHOWN)
    await guess(4, 0.1).expect(409)
    const { body } = await phones.get(path)
    expect(body).toMatchObject({ scene: { answer: 0.086 }, room: { dots } })
    await tell({ ...ASKED, scene: 'grip' })
    await guess(1, 0.2).expect(409)
    await guess(1, 0.2, { scene: 'grip' }).expect(200)
    expect(await room()).toMatchObject({ guesses: 1, dots: [{ value: 0.2, count: 1 }] })
  })

  it('off the scale or in another unit is refused by field, value and what is allowed', async () => {
    const { tell, guess } = await startedClass()
    await tell(ASKED)
    const high = await guess(1, 0.71).expect(422)
    expect(fieldOf(high)).toMatchObject({ path: 'value', value: 0.71, allowed: '0 to 0.7 m' })
    await guess(1, -0.01).expect(422)
    const feet = await guess(1, 0.3, { unit: 'ft' }).expect(422)
    expect(fieldOf(feet)).toMatchObject({ path: 'unit', value: 'ft' })
    const nameless = await guess(1, 0.3, { participant: 'me' }).expect(400)
    expect(fieldOf(nameless)).toMatchObject({ path: 'participant', value: 'me' })
    expect(fieldOf(await guess(1, 0.3, { name: 'Ann' }).expect(400))?.path).toBe('name')
  })
})

describe('events of a class', () => {
  it('begin with the state, follow each step, and end with the class', async () => {
    const { app, path, tell, guess, trainer } = await startedClass()
    await tell(ASKED)
    const server = await listening(app)
    const first = follow(`${server}${path}/events?participant=${phone(1)}`)
    const state = await first.next(({ scene }) => scene !== null)
    expect(state).toMatchObject({ status: 'open', step: 1, scene: { phase: 'question' } })
    expect(first.headers()).toMatchObject({
      'content-type': 'text/event-stream; charset=utf-8',
      'cache-control': 'no-store, no-transform',
      'x-accel-buffering': 'no',
    })
    expect(first.headers()).not.toHaveProperty('content-encoding')

    const second = follow(`${server}${path}/events?participant=${phone(2)}`)
    await first.next(({ room }) => room.participants === 2)
    await guess(1, 0.3)
    expect((await second.next(({ room }) => room.guesses === 1)).room.dots).toEqual([])
    await tell(SHOWN)
    const shown = await second.next(({ step }) => step === 2)
    expect(shown.room.dots).toEqual([{ value: 0.3, count: 1 }])

    second.hangUp()
    await first.next(({ room, step }) => room.participants === 1 && step === 2)
    await trainer.post(`${path}/closing`)
    await first.next(({ status }) => status === 'closed')
    await first.end()
  })

  it('are one event and the end for whoever does not ask for events', async () => {
    const { phones, path } = await startedClass()
    const { text } = await phones.get(`${path}/events`).expect(200)
    expect(text).toMatch(/^retry: \d+\n\nevent: state\ndata: \{.*\}\n\n$/)
  })
})
