import { randomBytes } from 'node:crypto'
import {
  cpSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  writeFileSync,
} from 'node:fs'
import { tmpdir } from 'node:os'
import { join, relative } from 'node:path'
import Database from 'better-sqlite3'
import { create, extract } from 'tar'
import { describe, expect, it, onTestFinished } from 'vitest'
import { createBackup } from '../../server/backup/create-backup'
import { restoreBackup } from '../../server/backup/restore-backup'
import { FERRY_QUAY, ferryQuaySeed } from '../../server/demo/ferry-quay'
import { openFileStore } from '../../server/files/file-store'
import { addFile } from '../../server/modules/files/files.service'
import { saveScenario } from '../../server/modules/scenarios/save-scenario.service'
import { scenarioAt } from '../../server/modules/scenarios/open-scenario'
import { insertPeople, NOON } from '../support/project-server'
import { freshDatabase } from '../support/server-app'
import { serverBundle } from '../support/server-bundle'
import { startNode } from '../support/server-process'

const programs = {
  backup: await serverBundle('server/cli/backup.ts'),
  restore: await serverBundle('server/cli/restore.ts'),
}

const DOER = { accountId: 'demo-engineer-a', name: 'Engineer A' }
const PLACE = {
  projectId: FERRY_QUAY.project,
  lineId: FERRY_QUAY.behindTheKerb,
  scenarioId: `${FERRY_QUAY.behindTheKerb}-kerb`,
}
const PDF = Buffer.concat([Buffer.from('%PDF-1.7\n'), randomBytes(20_000)])

function temporaryFolder(): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-backup-test-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true, force: true })
  })
  return folder
}

/** A database in use, with a project and a file, and an archive of both. */
async function saved() {
  const folder = temporaryFolder()
  const databaseFile = join(folder, 'data', 'toehold.sqlite')
  const dataFolder = join(folder, 'data')
  const { db, close } = freshDatabase({}, databaseFile)
  insertPeople(db)
  ferryQuaySeed(() => NOON).run(db)
  const store = openFileStore(join(dataFolder, 'files'))
  const work = { db, now: () => NOON, store }
  const pdf = { name: 'plan.pdf', caption: '', bytes: PDF }
  const file = await addFile(work, DOER, FERRY_QUAY.project, pdf)
  const source = { databaseFile, dataFolder, programVersion: '1.2.3', at: NOON }
  const archive = join(folder, 'backup.tar.gz')
  return { folder, db, close, work, file, source, archive }
}

function target(folder: string, isForced = false) {
  const dataFolder = join(folder, 'restored')
  return { databaseFile: join(dataFolder, 'toehold.sqlite'), dataFolder, at: NOON, isForced }
}

/** Rows of a database file that nobody has open. */
function rowsOf(databaseFile: string, query: string): unknown {
  const connection = new Database(databaseFile, { readonly: true })
  try {
    expect(connection.pragma('integrity_check', { simple: true })).toBe('ok')
    return connection.prepare(query).pluck().all()
  } finally {
    connection.close()
  }
}

const VERSION = `SELECT version FROM scenarios WHERE id = '${PLACE.scenarioId}'`
const VERSIONS = `SELECT count(*) FROM scenario_versions WHERE scenario_id = '${PLACE.scenarioId}'`
const SAVES = `SELECT count(*) FROM audit_entries WHERE action = 'scenario.saved'`
const NAMES = `SELECT name FROM scenarios WHERE id = '${PLACE.scenarioId}'`

/** Writes the archive anew after something was changed in it. */
async function tampered(archive: string, change: (unpacked: string) => void): Promise<string> {
  const folder = temporaryFolder()
  await extract({ file: archive, cwd: folder })
  change(folder)
  const changed = join(temporaryFolder(), 'changed.tar.gz')
  const paths = readdirSync(folder, { recursive: true, encoding: 'utf8', withFileTypes: true })
    .filter((entry) => entry.isFile())
    .map((entry) => relative(folder, join(entry.parentPath, entry.name)))
  await create({ gzip: true, file: changed, cwd: folder }, paths)
  return changed
}

describe('a backup', { timeout: 60_000 }, () => {
  it('holds one moment of a database that others go on writing, and all of its files', async () => {
    const { db, work, source, archive, folder, file } = await saved()
    const save = () => {
      const { version, content, note } = scenarioAt(db, PLACE)
      const text = { name: `Version ${version + 1}`, note, content }
      return saveScenario(work, DOER, PLACE, { ...text, version }).version
    }
    const before = save()
    expect(existsSync(`${source.databaseFile}-wal`)).toBe(true)
    const environment = { DATABASE_FILE: source.databaseFile }
    const { child, ended } = startNode([programs.backup, archive], { environment })
    let after = before
    while (child.exitCode === null) {
      after = save()
      await new Promise((resolve) => setTimeout(resolve, 5))
    }
    expect(await ended).toMatchObject({ status: 0, stderr: '' })
    expect(after).toBeGreaterThan(before)

    const restored = target(folder)
    const { putAside, manifest } = await restoreBackup(archive, restored)
    expect(putAside).toEqual([])
    expect(manifest.entries.map(({ path }) => path)).toEqual(['toehold.sqlite', `files/${file.id}`])
    const [version] = rowsOf(restored.databaseFile, VERSION) as [number]
    expect(version).toBeGreaterThanOrEqual(before)
    expect(version).toBeLessThanOrEqual(after)
    // What one save writes into three tables is there as a whole.
    expect(rowsOf(restored.databaseFile, NAMES)).toEqual([`Version ${version}`])
    expect(rowsOf(restored.databaseFile, VERSIONS)).toEqual([version])
    expect(rowsOf(restored.databaseFile, SAVES)).toEqual([version - 1])
    expect(readFileSync(join(restored.dataFolder, 'files', file.id))).toEqual(PDF)
    expect(readdirSync(restored.dataFolder).sort()).toEqual(['files', 'toehold.sqlite'])
    // The program works with it as with any other.
    const again = freshDatabase({}, restored.databaseFile)
    expect(scenarioAt(again.db, PLACE).version).toBe(version)
  })

  it('never takes the place of an older one, and leaves nothing half done', async () => {
    const { source, archive, folder, file } = await saved()
    await createBackup(source, archive)
    await expect(createBackup(source, archive)).rejects.toThrow('exists already')
    rmSync(join(source.dataFolder, 'files', file.id))
    await expect(createBackup(source, join(folder, 'b.tar.gz'))).rejects.toThrow('are missing')
    writeFileSync(join(source.dataFolder, 'files', file.id), 'other bytes')
    await expect(createBackup(source, join(folder, 'b.tar.gz'))).rejects.toThrow('not those')
    const nowhere = { ...source, databaseFile: join(folder, 'none.sqlite') }
    await expect(createBackup(nowhere, join(folder, 'b.tar.gz'))).rejects.toThrow('no database')
    expect(readdirSync(folder).sort()).toEqual(['backup.tar.gz', 'data'])
  })
})

describe('a restore', { timeout: 60_000 }, () => {
  it('does not touch what is there unless it is told to, and then puts it aside', async () => {
    const { source, archive, db, work, close, file } = await saved()
    await createBackup(source, archive)
    const { version, content, note } = scenarioAt(db, PLACE)
    saveScenario(work, DOER, PLACE, { name: 'Later', note, version, content })
    const later = { name: 'later.pdf', caption: '', bytes: PDF }
    const stranger = await addFile(work, DOER, FERRY_QUAY.project, later)
    const here = { ...source, isForced: false }
    await expect(restoreBackup(archive, here)).rejects.toThrow('--force')
    const forced = { ...source, isForced: true }
    await expect(restoreBackup(archive, forced)).rejects.toThrow('stop the server first')
    expect(scenarioAt(db, PLACE).name).toBe('Later')
    close()

    const { putAside } = await restoreBackup(archive, forced)
    expect(rowsOf(source.databaseFile, NAMES)).not.toEqual(['Later'])
    expect(rowsOf(putAside[0]!, NAMES)).toEqual(['Later'])
    expect(readdirSync(join(source.dataFolder, 'files'))).toEqual([file.id])
    expect(readdirSync(putAside[1]!)).toEqual([stranger.id])
    expect(existsSync(`${source.databaseFile}-wal`)).toBe(false)
  })

  it('takes the place of a database that is harmed', async () => {
    const { source, archive, close } = await saved()
    await createBackup(source, archive)
    close()
    writeFileSync(source.databaseFile, randomBytes(9000))
    writeFileSync(`${source.databaseFile}-wal`, randomBytes(9000))
    await restoreBackup(archive, { ...source, isForced: true })
    expect(rowsOf(source.databaseFile, NAMES)).toEqual(['Behind the kerb, 0.70 m'])
  })

  it('refuses an archive of which a byte changed or is missing', async () => {
    const { source, archive, folder } = await saved()
    await createBackup(source, archive)
    const bytes = readFileSync(archive)
    const harmed = join(folder, 'harmed.tar.gz')
    for (const share of [0.1, 0.5, 0.9]) {
      const copy = Buffer.from(bytes)
      const at = Math.floor(share * copy.length)
      copy[at] = copy[at]! ^ 0xff
      writeFileSync(harmed, copy)
      await expect(restoreBackup(harmed, target(folder)), String(share)).rejects.toThrow(/archive/)
      writeFileSync(harmed, bytes.subarray(0, at))
      await expect(restoreBackup(harmed, target(folder)), String(share)).rejects.toThrow(/archive/)
    }
    expect(readdirSync(target(folder).dataFolder)).toEqual([])
    await expect(restoreBackup(join(folder, 'none'), target(folder))).rejects.toThrow(
      'no such file',
    )
  })

  it('refuses an archive that holds anything else than it says', async () => {
    const { source, archive, folder, file } = await saved()
    await createBackup(source, archive)
    const cases: [string, (unpacked: string) => void, RegExp][] = [
      [
        'other bytes',
        (at) => {
          writeFileSync(join(at, 'files', file.id), PDF.subarray(1))
        },
        /not what was saved/,
      ],
      [
        'a file less',
        (at) => {
          rmSync(join(at, 'files', file.id))
        },
        /lacks files/,
      ],
      [
        'a file more',
        (at) => {
          cpSync(join(at, 'files', file.id), join(at, 'files', `${file.id}.preview`))
        },
        /does not know/,
      ],
      [
        'a stranger',
        (at) => {
          mkdirSync(join(at, 'server'))
          writeFileSync(join(at, 'server/main.ts'), '')
        },
        /holds what no backup holds/,
      ],
      [
        'no manifest',
        (at) => {
          rmSync(join(at, 'manifest.json'))
        },
        /no manifest/,
      ],
    ]
    for (const [what, change, reason] of cases) {
      const changed = await tampered(archive, change)
      await expect(restoreBackup(changed, target(folder)), what).rejects.toThrow(reason)
    }
    expect(existsSync(target(folder).databaseFile)).toBe(false)
  })
})

describe('npm run backup and npm run restore', { timeout: 120_000 }, () => {
  it('save and bring back what the environment names', async () => {
    const { source, archive, folder } = await saved()
    const run = (command: keyof typeof programs, words: readonly string[], dataFolder: string) => {
      const DATABASE_FILE = join(dataFolder, 'toehold.sqlite')
      const options = { environment: { DATABASE_FILE } }
      return startNode([programs[command], ...words], options).ended
    }
    const backup = await run('backup', [archive], source.dataFolder)
    expect(backup).toMatchObject({ status: 0, stderr: '' })
    expect(backup.stdout).toContain('the database and 1 files')
    const elsewhere = join(folder, 'elsewhere')
    const first = await run('restore', [archive], elsewhere)
    expect(first).toMatchObject({ status: 0, stderr: '' })
    const second = await run('restore', [archive], elsewhere)
    expect(second).toMatchObject({ status: 1, stdout: '' })
    expect(second.stderr).toContain('--force')
    expect((await run('restore', [archive, '--force'], elsewhere)).status).toBe(0)
    const usage = await run('backup', [], elsewhere)
    expect(usage).toMatchObject({ status: 1, stdout: '' })
    expect(usage.stderr).toMatch(/^npm run backup -- FILE/)
  })
})
