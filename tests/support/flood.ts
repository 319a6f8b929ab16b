import type { Reading } from '../../shared/calc/series/time-series'
import type { BandSeries } from '../../shared/checks/line-event/line-event-input'

const HOUR = 3600

/** Ferry Quay: hours from the first midnight, and the level expected then [m]. Invented. */
const KNOTS = [
  [18, 2.12],
  [20, 2.22],
  [21, 2.28],
  [22, 2.34],
  [23, 2.43],
  [24, 2.54],
  [25, 2.68],
  [26, 2.84],
  [27, 3],
  [28, 3.16],
  [29, 3.29],
  [30, 3.38],
  [30.5, 3.41],
  [31, 3.42],
  [31.5, 3.42],
  [32, 3.4],
  [33, 3.34],
  [34, 3.25],
  [36, 3.06],
  [38, 2.9],
  [40, 2.76],
  [42, 2.63],
] as const

/** Half-hourly readings, straight between the knots, moved by a band from 01:00 on. */
function floodWith(band: number, start = 0): readonly Reading[] {
  return KNOTS.flatMap(([hour, level], i) => {
    const next = KNOTS[i + 1]
    const halves = next ? Math.round((next[0] - hour) * 2) : 1
    return Array.from({ length: halves }, (_, n) => {
      const at = hour + n / 2
      const value = next ? level + ((next[1] - level) * (at - hour)) / (next[0] - hour) : level
      return { time: start + at * HOUR, value: Number((value + (at >= 25 ? band : 0)).toFixed(3)) }
    })
  })
}

/**
 * The flood of Ferry Quay with its band of ±0.12 m.
 *
 * @param start Its first midnight [s].
 */
export function flood(start = 0): BandSeries {
  return {
    low: floodWith(-0.12, start),
    expected: floodWith(0, start),
    high: floodWith(0.12, start),
  }
}

/** Air from 12 °C at 23:00 to 0 °C at 06:00. */
export function coldNight(start = 0) {
  return {
    filledAt: 12,
    temperature: [
      { time: start + 23 * HOUR, value: 12 },
      { time: start + 30 * HOUR, value: 0 },
    ],
  }
}

/** "04:51" on the second day is 28.85 h after the first midnight. */
export function clock(time: number | null | undefined): string {
  if (time === null || time === undefined) return 'never'
  const minutes = Math.round(time / 60)
  const two = (value: number) => String(value).padStart(2, '0')
  return `${two(Math.floor(minutes / 60) % 24)}:${two(minutes % 60)}`
}
