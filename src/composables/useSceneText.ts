import { storeToRefs } from 'pinia'
import { computed } from 'vue'
import { useI18n } from 'vue-i18n'
import { texts, type Locale } from '@shared/texts'
import { textResolver } from '@shared/texts/format-text'
import { usePreferences } from '@/stores/preferences'

/**
 * Words of drawings in the chosen language and units, from the catalogue itself: a drag resolves a
 * hundred messages for each frame, and the library takes twenty times as long for one.
 */
export function useSceneText() {
  const { locale } = useI18n({ useScope: 'global' })
  const { units } = storeToRefs(usePreferences())
  return computed(() => textResolver(texts[locale.value as Locale], units.value))
}
