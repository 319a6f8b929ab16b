import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import request from 'supertest'
import { describe, expect, it, onTestFinished } from 'vitest'
import { problemSchema } from '../../shared/schemas/problem'
import { freshApp, SECRET } from '../support/server-app'

/** A built page in a folder whose name begins with a dot, as a checkout may lie in one. */
function builtPage(): string {
  const folder = mkdtempSync(join(tmpdir(), '.toehold-site-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true })
  })
  mkdirSync(join(folder, 'assets'))
  mkdirSync(join(folder, '.vite'))
  writeFileSync(join(folder, 'index.html'), '<!doctype html><title>Toehold</title>')
  writeFileSync(join(folder, 'favicon.svg'), '<svg xmlns="http://www.w3.org/2000/svg"/>')
  writeFileSync(join(folder, 'assets/index-1a2b.js'), `export const long = '${'x'.repeat(4000)}'`)
  writeFileSync(join(folder, '.vite/manifest.json'), '{}')
  return folder
}

function directives(policy: string | undefined): Record<string, string> {
  const parts = (policy ?? '').split(';').map((part) => part.trim().split(' '))
  return Object.fromEntries(parts.map(([name, ...sources]) => [name, sources.join(' ')]))
}

describe('every answer', () => {
  it('carries a policy under which nothing foreign or inline runs', async () => {
    const { headers } = await request(freshApp().app).get('/api/health')
    expect(directives(headers['content-security-policy'])).toEqual({
      'default-src': "'self'",
      'script-src': "'self'",
      'script-src-attr': "'none'",
      'worker-src': "'self'",
      'style-src': "'self'",
      'connect-src': "'self'",
      'img-src': "'self' data: blob:",
      'font-src': "'self'",
      'object-src': "'none'",
      'base-uri': "'none'",
      'frame-ancestors': "'none'",
      'form-action': "'self'",
    })
    expect(headers).toMatchObject({
      'x-content-type-options': 'nosniff',
      'x-frame-options': 'DENY',
    })
    expect(headers).not.toHaveProperty('x-powered-by')
    expect(headers).not.toHaveProperty('strict-transport-security')
  })

  it('insists on https where the program is reached by https', async () => {
    const environment = {
      NODE_ENV: 'production',
      APP_URL: 'https://toehold.example',
      SESSION_SECRET: SECRET,
    }
    const { headers } = await request(freshApp({ environment }).app).get('/api/health')
    expect(headers['content-security-policy']).toContain('upgrade-insecure-requests')
    expect(headers['strict-transport-security']).toBe('max-age=31536000')
  })

  it('carries the policy also when it is a refusal', async () => {
    const { headers } = await request(freshApp().app).get('/api/nothing').expect(404)
    expect(headers['content-security-policy']).toContain("script-src 'self'")
  })
})

describe('the page', () => {
  it.each(['/', '/method', '/projects/12/lines/3', '/?v=1&d=0.42'])(
    'answers the place %s, and is asked for anew each time',
    async (place) => {
      const { app } = freshApp({ siteFolder: builtPage() })
      const answer = await request(app).get(place).set('Accept', 'text/html').expect(200)
      expect(answer.text).toContain('<title>Toehold</title>')
      expect(answer.headers['cache-control']).toBe('no-cache')
    },
  )

  it('keeps hashed files for ever, and sends them compressed', async () => {
    const { app } = freshApp({ siteFolder: builtPage() })
    const answer = await request(app)
      .get('/assets/index-1a2b.js')
      .set('Accept-Encoding', 'gzip')
      .expect(200)
    expect(answer.headers['cache-control']).toBe('public, max-age=31536000, immutable')
    expect(answer.headers['content-encoding']).toBe('gzip')
  })

  it('does not keep files whose name stays the same', async () => {
    const { app } = freshApp({ siteFolder: builtPage() })
    const answer = await request(app).get('/favicon.svg').expect(200)
    expect(answer.headers['cache-control']).toBe('no-cache')
  })

  it.each([
    ['a missing file', 'get', '/assets/index-old.js', 'text/html,*/*'],
    ['a file of the build that is not for readers', 'get', '/.vite/manifest.json', '*/*'],
    ['a step out of the folder', 'get', '/assets/..%2f..%2fpackage.json', '*/*'],
    ['an unknown address of the API', 'get', '/api/nothing', 'text/html'],
    ['the API itself', 'get', '/api', 'text/html'],
    ['a place for a program that wants JSON', 'get', '/method', 'application/json'],
    ['another method', 'post', '/method', 'text/html'],
  ] as const)('is not the answer to %s', async (_what, method, address, accept) => {
    const { app } = freshApp({ siteFolder: builtPage() })
    const answer = await request(app)[method](address).set('Accept', accept)
    expect([403, 404]).toContain(answer.status)
    expect(problemSchema.parse(answer.body).code).toMatch(/not-found|bad-request/)
  })

  it('is missing until it is built, and then says so as a problem', async () => {
    const answer = await request(freshApp().app).get('/').set('Accept', 'text/html').expect(404)
    expect(problemSchema.parse(answer.body).code).toBe('not-found')
  })
})

describe('the log', () => {
  it('has a line for each request, without what opens a session', async () => {
    const lines: string[] = []
    const { app } = freshApp({ log: (line) => lines.push(line) })
    await request(app).get('/api/health').set('Cookie', 'session=abc').set('Authorization', 'xyz')
    expect(lines).toHaveLength(1)
    expect(lines[0]).toContain('/api/health')
    expect(lines[0]).not.toMatch(/session=abc|xyz/)
  })
})
