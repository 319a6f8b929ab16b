import { existsSync } from 'node:fs'
import { copyFile, mkdir, mkdtemp, open, rename, rm, writeFile } from 'node:fs/promises'
import { dirname, join, resolve } from 'node:path'
import { create } from 'tar'
import { FILES_FOLDER } from '../files/file-store'
import { isImage } from '../files/media-type'
import { BackupError } from './backup-error'
import {
  appliedMigrations,
  databaseFaults,
  type FileRow,
  hasFileRow,
  listFileRows,
  writeSnapshot,
} from './backup.queries'
import { checksumOf, DATABASE, describeEntry, MANIFEST, type Manifest } from './manifest'

export interface BackupSource {
  readonly databaseFile: string
  readonly dataFolder: string
  readonly programVersion: string
  /** Moment of the backup [ms since 1970]. */
  readonly at: number
}

/** A file that goes while it is copied makes the snapshot old; more often than this is no accident. */
const MOST_TRIES = 3

/**
 * Writes database and files into one archive, while the server goes on.
 *
 * @throws BackupError where there is nothing to save, or where it is harmed.
 */
export async function createBackup(source: BackupSource, archive: string): Promise<Manifest> {
  const target = resolve(archive)
  if (existsSync(target)) {
    throw new BackupError(`${archive} exists already; choose another name`)
  }
  if (!existsSync(source.databaseFile)) {
    throw new BackupError(`DATABASE_FILE: there is no database at ${source.databaseFile}`)
  }
  await mkdir(dirname(target), { recursive: true })
  const staging = await mkdtemp(join(dirname(target), '.toehold-backup-'))
  try {
    await gather(source, staging)
    const manifest = await writeManifest(source, staging)
    await pack(staging, manifest, target)
    return manifest
  } finally {
    await rm(staging, { recursive: true, force: true })
  }
}

async function gather(source: BackupSource, staging: string): Promise<void> {
  for (let attempt = 1; attempt <= MOST_TRIES; attempt += 1) {
    const snapshot = join(staging, DATABASE)
    await rm(snapshot, { force: true })
    await rm(join(staging, FILES_FOLDER), { recursive: true, force: true })
    writeSnapshot(source.databaseFile, snapshot)
    const [fault] = databaseFaults(snapshot)
    if (fault !== undefined) throw new BackupError(`The database is harmed: ${fault}`)
    if (await copyFiles(source, staging, listFileRows(snapshot))) return
  }
  throw new BackupError('Files were deleted while they were saved; try again')
}

/** False where a file was deleted since the snapshot, which then has to be taken again. */
async function copyFiles(
  { databaseFile, dataFolder }: BackupSource,
  staging: string,
  rows: readonly FileRow[],
): Promise<boolean> {
  const from = join(dataFolder, FILES_FOLDER)
  const to = join(staging, FILES_FOLDER)
  await mkdir(to, { recursive: true })
  for (const { id, sha256, mediaType } of rows) {
    const names = isImage(mediaType) ? [id, `${id}.preview`] : [id]
    const isThere = names.every((name) => existsSync(join(from, name)))
    if (!isThere && !hasFileRow(databaseFile, id)) return false
    if (!isThere) throw new BackupError(`The bytes of file ${id} are missing in ${from}`)
    for (const name of names) await copyFile(join(from, name), join(to, name))
    if ((await checksumOf(join(to, id))) !== sha256) {
      throw new BackupError(`The bytes of file ${id} in ${from} are not those that were added`)
    }
  }
  return true
}

async function writeManifest(source: BackupSource, staging: string): Promise<Manifest> {
  const snapshot = join(staging, DATABASE)
  const paths = listFileRows(snapshot).flatMap(({ id, mediaType }) => {
    const path = `${FILES_FOLDER}/${id}`
    return isImage(mediaType) ? [path, `${path}.preview`] : [path]
  })
  const entries = []
  for (const path of [DATABASE, ...paths]) entries.push(await describeEntry(staging, path))
  const manifest: Manifest = {
    format: 'toehold-backup',
    formatVersion: 1,
    programVersion: source.programVersion,
    createdAt: new Date(source.at).toISOString(),
    schemaVersion: appliedMigrations(snapshot).length,
    entries,
  }
  await writeFile(join(staging, MANIFEST), JSON.stringify(manifest, null, 2))
  return manifest
}

/** The archive has its name only once it is whole and on the disk. */
async function pack(staging: string, { entries }: Manifest, target: string): Promise<void> {
  const unfinished = join(staging, 'archive.tar.gz')
  const paths = [MANIFEST, ...entries.map(({ path }) => path)]
  await create({ gzip: true, file: unfinished, cwd: staging, portable: true }, paths)
  const file = await open(unfinished, 'r+')
  try {
    await file.chmod(0o600)
    await file.sync()
  } finally {
    await file.close()
  }
  await rename(unfinished, target)
}
