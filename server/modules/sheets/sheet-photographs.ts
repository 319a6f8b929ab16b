import { readFile as readBytes } from 'node:fs/promises'
import { join } from 'node:path'
import type { DraftWords } from '../../../shared/schemas/sheet-api'
import type { Sheet } from '../../../shared/schemas/sheet'
import { printImage } from '../../files/prepare-image'
import { unknownIn } from '../../http/unknown-reference'
import { readFile } from '../files/files.service'
import type { SheetWork } from './sheet-work'
import type { SheetRow } from './sheets.queries'

/** Photographs of the project's files as a sheet carries them; those that it has already stay as they are. */
export async function printedPhotographs(
  work: SheetWork,
  { projectId, content }: SheetRow,
  wanted: DraftWords['photographs'],
): Promise<Sheet['photographs']> {
  const photographs: Sheet['photographs'] = []
  for (const { fileId, caption } of wanted) {
    const kept = content.photographs.find((one) => one.fileId === fileId)
    const picture = kept?.picture ?? (await printed(work, projectId, fileId))
    photographs.push({ fileId, caption, picture })
  }
  return photographs
}

async function printed({ db, store }: SheetWork, projectId: string, fileId: string) {
  const { name, mediaType } = readFile(db, { projectId, fileId })
  const isPicture = mediaType.startsWith('image/') && (await store.holds(fileId, 'original'))
  const image = isPicture
    ? await printImage(await readBytes(join(store.folder, store.nameOf(fileId, 'original'))))
    : null
  if (image) return { mediaType: 'image/jpeg' as const, base64: image.toString('base64') }
  throw unknownIn('photographs', name, 'a photograph')
}
