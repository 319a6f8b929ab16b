import { afterEach, describe, expect, it, vi } from 'vitest'
import { ApiError, getJson, sendForm, sendJson, whenSessionEnds } from '../../../src/api/request'
import { fakeApi, field, refuse } from '../support/fake-api'

afterEach(() => {
  whenSessionEnds(() => Promise.resolve(false))
  vi.unstubAllGlobals()
})

const failure = (asked: Promise<unknown>) =>
  asked.then(
    () => expect.unreachable('it was answered'),
    (error: unknown) => error as ApiError,
  )

describe('a request', () => {
  it('gives what the server answers, and nothing where it answers nothing', async () => {
    const api = fakeApi({
      'GET /api/things': () => ({ things: [] }),
      'PATCH /api/things': () => undefined,
    })
    expect(await getJson('/api/things')).toEqual({ things: [] })
    expect(await sendJson('PATCH', '/api/things', { name: 'Quay' })).toBeUndefined()
    expect(api.sent('PATCH /api/things')).toEqual([{ name: 'Quay' }])
  })

  it('sends a form with files as it is', async () => {
    const api = fakeApi({ 'POST /api/files': () => ({ id: 'file-1' }) })
    const form = new FormData()
    form.append('file', new Blob(['x']), 'x.txt')
    expect(await sendForm('POST', '/api/files', form)).toEqual({ id: 'file-1' })
    expect(api.sent('POST /api/files')).toEqual([form])
  })

  it('says which fields were refused', async () => {
    const fields = [field('name', '1 character or more')]
    fakeApi({ 'POST /api/things': () => refuse(400, 'invalid-input', { fields }) })
    const error = await failure(sendJson('POST', '/api/things', {}))
    expect(error).toBeInstanceOf(ApiError)
    expect(error).toMatchObject({ status: 400, code: 'invalid-input', fields, isOffline: false })
  })

  it('says how long to wait', async () => {
    fakeApi({ 'GET /api/things': () => refuse(429, 'too-many-requests', { retryAfter: 8 }) })
    expect((await failure(getJson('/api/things'))).retryAfter).toBe(8)
  })

  it('tells a server that does not answer from one that refuses', async () => {
    vi.stubGlobal('fetch', () => Promise.reject(new TypeError('no network')))
    expect(await failure(getJson('/api/things'))).toMatchObject({ isOffline: true, code: null })
  })

  it('survives an answer in a shape of somebody else', async () => {
    fakeApi({ 'GET /api/things': () => new Response('<h1>Bad gateway</h1>', { status: 502 }) })
    expect(await failure(getJson('/api/things'))).toMatchObject({ status: 502, fields: [] })
  })
})

describe('an ended session', () => {
  it('is renewed, and the request repeated with the same body', async () => {
    let isSignedIn = false
    whenSessionEnds(() => {
      isSignedIn = true
      return Promise.resolve(true)
    })
    const api = fakeApi({
      'PUT /api/things': () => (isSignedIn ? { version: 2 } : refuse(401, 'sign-in-required')),
    })
    expect(await sendJson('PUT', '/api/things', { note: 'typed' })).toEqual({ version: 2 })
    expect(api.sent('PUT /api/things')).toEqual([{ note: 'typed' }, { note: 'typed' }])
  })

  it('is told where nobody signs in again', async () => {
    const api = fakeApi({ 'GET /api/things': () => refuse(401, 'sign-in-required') })
    expect((await failure(getJson('/api/things'))).code).toBe('sign-in-required')
    expect(api.calls).toHaveLength(1)
  })

  it('is not asked about while signing in: a wrong password is refused with the same code', async () => {
    const again = vi.fn(() => Promise.resolve(true))
    whenSessionEnds(again)
    fakeApi({ 'POST /api/session': () => refuse(401, 'sign-in-required') })
    await failure(sendJson('POST', '/api/session', {}))
    expect(again).not.toHaveBeenCalled()
  })
})
