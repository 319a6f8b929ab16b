import { storeToRefs } from 'pinia'
import { computed } from 'vue'
import { usePreferences } from '@/stores/preferences'

/** Colours of charts: a canvas knows no custom properties, so they are read anew with the theme. */
export function useChartColours() {
  const { isDark } = storeToRefs(usePreferences())
  return computed(() => {
    const style = getComputedStyle(document.documentElement)
    const read = (name: string) => style.getPropertyValue(`--${name}`).trim()
    return {
      theme: isDark.value ? 'dark' : 'light',
      ink: read('ink'),
      muted: read('muted'),
      line: read('line'),
      water: read('water'),
      waterFill: read('water-fill'),
      font: read('font'),
    }
  })
}
