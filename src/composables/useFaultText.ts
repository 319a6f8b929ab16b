import type { AllowedRange } from '@shared/errors'
import type { QuantityKind } from '@shared/units'
import type { FieldFault } from '@/quick-check/field-faults'
import { shownBounds } from '@/quick-check/field-text'
import { fieldOf } from '@/quick-check/fields'
import { useWords } from './useWords'

/** Words for a refused field: its name, what was typed, what is allowed, in the chosen units. */
export function useFaultText() {
  const { t, unit, units } = useWords()

  function allowed(range: AllowedRange, kind: QuantityKind): string {
    const { min, max } = shownBounds(range, kind, units.value)
    const bounds = { min: figure(min), max: figure(max) }
    const words =
      max === Infinity
        ? t(range.minExcluded ? 'quickCheck.fault.above' : 'quickCheck.fault.orMore', bounds)
        : t(range.minExcluded ? 'quickCheck.fault.aboveTo' : 'quickCheck.fault.between', bounds)
    const label = unit(kind)
    return label === '' ? words : t('quickCheck.fault.withUnit', { range: words, unit: label })
  }

  function faultText(fault: FieldFault, typed: string): string {
    const label = t(`quickCheck.field.${fault.field}.label`)
    return figureFault({ ...fault, label, kind: fieldOf(fault.field).kind }, typed)
  }

  /** The same for any figure that is not one of the Quick check. */
  function figureFault(fault: FigureFault, typed: string): string {
    const { label, kind, reason, range } = fault
    const words = t(`quickCheck.fault.${reason}`, {
      field: label,
      typed,
      allowed: allowed(range, kind),
    })
    const hint = isMillimetres(fault) && units.value === 'metric'
    const metres = figure((fault.value ?? 0) / 1000)
    return hint ? `${words} ${t('quickCheck.fault.millimetres', { typed, metres })}` : words
  }

  return { faultText, figureFault }
}

/** A refused figure, whatever it is called. */
export interface FigureFault extends Omit<FieldFault, 'field'> {
  readonly label: string
  readonly kind: QuantityKind
}

/** A length that would be right if it had been typed in millimetres. */
function isMillimetres({ kind, value, range }: FigureFault): boolean {
  return (
    kind === 'length' &&
    value !== null &&
    value > range.max &&
    value / 1000 <= range.max &&
    value >= 20
  )
}

function figure(value: number): string {
  return String(value).replace('-', '−')
}
