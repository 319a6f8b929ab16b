import { computed, ref, watch } from 'vue'
import type { ChainageWindow } from '@shared/drawing/long-section'
import { chainageRange, type SurveyedLine } from '@/scenario/place-on-line'

/** Shortest part of a line that is shown [m]. */
const LEAST = 5

/** The part of a line that a long section shows: zoomed around a chainage, moved, or all of it. */
export function useLineWindow(line: () => SurveyedLine) {
  const window = ref<ChainageWindow | null>(null)
  const whole = computed(() => chainageRange(line()))

  /** Keeps the chainage where it is on the drawing. */
  function scaleAround(chainage: number, factor: number): void {
    const { from, to } = window.value ?? whole.value
    const length = (to - from) * factor
    const all = whole.value.to - whole.value.from
    if (length >= all) return fit()
    const wanted = Math.max(Math.min(LEAST, all), length)
    const share = Math.min(1, Math.max(0, (chainage - from) / (to - from)))
    place(chainage - share * wanted, wanted)
  }

  function place(from: number, length: number): void {
    const start = Math.min(Math.max(from, whole.value.from), whole.value.to - length)
    window.value = { from: start, to: start + length }
  }

  /** Moves the window so that a chainage is in it. */
  function show(chainage: number): void {
    if (!window.value) return
    const { from, to } = window.value
    if (chainage >= from && chainage <= to) return
    place(chainage - (to - from) / 2, to - from)
  }

  function fit(): void {
    window.value = null
  }

  /** Zooms by keys; true where the key was for it. */
  function takeKey(key: string, chainage: number): boolean {
    if (key === '+' || key === '=') scaleAround(chainage, 0.5)
    else if (key === '-') scaleAround(chainage, 2)
    else if (key === '0') fit()
    else return false
    return true
  }

  watch(
    () => `${whole.value.from} ${whole.value.to}`,
    () => fit(),
  )

  return { window, whole, scaleAround, show, fit, takeKey }
}
