import { checksTexts } from '../texts/checks.en'
import { derivationTexts } from '../texts/derivation.en'
import { drawingTexts } from '../texts/drawing.en'
import { lineTexts } from '../texts/line.en'
import { sheetTexts } from '../texts/sheet.en'
import { shellTexts } from '../texts/shell.en'
import { textResolver, type ResolveText, type TextValues } from '../texts/format-text'
import { formatQuantity, type Quantity, type QuantityKind, type UnitSystem } from '../units'

/** Every text that a sheet says something with. */
export const SHEET_TEXTS = {
  checks: checksTexts,
  derivation: derivationTexts,
  // A sheet is read later than it was made: it has no now.
  drawing: { ...drawingTexts, chart: { ...drawingTexts.chart, now: sheetTexts.chart.now } },
  linePage: lineTexts,
  sheet: sheetTexts,
  shell: shellTexts,
} as const

/** Words and quantities of one sheet, in its units. */
export interface SheetWords {
  readonly system: UnitSystem
  /** A text by its key. */
  readonly say: (key: string, values?: TextValues) => string
  readonly resolve: ResolveText
  /** A quantity with its unit. */
  readonly show: (value: number, kind: QuantityKind, rounding?: 'down' | 'up') => string
  /** A level with its datum, rounded down. */
  readonly level: (value: number, rounding?: 'down') => string
}

/** Words in the units of the sheet. */
export function sheetWords(system: UnitSystem, datum: string): SheetWords {
  const resolve = textResolver(SHEET_TEXTS, system)
  const show = (value: number, kind: QuantityKind, rounding?: 'down' | 'up') => {
    const quantity: Quantity = rounding ? { value, kind, rounding } : { value, kind }
    return formatQuantity(quantity, system)
  }
  return {
    system,
    resolve,
    say: (key, values) => resolve(values ? { key, values } : { key }),
    show,
    level: (value, rounding) =>
      `${show(value, 'length', rounding)}${datum === '' ? '' : ` ${datum}`}`,
  }
}
