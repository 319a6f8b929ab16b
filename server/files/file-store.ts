import { access, open, mkdir, readdir, rename, rm, stat } from 'node:fs/promises'
import { join, resolve } from 'node:path'
import { randomUUID } from 'node:crypto'

/** The bytes as they are kept, or a smaller picture of them. */
export type FileVariant = 'original' | 'preview'

/** Bytes of project files, outside the web root, by random names that nobody chooses. */
export interface FileStore {
  readonly folder: string
  /** Name of a file in the folder. */
  readonly nameOf: (id: string, variant: FileVariant) => string
  /** Whether the bytes are there. */
  readonly holds: (id: string, variant: FileVariant) => Promise<boolean>
  /** Writes as a whole or not at all, and survives a power cut once it has resolved. */
  readonly write: (id: string, variant: FileVariant, bytes: Uint8Array) => Promise<void>
  /** Removes a file with its preview; nothing happens where there is none. */
  readonly remove: (id: string) => Promise<void>
  /** Ids of all that is older than the moment [ms since 1970]. */
  readonly listOlderThan: (moment: number) => Promise<readonly string[]>
}

/** Name of the folder beside the database, or in DATA_DIR. */
export const FILES_FOLDER = 'files'

const ID = /^[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}$/

/** @param path Folder, made when the first file is written. */
export function openFileStore(path: string): FileStore {
  const folder = resolve(path)
  const nameOf = (id: string, variant: FileVariant) => {
    // Ids come from the database; this holds even if one did not.
    if (!ID.test(id)) throw new Error('A file was asked for by something that is no id')
    return variant === 'original' ? id : `${id}.preview`
  }
  return {
    folder,
    nameOf,
    holds: (id, variant) => isThere(join(folder, nameOf(id, variant))),
    write: (id, variant, bytes) => writeWhole(folder, nameOf(id, variant), bytes),
    remove: async (id) => {
      for (const variant of ['original', 'preview'] as const) {
        await rm(join(folder, nameOf(id, variant)), { force: true })
      }
    },
    listOlderThan: (moment) => listOlderThan(folder, moment),
  }
}

async function isThere(path: string): Promise<boolean> {
  try {
    await access(path)
    return true
  } catch {
    return false
  }
}

/** A name that is not finished yet: a crash leaves it behind, and the sweep removes it. */
const UNFINISHED = '.part'

async function writeWhole(folder: string, name: string, bytes: Uint8Array): Promise<void> {
  await mkdir(folder, { recursive: true, mode: 0o700 })
  const path = join(folder, name)
  const unfinished = `${path}.${randomUUID()}${UNFINISHED}`
  const file = await open(unfinished, 'wx', 0o600)
  try {
    await file.writeFile(bytes)
    await file.sync()
  } finally {
    await file.close()
  }
  await rename(unfinished, path)
  await syncFolder(folder)
}

/** Makes the new name itself survive a power cut. */
async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r')
  try {
    await handle.sync()
  } finally {
    await handle.close()
  }
}

async function listOlderThan(folder: string, moment: number): Promise<readonly string[]> {
  await mkdir(folder, { recursive: true, mode: 0o700 })
  const names = await readdir(folder)
  const ids = await Promise.all(
    names.map(async (name) => {
      const { mtimeMs } = await stat(join(folder, name))
      if (mtimeMs >= moment) return []
      if (name.endsWith(UNFINISHED)) await rm(join(folder, name), { force: true })
      const id = name.slice(0, 36)
      return ID.test(id) ? [id] : []
    }),
  )
  return [...new Set(ids.flat())]
}
