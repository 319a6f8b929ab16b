import type { BandLevels } from '../../../shared/deployment/groundwork'

const DAY = Date.UTC(2031, 2, 3)

/** A clock time of the first night, or of the day after it [ms]. */
export function quayMoment(clock: string, daysLater = 0): number {
  const [hour, minute] = clock.split(':').map(Number)
  return DAY + daysLater * 86_400_000 + (hour! * 60 + minute!) * 60_000
}

/** Invented forecast of Ferry Quay, at the line, in Quay datum: hours of the first day, levels. */
const KNOTS: readonly (readonly [hour: number, level: number])[] = [
  ...([
    [22, 2.34],
    [23, 2.43],
    [24, 2.54],
    [25, 2.68],
    [26, 2.84],
    [27, 3],
  ] as const),
  ...([
    [28, 3.16],
    [29, 3.29],
    [30, 3.38],
    [30.5, 3.41],
    [31, 3.42],
    [31.5, 3.42],
  ] as const),
  ...([
    [32, 3.4],
    [33, 3.34],
    [34, 3.25],
    [36, 3.06],
    [38, 2.9],
  ] as const),
]

/** Its band is ±0.12 m from 01:00 on. */
const band = (width: number) =>
  KNOTS.map(([hour, level]) => ({
    time: DAY / 1000 + hour * 3600,
    value: hour >= 25 ? level + width : level,
  }))

export const forecastLevels: BandLevels = {
  low: band(-0.12),
  expected: band(0),
  high: band(0.12),
}
