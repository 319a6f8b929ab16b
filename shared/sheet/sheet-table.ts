import { plainNumber, printedNumber } from '../derivation/figures'
import { SHEET_SOURCES } from '../derivation/sources'
import { sheetUnit } from '../derivation/sheet-units'
import { verifyDerivation } from '../derivation/verify-derivation'
import { writeLine } from '../derivation/written-line'
import type { Sheet } from '../schemas/sheet'
import { derivationOf } from './compose-sheet'
import { sheetWords } from './sheet-words'

const HEAD = [
  'line',
  'name',
  'symbol',
  'equation',
  'with numbers',
  'result',
  'unit',
  'unrounded',
  'source',
  'proof',
] as const

/**
 * The derivation of a sheet as rows of a table: printed and unrounded figures, one line each.
 *
 * @throws DerivationDisagreementError that names the line that does not agree.
 */
export function sheetTable(sheet: Sheet): readonly (readonly (string | number)[])[] {
  const words = sheetWords(sheet.units, sheet.datum)
  const derivation = derivationOf(sheet)
  verifyDerivation(derivation)
  const rows = derivation.lines.map((line) => {
    const { symbol, symbolic, numeric } = writeLine(line, sheet.units)
    return [
      line.number,
      words.resolve(line.name),
      symbol.plain,
      symbolic.plain,
      numeric?.plain ?? '',
      plainNumber(printedNumber(line.result, sheet.units)),
      sheetUnit(line.result.kind, sheet.units).label,
      line.result.value,
      SHEET_SOURCES[line.source].short,
      line.proof,
    ]
  })
  return [HEAD, ...rows]
}
