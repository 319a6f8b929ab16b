import { DerivationDisagreementError } from '../../../shared/derivation/disagreement'
import type { Sheet } from '../../../shared/schemas/sheet'
import { composeSheet, derivationOf } from '../../../shared/sheet/compose-sheet'
import { sheetTable } from '../../../shared/sheet/sheet-table'
import { ConflictError } from '../../errors'
import { toCsv } from '../../http/csv'
import { createTypesetter, type Typesetter } from '../../typesetting/typesetter'
import { typesetSheet } from '../../typesetting/typeset-sheet'

/**
 * What needs the derivation or the typesetter. Both are large; this file is loaded when the first sheet
 * is made or read, and by nothing else.
 */

let kept: Typesetter | undefined

function typesetter(): Typesetter {
  kept ??= createTypesetter()
  return kept
}

/** Documents that nobody changed since they were last asked for. */
const MOST_KEPT = 6
const documents = new Map<string, Buffer>()

/** A line that does not agree stops the sheet and names itself. */
function agreeing<Result>(compose: () => Result): Result {
  try {
    return compose()
  } catch (error) {
    if (!(error instanceof DerivationDisagreementError)) throw error
    throw new ConflictError(`There is no sheet: ${error.message}`)
  }
}

/** @throws ConflictError that names the line that does not agree. */
export function assertDerives(sheet: Sheet): void {
  agreeing(() => composeSheet(sheet))
}

/** Numbers of the lines of a sheet, and the unrounded figure of each in its printed unit. */
export function linesOf(sheet: Sheet): ReadonlyMap<string, number> {
  return new Map(derivationOf(sheet).lines.map(({ number, result }) => [number, result.value]))
}

/**
 * A sheet that is not frozen as PDF.
 *
 * @param key Names sheet, version and status; the same key gives the same bytes.
 */
export function documentOf(key: string, sheet: Sheet): Buffer {
  const found = documents.get(key)
  if (found) return found
  const pdf = agreeing(() => typesetSheet(typesetter(), sheet))
  documents.set(key, pdf)
  const [oldest] = documents.keys()
  if (documents.size > MOST_KEPT && oldest !== undefined) documents.delete(oldest)
  return pdf
}

/** How many pages a PDF of our typesetter has; it writes their number beside their root. */
const PAGES = /\/Type \/Pages\s+\/Count (\d+)/

/** The final document. */
export function frozenDocument(sheet: Sheet): { readonly pdf: Buffer; readonly pages: number } {
  const pdf = agreeing(() => typesetSheet(typesetter(), sheet))
  const pages = Number(PAGES.exec(pdf.toString('latin1'))?.[1] ?? 0)
  if (pages === 0) throw new Error('a document without pages was set')
  return { pdf, pages }
}

/** The derivation as CSV. */
export function tableOf(sheet: Sheet): string {
  return agreeing(() => toCsv(sheetTable(sheet)))
}
