import { mkdtempSync, rmSync } from 'node:fs'
import { createServer, type AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it, onTestFinished } from 'vitest'
import { healthSchema } from '../../shared/schemas/health'
import { SECRET } from '../support/server-app'
import { serverBundle } from '../support/server-bundle'
import { startNode } from '../support/server-process'

const program = await serverBundle('server/main.ts')

/** As `npm start` runs it. */
const UNBUNDLED = ['--import', 'tsx', 'server/main.ts']

const PRODUCTION = {
  NODE_ENV: 'production',
  APP_URL: 'https://toehold.example',
  SESSION_SECRET: SECRET,
  LOG_LEVEL: 'silent',
}

function temporaryDatabase(): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-main-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true })
  })
  return join(folder, 'toehold.sqlite')
}

function start(environment: Record<string, string> = {}, words: readonly string[] = [program]) {
  const defaults = { PORT: '0', HOST: '127.0.0.1', DATABASE_FILE: temporaryDatabase() }
  return startNode(words, { environment: { ...defaults, ...environment } })
}

/** A port that something else listens on until the test ends. */
async function takenPort(): Promise<number> {
  const other = createServer()
  await new Promise<void>((resolve) => other.listen(0, resolve))
  onTestFinished(() => void other.close())
  return (other.address() as AddressInfo).port
}

describe('the server', { timeout: 90_000 }, () => {
  it('prints its address once, answers there, and stops when it is told to', async () => {
    const { child, ended, firstLine } = start({}, UNBUNDLED)
    const line = await firstLine
    const address = /^Toehold \(demonstration\) is at (http:\/\/localhost:\d+)$/.exec(line)?.[1]
    const answer = await fetch(`${address!.replace('localhost', '127.0.0.1')}/api/health`)
    expect(healthSchema.parse(await answer.json()).mode).toBe('demonstration')
    child.kill('SIGINT')
    child.kill('SIGTERM')
    const { status, stdout, stderr } = await ended
    expect({ status, stdout, stderr }).toEqual({ status: 0, stdout: `${line}\n`, stderr: '' })
  })

  it('starts production with an address and a secret', async () => {
    const { firstLine } = start(PRODUCTION)
    expect(await firstLine).toMatch(/^Toehold \(production\) is at https:\/\/toehold\.example/)
  })

  it('prints a one-time link for the first administrator in production, until there is one', async () => {
    const DATABASE_FILE = temporaryDatabase()
    const first = start({ ...PRODUCTION, DATABASE_FILE })
    const link = await first.printed(/(https:\/\/toehold\.example\/invite\/[\w-]{43})/)
    const port = await first.printed(/\(port (\d+)\)/)
    const path = new URL(link).pathname.replace('/invite/', '/api/invitations/')
    const accepted = {
      name: 'Administrator',
      password: 'the password of the first one',
      email: 'first@people.test',
    }
    const answer = await fetch(`http://127.0.0.1:${port}${path}`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify(accepted),
    })
    expect(answer.status).toBe(201)
    first.child.kill('SIGTERM')
    expect((await first.ended).status).toBe(0)
    const second = start({ ...PRODUCTION, DATABASE_FILE })
    await second.firstLine
    second.child.kill('SIGTERM')
    expect((await second.ended).stdout).not.toContain('/invite/')
  })

  it('refuses production on the database of a demonstration', async () => {
    const DATABASE_FILE = temporaryDatabase()
    const demonstration = start({ DATABASE_FILE })
    await demonstration.firstLine
    demonstration.child.kill('SIGTERM')
    await demonstration.ended
    const { status, stdout, stderr } = await start({ ...PRODUCTION, DATABASE_FILE }).ended
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' })
    expect(stderr).toMatch(/^DATABASE_FILE: .* holds accounts of the demonstration/m)
  })

  it('stops although its mail server takes the call and says nothing', async () => {
    const silent = createServer()
    const isCalled = new Promise((resolve) => silent.once('connection', resolve))
    await new Promise<void>((resolve) => silent.listen(0, '127.0.0.1', resolve))
    onTestFinished(() => void silent.close())
    const SMTP_URL = `smtp://127.0.0.1:${(silent.address() as AddressInfo).port}`
    const { child, ended, printed } = start({ SMTP_URL, MAIL_FROM: 'toehold@mail.test' })
    const port = await printed(/localhost:(\d+)/)
    const answer = await fetch(`http://127.0.0.1:${port}/api/password-resets`, {
      method: 'POST',
      headers: { 'Content-Type': 'application/json' },
      body: JSON.stringify({ email: 'engineer.a@demo.invalid' }),
    })
    expect(answer.status).toBe(202)
    await isCalled
    child.kill('SIGTERM')
    expect((await ended).status).toBe(0)
  })

  it('refuses production without them, and names both', async () => {
    const { status, stdout, stderr } = await start({ NODE_ENV: 'production' }).ended
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' })
    expect(stderr).toMatch(/^APP_URL: /m)
    expect(stderr).toMatch(/^SESSION_SECRET: /m)
    expect(stderr).not.toContain('    at ')
  })

  it('says that its port is taken', async () => {
    const port = String(await takenPort())
    const { status, stderr } = await start({ PORT: port, HOST: '' }).ended
    expect(status).toBe(1)
    expect(stderr).toContain(`PORT: ${port} is in use`)
  })
})

describe('npm start', () => {
  it('says that the port is taken before it does anything else', async () => {
    const PORT = String(await takenPort())
    const { ended } = startNode(['server/cli/start.mjs'], { environment: { PORT } })
    const { status, stdout, stderr } = await ended
    expect({ status, stdout }).toEqual({ status: 1, stdout: '' })
    expect(stderr).toContain(`PORT: ${PORT} is in use`)
  })
})
