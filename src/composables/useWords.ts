import { storeToRefs } from 'pinia'
import { useI18n } from 'vue-i18n'
import { showValues, type ResolveText, type TextValues } from '@shared/texts/format-text'
import { formatQuantity, unitLabel, type Quantity, type QuantityKind } from '@shared/units'
import { givenText } from '@/quick-check/field-text'
import { usePreferences } from '@/stores/preferences'

/** Texts and quantities in the chosen language and units. */
export function useWords() {
  const { t: translate } = useI18n({ useScope: 'global' })
  const { units } = storeToRefs(usePreferences())

  /** A text, its quantities shown with their units. */
  function t(key: string, values: TextValues = {}): string {
    return translate(key, showValues(values, units.value))
  }

  /** A quantity with its unit. */
  function q(value: number, kind: QuantityKind, how: Pick<Quantity, 'rounding' | 'isBare'> = {}) {
    return formatQuantity({ value, kind, ...how }, units.value)
  }

  /** A figure as it was given. */
  const given = (value: number, kind: QuantityKind) => givenText(value, kind, units.value)
  const say: ResolveText = ({ key, values }) => t(key, values)
  const unit = (kind: QuantityKind) => unitLabel(kind, units.value)

  return { t, q, given, say, unit, units }
}
