import { storeToRefs } from 'pinia'
import { computed, toRaw } from 'vue'
import { useI18n } from 'vue-i18n'
import { textResolver, type ResolveText, type TextValues } from '@shared/texts/format-text'
import { formatQuantity, unitLabel, type Quantity, type QuantityKind } from '@shared/units'
import { givenText } from '@/quick-check/field-text'
import { usePreferences } from '@/stores/preferences'

/**
 * Texts and quantities in the chosen language and units. Words come from the messages of vue-i18n
 * through the resolver that files and PDFs use: a drag asks for eighty of them in each frame, and the
 * library's own way takes twenty times as long for one.
 */
export function useWords() {
  const { messages, locale } = useI18n({ useScope: 'global' })
  const { units } = storeToRefs(usePreferences())
  // Areas add their texts to this object in place; watching each of its leaves would cost a drag dear.
  const resolver = computed(() => {
    const byLocale: Record<string, object> = toRaw(messages.value)
    return textResolver(byLocale[locale.value] ?? {}, units.value)
  })

  /** A text, its quantities shown with their units. */
  function t(key: string, values?: TextValues): string {
    return resolver.value(values ? { key, values } : { key })
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
