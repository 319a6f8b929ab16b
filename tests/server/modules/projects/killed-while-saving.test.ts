import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import Database from 'better-sqlite3'
import { describe, expect, it, onTestFinished } from 'vitest'
import { FERRY_QUAY } from '../../../../server/demo/ferry-quay'
import type { Scenario } from '../../../../shared/schemas/project'
import { type ApiClient, clientWith, signIn } from '../../../support/api-client'
import { serverBundle } from '../../../support/server-bundle'
import { type Running, startNode } from '../../../support/server-process'

const program = await serverBundle('server/main.ts')

const KILLS = 20
const PATH =
  `/api/projects/${FERRY_QUAY.project}/lines/${FERRY_QUAY.behindTheKerb}` +
  `/scenarios/${FERRY_QUAY.behindTheKerb}-kerb`

function databaseFile(): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-kill-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true, force: true })
  })
  return join(folder, 'toehold.sqlite')
}

async function start(file: string): Promise<Running & { address: string }> {
  const environment = { PORT: '0', HOST: '127.0.0.1', DATABASE_FILE: file }
  const running = startNode([program], { environment })
  const port = /localhost:(\d+)$/.exec(await running.firstLine)?.[1]
  return { ...running, address: `http://127.0.0.1:${String(port)}` }
}

async function read(client: ApiClient): Promise<Scenario> {
  return (await (await client.get(PATH)).json()) as Scenario
}

/**
 * Saves on and on until the server is gone; gives the last save that was acknowledged.
 *
 * @param onFirst Told once that saves are under way.
 */
async function saveUntilGone(
  client: ApiClient,
  first: Scenario,
  onFirst: () => void,
): Promise<Scenario> {
  let last = first
  for (let i = 1; ; i += 1) {
    const { version, content, note } = last
    const name = `Save ${i} on version ${version}`
    const body = { version, note, name, content: { ...content, waterLevel: 3 + (i % 50) / 100 } }
    try {
      const answer = await client.send('PUT', PATH, body)
      const saved = (await answer.json()) as Scenario
      if (answer.status !== 200) throw new TypeError('Not acknowledged')
      last = saved
      if (i === 1) onFirst()
    } catch (error) {
      // What fetch throws once nobody answers; anything else is a fault of the test.
      if (error instanceof TypeError || error instanceof SyntaxError) return last
      throw error
    }
  }
}

/** Every acknowledged save is a version, and the database is whole. */
function assertNothingLost(file: string, acknowledged: ReadonlyMap<number, string>): void {
  const connection = new Database(file, { readonly: true })
  try {
    expect(connection.pragma('integrity_check', { simple: true })).toBe('ok')
    expect(connection.pragma('foreign_key_check')).toEqual([])
    const rows = connection
      .prepare('SELECT version, name FROM scenario_versions WHERE scenario_id = ?')
      .all(`${FERRY_QUAY.behindTheKerb}-kerb`) as { version: number; name: string }[]
    const kept = new Map(rows.map(({ version, name }) => [version, name]))
    for (const [version, name] of acknowledged) expect(kept.get(version)).toBe(name)
    const saves = connection
      .prepare(`SELECT count(*) FROM audit_entries WHERE action = 'scenario.saved'`)
      .pluck()
      .get() as number
    // A version without its line in the audit trail, or the other way round, would be half a change.
    expect(saves).toBe(kept.size - 1)
  } finally {
    connection.close()
  }
}

describe('a server that is killed while it saves', { timeout: 480_000 }, () => {
  it('loses no acknowledged save, twenty times over', async () => {
    const file = databaseFile()
    const acknowledged = new Map<number, string>()
    let version = 0
    let cookie = ''
    for (let kill = 0; kill < KILLS; kill += 1) {
      const { child, ended, address } = await start(file)
      // A session outlives the server that opened it.
      cookie ||= await signIn(address, 'engineerA')
      const client = clientWith(address, cookie)
      const found = await read(client)
      expect(found.version).toBeGreaterThanOrEqual(version)
      // From at once to many saves later; the step shares no factor with the time of a save.
      const last = await saveUntilGone(client, found, () => {
        setTimeout(() => child.kill('SIGKILL'), (kill * 97) % 211)
      })
      await ended
      acknowledged.set(last.version, last.name)
      version = last.version
      assertNothingLost(file, acknowledged)
    }
    console.log(`killed ${KILLS} times, ${version} versions saved, none of them lost`)
    expect(version).toBeGreaterThanOrEqual(KILLS)
  })
})
