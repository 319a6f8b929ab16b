import { createHash, randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { OutOfRangeError } from '../../../shared/errors'
import type {
  fileChangeSchema,
  ProjectFile,
  projectFilesSchema,
} from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import type { FileStore } from '../../files/file-store'
import { ALLOWED_FILES, detectMediaType, type MediaType } from '../../files/media-type'
import { MOST_PIXELS, prepareImage } from '../../files/prepare-image'
import type { ReceivedFile } from '../../files/receive-file'
import { change, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import { openProject } from '../projects/open-project'
import { listKnownOrderFileIds } from '../orders/orders.queries'
import { listKnownSheetFileIds } from '../sheets/sheets.queries'
import {
  countFiles,
  deleteFile,
  findFile,
  insertFile,
  listFiles,
  listKnownFileIds,
  updateFile,
} from './files.queries'

export interface FilePlace {
  readonly projectId: string
  readonly fileId: string
}

export interface FileWork extends ProjectWork {
  readonly store: FileStore
}

/** Keeps one project from filling the disk: 500 files are 7.5 GB at most. */
export const MOST_FILES = 500

export function readFiles(db: Db, projectId: string): z.output<typeof projectFilesSchema> {
  return { files: listFiles(db, projectId) }
}

/** @throws NotFoundError */
export function readFile(db: Db, { projectId, fileId }: FilePlace): ProjectFile {
  const file = findFile(db, projectId, fileId)
  if (!file) throw new NotFoundError(`file: "${fileId}" does not exist in this project`)
  return file
}

/** What is kept of a file that arrived. */
interface KeptFile {
  readonly bytes: Uint8Array
  readonly preview: Uint8Array | null
  readonly mediaType: MediaType
  readonly width: number | null
  readonly height: number | null
}

/**
 * Takes a file in. Its bytes are safe on the disk before its row says so: a crash in between leaves
 * bytes that nobody names, and the sweep removes them.
 *
 * @throws OutOfRangeError for what a project does not take in; ConflictError while it is archived, or full.
 */
export async function addFile(
  work: FileWork,
  actor: Doer,
  projectId: string,
  received: ReceivedFile,
): Promise<ProjectFile> {
  assertRoom(work.db, projectId)
  const kept = await keptFile(received)
  const fileId = randomUUID()
  if (kept.preview) await work.store.write(fileId, 'preview', kept.preview)
  await work.store.write(fileId, 'original', kept.bytes)
  return change(work, actor, (deed) => {
    assertRoom(deed.tx, projectId)
    const { mediaType, width, height, bytes } = kept
    const sha256 = createHash('sha256').update(bytes).digest('hex')
    const { name, caption } = received
    const row = { id: fileId, projectId, name, caption, mediaType, size: bytes.length, sha256 }
    const uploaded = { uploadedAt: deed.at, uploadedBy: deed.by.accountId }
    insertFile(deed.tx, { ...row, width, height, ...uploaded })
    noteChange(deed, projectId, {
      ...subject(fileId, name),
      action: 'file.added',
      detail: { mediaType, size: bytes.length, sha256 },
    })
    return readFile(deed.tx, { projectId, fileId })
  })
}

function assertRoom(db: Db, projectId: string): void {
  openProject(db, projectId)
  if (countFiles(db, projectId) < MOST_FILES) return
  throw new ConflictError(`A project holds ${MOST_FILES} files at most; delete one first.`)
}

async function keptFile({ bytes, name }: ReceivedFile): Promise<KeptFile> {
  const mediaType = detectMediaType(bytes, name)
  if (!mediaType) throw refused(name, ALLOWED_FILES)
  if (mediaType !== 'image/jpeg' && mediaType !== 'image/png' && mediaType !== 'image/webp') {
    return { bytes, preview: null, mediaType, width: null, height: null }
  }
  const image = await prepareImage(bytes, mediaType)
  if (!image) {
    throw refused(name, `a picture that can be read, of ${MOST_PIXELS / 1e6} megapixels or fewer`)
  }
  return { ...image, mediaType }
}

function refused(value: string, allowed: string): OutOfRangeError {
  const message = `file: "${value}" is not allowed; it must be ${allowed}`
  return new OutOfRangeError([{ path: 'file', value, allowed, unit: '–', message }])
}

const subject = (id: string, name: string) => ({
  subjectType: 'file',
  subjectId: id,
  subjectName: name,
})

export function changeFile(
  work: ProjectWork,
  actor: Doer,
  place: FilePlace,
  input: z.output<typeof fileChangeSchema>,
): ProjectFile {
  return change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const before = readFile(deed.tx, place)
    updateFile(deed.tx, place.fileId, input)
    noteChange(deed, place.projectId, {
      ...subject(place.fileId, input.name ?? before.name),
      action: 'file.changed',
      detail: { before: { name: before.name, caption: before.caption } },
    })
    return readFile(deed.tx, place)
  })
}

/** The row goes first: bytes without a row are swept, a row without bytes would lie. */
export async function removeFile(work: FileWork, actor: Doer, place: FilePlace): Promise<void> {
  change(work, actor, (deed) => {
    openProject(deed.tx, place.projectId)
    const { name, mediaType, size } = readFile(deed.tx, place)
    deleteFile(deed.tx, place.fileId)
    noteChange(deed, place.projectId, {
      ...subject(place.fileId, name),
      action: 'file.deleted',
      detail: { mediaType, size },
    })
  })
  await work.store.remove(place.fileId)
}

/** An upload under way is never older than this [ms]. */
const UNDER_WAY = 3_600_000

/** Ids of one look into the database. */
const IDS_AT_ONCE = 500

/** Removes bytes that no row names: what a crash left between the disk and the database. */
export async function sweepFiles({ db, now, store }: FileWork): Promise<number> {
  const ids = await store.listOlderThan(now() - UNDER_WAY)
  let removed = 0
  for (let i = 0; i < ids.length; i += IDS_AT_ONCE) {
    const some = ids.slice(i, i + IDS_AT_ONCE)
    const known = new Set([
      ...listKnownFileIds(db, some),
      ...listKnownSheetFileIds(db, some),
      ...listKnownOrderFileIds(db, some),
    ])
    const orphans = some.filter((id) => !known.has(id))
    for (const id of orphans) await store.remove(id)
    removed += orphans.length
  }
  return removed
}
