import { computed } from 'vue'
import { LEVEL_REFERENCES } from '@shared/schemas/forecast'
import { useWords } from './useWords'

/** What figures of a gauge may be, for a choice. */
export function useReferences() {
  const { t } = useWords()
  return computed(() =>
    LEVEL_REFERENCES.map((value) => ({ value, label: t(`forecast.reference.${value}`) })),
  )
}
