import { writeFileSync } from 'node:fs'
import { basename, extname } from 'node:path'
import type { Sheet } from '../../shared/schemas/sheet'
import { sheetTable } from '../../shared/sheet/sheet-table'
import { sheetFrom } from '../batch/sheet-input'
import { toCsv } from '../http/csv'
import { createTypesetter } from '../typesetting/typesetter'
import { typesetSheet } from '../typesetting/typeset-sheet'

/** What the command line says of a sheet. */
export interface SheetRequest {
  /** Name of the input; it names what the input leaves without a name. */
  readonly source: string
  /** Where the sheet goes; its ending says in which form. */
  readonly output: string
  readonly software: string
}

/** Forms of a sheet by the ending of its file. */
const FORMS: Readonly<Record<string, (sheet: Sheet) => Buffer | string>> = {
  '.pdf': (sheet) => typesetSheet(createTypesetter(), sheet),
  '.json': (sheet) => `${JSON.stringify(sheet, null, 2)}\n`,
  '.csv': (sheet) => toCsv(sheetTable(sheet)),
}

/** Endings that a sheet can have. */
export const SHEET_ENDINGS = Object.keys(FORMS)

/**
 * Writes the sheet of a case, or of a sheet with its words, to a file.
 *
 * @returns One line that says what was written.
 */
export function writeSheet(input: unknown, { source, output, software }: SheetRequest): string {
  const write = FORMS[extname(output).toLowerCase()]
  if (!write) throw new Error(`${output}: the ending must be one of ${SHEET_ENDINGS.join(', ')}`)
  const name = basename(source, extname(source))
  const date = new Date().toISOString().slice(0, 10)
  writeFileSync(output, write(sheetFrom(input, { name, date, software })))
  return output
}
