import { spawn } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { Agent, request } from 'node:http'
import { cpus, loadavg, tmpdir } from 'node:os'
import { join } from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { DEMO_PASSWORD, DEMO_PEOPLE } from '../../server/demo/demo-people'
import type { ClassItem, ClassScene, ClassState } from '../../shared/schemas/class'

/** Phones that follow, steps of the trainer, and what they may cost. */
const [PHONES, STEPS] = [200, 20]
const GATES = { step: 500, growth: 40 } as const

const port = Number(process.env.BENCH_PORT ?? 3477)
const origin = `http://localhost:${port}`
const folder = mkdtempSync(join(tmpdir(), 'toehold-bench-'))
const server = spawn(process.execPath, ['--import', 'tsx', 'server/main.ts'], {
  env: {
    ...process.env,
    ...{ PORT: String(port), NODE_ENV: 'test', DATABASE_FILE: join(folder, 'bench.sqlite') },
  },
  stdio: ['ignore', 'ignore', 'inherit'],
})

/** Memory that the server holds [MB], as the kernel counts it. */
function memory(): number {
  const status = readFileSync(`/proc/${server.pid}/status`, 'utf8')
  return Number(/^VmRSS:\s+(\d+)/m.exec(status)![1]) / 1024
}

let cookie = ''
async function ask<Answer>(method: string, path: string, body?: unknown): Promise<Answer> {
  const headers = { origin, 'content-type': 'application/json', cookie }
  const sent = body === undefined ? {} : { body: JSON.stringify(body) }
  const answer = await fetch(origin + path, { method, headers, ...sent })
  if (!answer.ok) throw new Error(`${method} ${path}: ${answer.status} ${await answer.text()}`)
  cookie ||= answer.headers.getSetCookie()[0]?.split(';')[0] ?? ''
  return (await answer.json()) as Answer
}

async function started(): Promise<void> {
  for (let tries = 0; tries < 600; tries++) {
    const isUp = await fetch(`${origin}/api/health`).then(
      ({ ok }) => ok,
      () => false,
    )
    if (isUp) return
    await wait(100)
  }
  throw new Error('the server did not start')
}

const agent = new Agent({ maxSockets: Infinity })
let dropped = 0
/** Follows and takes down when each step arrived. */
function follow(path: string, n: number): Promise<Map<number, number>> {
  const arrived = new Map<number, number>()
  const address = `${origin}${path}/events?participant=phone-of-the-bench-${n}`
  return new Promise((resolve, reject) => {
    request(address, { agent, headers: { accept: 'text/event-stream' } }, (answer) => {
      let rest = ''
      answer.setEncoding('utf8').on('data', (part: string) => {
        const events = (rest + part).split('\n\n')
        rest = events.pop() ?? ''
        for (const event of events) {
          const data = /^event: state\ndata: (.*)$/.exec(event)?.[1]
          if (data === undefined) continue
          const { step } = JSON.parse(data) as ClassState
          if (!arrived.has(step)) arrived.set(step, performance.now())
          resolve(arrived)
        }
      })
      answer.on('close', () => (dropped += 1))
    })
      .on('error', reject)
      .end()
  })
}

const sceneOf = (n: number): ClassScene => ({
  ...{ course: 'bench', scene: `scene-${Math.ceil(n / 2)}`, title: '', question: 'How deep?' },
  ...{ phase: n % 2 === 1 ? 'question' : 'shown', units: 'metric', answer: 0.2 },
  guess: { kind: 'length', min: 0, max: 0.7, step: 0.01 },
})

async function measure(): Promise<boolean> {
  await started()
  const { email } = Object.values(DEMO_PEOPLE).find(({ role }) => role === 'trainer')!
  await ask('POST', '/api/session', { email, password: DEMO_PASSWORD })
  const { code } = await ask<ClassItem>('POST', '/api/classes')
  const path = `/api/classes/${code}`
  await ask('PUT', `${path}/scene`, sceneOf(1))
  const before = memory()
  const phones = await Promise.all(Array.from({ length: PHONES }, (_, n) => follow(path, n)))
  await wait(1000)
  const delays: number[] = []
  let missed = 0
  for (let step = 2; step < 2 + STEPS; step++) {
    const told = performance.now()
    await ask('PUT', `${path}/scene`, sceneOf(step))
    await wait(250)
    for (const arrived of phones) {
      const at = arrived.get(step)
      if (at === undefined) missed += 1
      else delays.push(at - told)
    }
  }
  const growth = memory() - before
  const p95 = delays.sort((a, b) => a - b)[Math.ceil(delays.length * 0.95) - 1] ?? Infinity
  process.stdout.write(
    `${cpus()[0]?.model ?? 'unknown processor'}, load ${loadavg()[0]!.toFixed(1)}\n` +
      `${PHONES} phones, ${STEPS} steps: 95th percentile ${p95.toFixed(0)} ms (gate ${GATES.step}), ` +
      `dropped ${dropped}, not within 250 ms of the answer ${missed}, ` +
      `memory +${growth.toFixed(1)} MB (gate ${GATES.growth})\n`,
  )
  // What is late counts as later than any gate.
  const isLate = missed > delays.length * 0.05
  return p95 <= GATES.step && !isLate && dropped === 0 && growth <= GATES.growth
}

const isGood = await measure().finally(() => {
  server.kill('SIGTERM')
  rmSync(folder, { recursive: true, force: true })
})
process.exit(isGood ? 0 : 1)
