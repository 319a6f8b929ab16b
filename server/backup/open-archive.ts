import { readdir, readFile } from 'node:fs/promises'
import { join } from 'node:path'
import { extract } from 'tar'
import { FILES_FOLDER } from '../files/file-store'
import { isImage } from '../files/media-type'
import { BackupError } from './backup-error'
import { appliedMigrations, databaseFaults, knownMigrations, listFileRows } from './backup.queries'
import {
  DATABASE,
  describeEntry,
  ENTRY_PATH,
  MANIFEST,
  type Manifest,
  manifestSchema,
} from './manifest'

/**
 * Unpacks an archive into an empty folder, and checks all of it.
 *
 * @throws BackupError for whatever is not a whole, unharmed backup that this program can read.
 */
export async function openArchive(archive: string, folder: string): Promise<Manifest> {
  await unpack(archive, folder)
  const manifest = await readManifest(folder)
  await assertEntries(folder, manifest)
  assertDatabase(folder)
  assertFiles(folder, manifest)
  return manifest
}

async function unpack(archive: string, folder: string): Promise<void> {
  const strangers: string[] = []
  try {
    await extract({
      file: archive,
      cwd: folder,
      strict: true,
      filter: (path, entry) => {
        const isFile = 'type' in entry ? entry.type === 'File' : entry.isFile()
        const isOurs = isFile && (path === MANIFEST || ENTRY_PATH.test(path))
        if (!isOurs) strangers.push(path)
        return isOurs
      },
    })
  } catch (error) {
    const reason = error instanceof Error ? error.message : String(error)
    throw new BackupError(`The archive cannot be unpacked: ${reason}`)
  }
  if (strangers.length > 0) {
    throw new BackupError(`The archive holds what no backup holds: ${strangers[0] ?? ''}`)
  }
}

async function readManifest(folder: string): Promise<Manifest> {
  try {
    const text = await readFile(join(folder, MANIFEST), 'utf8')
    return manifestSchema.parse(JSON.parse(text))
  } catch {
    throw new BackupError('The archive has no manifest of a backup that this program can read')
  }
}

/** Neither less nor more than the manifest says, and every byte of it. */
async function assertEntries(folder: string, { entries }: Manifest): Promise<void> {
  const listed = entries.map(({ path }) => path).sort()
  const found = (await readdir(folder, { recursive: true }))
    .map((path) => path.replaceAll('\\', '/'))
    .filter((path) => path !== MANIFEST && path !== FILES_FOLDER)
    .sort()
  const missing = listed.find((path) => !found.includes(path))
  if (missing !== undefined) throw new BackupError(`The archive lacks ${missing}`)
  const extra = found.find((path) => !listed.includes(path))
  if (extra !== undefined) throw new BackupError(`The manifest does not know ${extra}`)
  for (const entry of entries) {
    const { size, sha256 } = await describeEntry(folder, entry.path)
    if (size !== entry.size || sha256 !== entry.sha256) {
      throw new BackupError(`${entry.path} in the archive is not what was saved`)
    }
  }
}

function assertDatabase(folder: string): void {
  const snapshot = join(folder, DATABASE)
  const [fault] = databaseFaults(snapshot)
  if (fault !== undefined) throw new BackupError(`The database in the archive is harmed: ${fault}`)
  const known = knownMigrations()
  if (appliedMigrations(snapshot).some((hash) => !known.includes(hash))) {
    throw new BackupError('The backup was made by a newer program; bring this one up to date first')
  }
}

function assertFiles(folder: string, { entries }: Manifest): void {
  const sums = new Map(entries.map(({ path, sha256 }) => [path, sha256]))
  for (const { id, sha256, mediaType } of listFileRows(join(folder, DATABASE))) {
    const path = `${FILES_FOLDER}/${id}`
    const hasPreview = !isImage(mediaType) || sums.has(`${path}.preview`)
    if (sums.get(path) !== sha256 || !hasPreview) {
      throw new BackupError(`The archive does not hold file ${id} as it was added`)
    }
  }
}
