import type { SheetRow } from './sheets.queries'
import { nameOf, sheetAt } from './open-sheet'
import { documentOf } from './composing'
import type { SheetPlace, SheetWork } from './sheet-work'

/** A file on the disk that was frozen, or bytes that were just set. */
export type SheetPdf =
  | {
      readonly kind: 'frozen'
      readonly id: string
      readonly checksum: string
      readonly name: string
    }
  | { readonly kind: 'made'; readonly bytes: Buffer; readonly name: string }

/** A name that every file system takes. */
export function fileName(row: SheetRow, ending: string): string {
  return `${nameOf(row).replace(/[^\w.-]+/g, '-')}.${ending}`
}

/**
 * The PDF of a sheet: the frozen one byte for byte; before that, or with `isMarked`, one that bears its
 * present status across every page.
 */
export async function pdfOf(
  { db }: Pick<SheetWork, 'db'>,
  place: SheetPlace,
  isMarked: boolean,
): Promise<SheetPdf> {
  const row = sheetAt(db, place)
  const name = fileName(row, 'pdf')
  if (row.fileId !== null && !isMarked) {
    return { kind: 'frozen', id: row.fileId, checksum: row.fileSha256, name }
  }
  const { id, version, status } = row
  const bytes = await documentOf(`${id} ${version} ${status}`, { ...row.content, status })
  return { kind: 'made', bytes, name }
}
