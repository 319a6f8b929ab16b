import { checksTexts } from '../texts/checks.en'
import { derivationTexts } from '../texts/derivation.en'
import { drawingTexts } from '../texts/drawing.en'
import { linePlanTexts } from '../texts/line-plan.en'
import { lineTexts } from '../texts/line.en'
import { sheetTexts } from '../texts/sheet.en'
import { shellTexts } from '../texts/shell.en'
import { textResolver, type ResolveText, type TextValues } from '../texts/format-text'
import { formatQuantity, type Quantity, type QuantityKind, type UnitSystem } from '../units'

/** Every text that a sheet says something with. */
export const SHEET_TEXTS = {
  checks: checksTexts,
  derivation: derivationTexts,
  drawing: drawingTexts,
  linePage: lineTexts,
  linePlan: linePlanTexts,
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
  /** A length as a size: 0.70 m, 1.25 m. */
  readonly size: (value: number) => string
  /** A level with its datum, rounded down. */
  readonly level: (value: number, rounding?: 'down') => string
}

/** A sheet is read later than it was made: its drawings have no now. */
function withoutNow(resolve: ResolveText): ResolveText {
  return (message) =>
    resolve(message.key === 'drawing.chart.now' ? { ...message, key: 'sheet.chart.now' } : message)
}

/** Words in the units of the sheet. */
export function sheetWords(system: UnitSystem, datum: string): SheetWords {
  const resolve = withoutNow(textResolver(SHEET_TEXTS, system))
  const show = (value: number, kind: QuantityKind, rounding?: 'down' | 'up') => {
    const quantity: Quantity = rounding ? { value, kind, rounding } : { value, kind }
    return formatQuantity(quantity, system)
  }
  return {
    system,
    resolve,
    say: (key, values) => resolve(values ? { key, values } : { key }),
    show,
    size: (value) => show(value, 'length').replace(/(\.\d\d)0+(?=\D)/, '$1'),
    level: (value, rounding) =>
      `${show(value, 'length', rounding)}${datum === '' ? '' : ` ${datum}`}`,
  }
}
