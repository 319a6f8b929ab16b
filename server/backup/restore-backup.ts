import { existsSync } from 'node:fs'
import { copyFile, mkdir, mkdtemp, open, readdir, rename, rm } from 'node:fs/promises'
import { basename, dirname, join } from 'node:path'
import { FILES_FOLDER } from '../files/file-store'
import { BackupError } from './backup-error'
import { takeOutOfUse } from './backup.queries'
import { DATABASE, type Manifest } from './manifest'
import { openArchive } from './open-archive'

export interface RestoreTarget {
  readonly databaseFile: string
  readonly dataFolder: string
  /** Moment of the restore, for the names of what was there [ms since 1970]. */
  readonly at: number
  /** Put aside what is there. */
  readonly isForced: boolean
}

export interface Restored {
  readonly manifest: Manifest
  /** Where that lies now which was there before. */
  readonly putAside: readonly string[]
}

/**
 * Puts a backup in the place of what is there. The archive is checked before anything is touched; files
 * come first, which have names of their own, and one rename of the database makes it count. What was
 * there is put aside.
 *
 * @throws BackupError
 */
export async function restoreBackup(archive: string, target: RestoreTarget): Promise<Restored> {
  if (!existsSync(archive)) throw new BackupError(`${archive}: there is no such file`)
  const { databaseFile, dataFolder } = target
  await mkdir(dataFolder, { recursive: true })
  await mkdir(dirname(databaseFile), { recursive: true })
  const staging = await mkdtemp(join(dataFolder, '.toehold-restore-'))
  const fresh = `${databaseFile}.restoring`
  try {
    const manifest = await openArchive(archive, staging)
    await assertFree(target)
    await copyFile(join(staging, DATABASE), fresh)
    await syncPath(fresh)
    await moveFilesIn(staging, dataFolder)
    const oldDatabase = await replaceDatabase(target, fresh)
    const oldFiles = await putStrangersAside(target, manifest)
    return { manifest, putAside: [...oldDatabase, ...oldFiles] }
  } finally {
    await rm(fresh, { force: true })
    await rm(staging, { recursive: true, force: true })
  }
}

async function assertFree({ databaseFile, dataFolder, isForced }: RestoreTarget): Promise<void> {
  const files = join(dataFolder, FILES_FOLDER)
  const hasFiles = existsSync(files) && (await readdir(files)).length > 0
  const hasDatabase = existsSync(databaseFile)
  if ((hasDatabase || hasFiles) && !isForced) {
    const there = hasDatabase ? databaseFile : files
    throw new BackupError(`${there} is there already; --force puts it aside and restores`)
  }
  if (hasDatabase && takeOutOfUse(databaseFile) === 'in-use') {
    throw new BackupError(`${databaseFile} is in use; stop the server first`)
  }
}

async function moveFilesIn(staging: string, dataFolder: string): Promise<void> {
  const from = join(staging, FILES_FOLDER)
  const to = join(dataFolder, FILES_FOLDER)
  await mkdir(to, { recursive: true, mode: 0o700 })
  if (!existsSync(from)) return
  for (const name of await readdir(from)) {
    await syncPath(join(from, name))
    await rename(join(from, name), join(to, name))
  }
  await syncPath(to)
}

/** Files of SQLite that belong to a database which was not closed. */
const COMPANIONS = ['-wal', '-shm', '-journal']

async function replaceDatabase(target: RestoreTarget, fresh: string): Promise<readonly string[]> {
  const { databaseFile } = target
  const aside = asideName(databaseFile, target.at)
  const hadDatabase = existsSync(databaseFile)
  if (hadDatabase) await copyFile(databaseFile, aside)
  // A log of the old database would be played into the new one.
  for (const ending of COMPANIONS) {
    const companion = `${databaseFile}${ending}`
    if (existsSync(companion)) await rename(companion, `${aside}${ending}`)
  }
  await rename(fresh, databaseFile)
  await syncPath(dirname(databaseFile))
  return hadDatabase ? [aside] : []
}

/** Files that the restored database does not name. */
async function putStrangersAside(
  { dataFolder, at }: RestoreTarget,
  { entries }: Manifest,
): Promise<readonly string[]> {
  const folder = join(dataFolder, FILES_FOLDER)
  const known = new Set(entries.map(({ path }) => basename(path)))
  const strangers = (await readdir(folder)).filter((name) => !known.has(name))
  if (strangers.length === 0) return []
  const aside = asideName(folder, at)
  await mkdir(aside, { recursive: true, mode: 0o700 })
  for (const name of strangers) await rename(join(folder, name), join(aside, name))
  return [aside]
}

/** `toehold.sqlite.before-2031-03-03T12-00-00-000Z` */
function asideName(path: string, at: number): string {
  return `${path}.before-${new Date(at).toISOString().replaceAll(/[:.]/g, '-')}`
}

async function syncPath(path: string): Promise<void> {
  const handle = await open(path, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}
