import { createHash, randomUUID } from 'node:crypto'
import type { Sheet } from '../../../shared/schemas/sheet'
import { digestText } from '../../../shared/sheet/sheet-digest'
import { codeFrom } from '../../../shared/sheet/verification-code'
import { frozenDocument } from './composing'
import { codeBytes, type SheetWork } from './sheet-work'

const sha256 = (bytes: string | Uint8Array) => createHash('sha256').update(bytes).digest('hex')

/** A sheet in its final form, its file already on the disk. */
export interface Frozen {
  readonly content: Sheet
  readonly code: string
  readonly digest: string
  readonly pages: number
  readonly file: { readonly fileId: string; readonly size: number; readonly sha256: string }
}

/**
 * Gives a sheet its code and digest, sets it, and writes the PDF. Its row comes later, with the move:
 * bytes that no row names are swept.
 *
 * @throws ConflictError that names the line that does not agree.
 */
export async function freezeSheet(
  { store, appUrl }: Pick<SheetWork, 'store' | 'appUrl'>,
  sheet: Sheet,
): Promise<Frozen> {
  const code = codeFrom(codeBytes())
  const digest = sha256(digestText(sheet))
  const address = new URL('/verify', appUrl).href
  const content = { ...sheet, verification: { code, address, digest } }
  const { pdf, pages } = await frozenDocument(content)
  const fileId = randomUUID() as string
  await store.write(fileId, 'original', pdf)
  const file = { fileId, size: pdf.length, sha256: sha256(pdf) }
  return { content, code, digest, pages, file }
}
