import { createHash, randomUUID } from 'node:crypto'
import type { Sheet } from '../../../shared/schemas/sheet'
import { digestText } from '../../../shared/sheet/sheet-digest'
import { codeFrom } from '../../../shared/sheet/verification-code'
import { codeBytes, composing, type SheetWork } from './sheet-work'

const sha256 = (bytes: string | Uint8Array) => createHash('sha256').update(bytes).digest('hex')

/** A sheet in its final form, its files already on the disk. */
export interface Frozen {
  readonly content: Sheet
  readonly code: string
  readonly digest: string
  readonly files: readonly {
    readonly page: number
    readonly fileId: string
    readonly size: number
    readonly sha256: string
  }[]
}

/**
 * Gives a sheet its code and digest, sets it, and writes the PDF and pictures of its pages. Their rows
 * come later, with the move: bytes that no row names are swept.
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
  const { pdf, pages } = await (await composing()).frozenDocument(content)
  const files = []
  for (const [page, bytes] of [pdf, ...pages].entries()) {
    const fileId = randomUUID() as string
    await store.write(fileId, 'original', bytes)
    files.push({ page, fileId, size: bytes.length, sha256: sha256(bytes) })
  }
  return { content, code, digest, files }
}
