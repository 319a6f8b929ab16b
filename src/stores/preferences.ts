import { defineStore } from 'pinia'
import { computed, readonly, ref, watch } from 'vue'
import { UNIT_SYSTEMS, type UnitSystem } from '@shared/units'

export const THEMES = ['light', 'dark', 'system'] as const
export type Theme = (typeof THEMES)[number]

/** Same key as public/theme.js, which reads it before the first paint. */
const STORAGE_KEY = 'toehold:preferences'

interface Kept {
  readonly units: UnitSystem
  readonly theme: Theme
}

function oneOf<T extends string>(allowed: readonly T[], value: unknown, fallback: T): T {
  return allowed.find((option) => option === value) ?? fallback
}

function readKept(): Kept {
  const stored = readStorage()
  return {
    units: oneOf(UNIT_SYSTEMS, stored.units, 'metric'),
    theme: oneOf(THEMES, stored.theme, 'system'),
  }
}

/** What the browser kept; nothing where storage is barred or holds something that is not ours. */
function readStorage(): Record<string, unknown> {
  try {
    const stored: unknown = JSON.parse(localStorage.getItem(STORAGE_KEY) ?? 'null')
    return typeof stored === 'object' && stored !== null ? { ...stored } : {}
  } catch {
    return {}
  }
}

/** Storage can be full or barred; the choice then lasts until the page is left. */
function writeStorage(kept: Kept): void {
  try {
    localStorage.setItem(STORAGE_KEY, JSON.stringify(kept))
  } catch {
    return
  }
}

/** Units and theme: chosen once, kept in the browser. */
export const usePreferences = defineStore('preferences', () => {
  const kept = readKept()
  const units = ref<UnitSystem>(kept.units)
  const theme = ref<Theme>(kept.theme)

  const systemDark = window.matchMedia('(prefers-color-scheme: dark)')
  const isSystemDark = ref(systemDark.matches)
  systemDark.addEventListener('change', ({ matches }) => {
    isSystemDark.value = matches
  })

  const isDark = computed(
    () => theme.value === 'dark' || (theme.value === 'system' && isSystemDark.value),
  )
  watch(
    isDark,
    (dark) => {
      document.documentElement.dataset.theme = dark ? 'dark' : 'light'
    },
    { immediate: true },
  )
  watch([units, theme], () => {
    writeStorage({ units: units.value, theme: theme.value })
  })

  return { units, theme, isDark: readonly(isDark) }
})
