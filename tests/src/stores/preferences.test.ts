// @vitest-environment jsdom
import { createPinia, setActivePinia } from 'pinia'
import { nextTick } from 'vue'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { usePreferences } from '../../../src/stores/preferences'

let systemChanges: (event: { matches: boolean }) => void

function withSystem(isDark: boolean): void {
  vi.stubGlobal('matchMedia', () => ({
    matches: isDark,
    addEventListener: (_name: string, listener: typeof systemChanges) => {
      systemChanges = listener
    },
  }))
}

beforeEach(() => {
  localStorage.clear()
  setActivePinia(createPinia())
})
afterEach(() => vi.unstubAllGlobals())

const themeOfPage = () => document.documentElement.dataset.theme

describe('preferences', () => {
  it('are metric and as the system to begin with', async () => {
    withSystem(false)
    const preferences = usePreferences()
    expect(preferences.units).toBe('metric')
    expect(themeOfPage()).toBe('light')
    systemChanges({ matches: true })
    await nextTick()
    expect(themeOfPage()).toBe('dark')
  })

  it('are kept in the browser', async () => {
    withSystem(true)
    Object.assign(usePreferences(), { units: 'us', theme: 'light' })
    await nextTick()
    expect(themeOfPage()).toBe('light')
    setActivePinia(createPinia())
    expect(usePreferences()).toMatchObject({ units: 'us', theme: 'light', isDark: false })
  })

  it.each(['{', 'null', '[]', '{"units":"cubits","theme":7}'])('fall back from %s', (stored) => {
    withSystem(false)
    localStorage.setItem('toehold:preferences', stored)
    expect(usePreferences()).toMatchObject({ units: 'metric', theme: 'system' })
  })
})
