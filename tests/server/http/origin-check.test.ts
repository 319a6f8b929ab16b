import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { sessionAnswerSchema } from '../../../shared/schemas/account'
import { makePerson, PASSWORD } from '../../support/people'
import { freshApp, SECRET } from '../../support/server-app'

const APP_URL = 'https://toehold.example'
const COOKIE = '__Host-toehold-session=whatever'

type Headers = Record<string, string>

function start() {
  return freshApp({ environment: { APP_URL, SESSION_SECRET: SECRET } }).app
}

/** Signing out is open to anyone, so that only the origin decides. */
const change = (headers: Headers) => request(start()).delete('/api/session').set(headers)

describe('a change', () => {
  it.each<[string, Headers]>([
    ['from the address of the program', { Origin: APP_URL, Cookie: COOKIE }],
    ['from the host that it came to', { Origin: 'http://10.1.2.3:3000', Host: '10.1.2.3:3000' }],
    ['that the browser calls our own', { 'Sec-Fetch-Site': 'same-origin', Cookie: COOKIE }],
    ['from no browser and without a session', {}],
  ])('is taken %s', async (_what, headers) => {
    await change(headers).expect(204)
  })

  it.each<[string, Headers]>([
    ['another site', { Origin: 'https://elsewhere.example', Cookie: COOKIE }],
    ['another site, even without a session', { Origin: 'https://elsewhere.example' }],
    ['a site whose name begins like ours', { Origin: `${APP_URL}.elsewhere.example` }],
    ['another scheme', { Origin: 'http://toehold.example', Host: 'other.example' }],
    ['another port', { Origin: `${APP_URL}:8443`, Cookie: COOKIE }],
    ['a page without an origin', { Origin: 'null', Cookie: COOKIE }],
    ['what is no address', { Origin: 'toehold', Host: '' }],
    ['a sister site', { 'Sec-Fetch-Site': 'same-site', Cookie: COOKIE }],
    ['a foreign page of a browser that hides its origin', { 'Sec-Fetch-Site': 'cross-site' }],
    ['a program that holds a session and says no origin', { Cookie: COOKIE }],
  ])('is refused from %s', async (_what, headers) => {
    const { body } = await change(headers).expect(403)
    expect(body.code).toBe('forbidden')
    expect(body.message).toContain(APP_URL)
  })

  it('is refused before anything of it is done', async () => {
    const { app, parts } = freshApp()
    const { email } = makePerson(parts)
    const answer = await request(app)
      .post('/api/session')
      .set('Origin', 'https://elsewhere.example')
      .send({ email, password: PASSWORD })
      .expect(403)
    expect(answer.headers).not.toHaveProperty('set-cookie')
  })
})

describe('reading', () => {
  it('needs no origin, for it changes nothing', async () => {
    const { body } = await request(start())
      .get('/api/session')
      .set({ Origin: 'https://elsewhere.example', Cookie: COOKIE })
      .expect(200)
    expect(sessionAnswerSchema.parse(body).account).toBeNull()
  })

  it('is never allowed to pages of another site', async () => {
    const { headers } = await request(start())
      .get('/api/session')
      .set('Origin', 'https://elsewhere.example')
    expect(headers).not.toHaveProperty('access-control-allow-origin')
  })
})
