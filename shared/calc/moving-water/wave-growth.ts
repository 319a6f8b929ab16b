import { assertInRange } from '../../errors'

/** A stretch of open water that the wind blows over. */
export interface Fetch {
  /** Length of open water upwind, F [m]. */
  readonly fetch: number
  /** Mean depth over the fetch, d [m]. */
  readonly depth: number
  /** Wind speed 10 m above the water, U [m/s]. */
  readonly windSpeed: number
  readonly gravity: number
}

export interface GrownWaves {
  /** Adjusted wind speed, U_A [m/s]. */
  readonly adjustedWind: number
  /** Significant wave height, H_s [m]. */
  readonly height: number
  /** Significant period, T_s [s]. */
  readonly period: number
}

/**
 * Waves that wind raises on shallow water:
 *
 *     U_A = 0.71 U^1.23
 *     g H / U_A² = 0.283 tanh a · tanh[0.00565 (g F/U_A²)^½ / tanh a],   a = 0.530 (g d/U_A²)^¾
 *     g T / U_A  = 7.54 tanh b · tanh[0.0379 (g F/U_A²)^⅓ / tanh b],     b = 0.833 (g d/U_A²)^⅜
 *
 * @remarks Valid for 1 ≤ U ≤ 60 m/s, 1 m ≤ F ≤ 100 km, 0.05 ≤ d ≤ 100 m. Methods differ by ±25 %.
 * @throws OutOfRangeError outside these ranges.
 * @see Shore Protection Manual, 1984, ch. 3 (from memory).
 */
export function waveGrowth({ fetch, depth, windSpeed, gravity }: Fetch): GrownWaves {
  assertInRange('fetch.windSpeed', windSpeed, { min: 1, max: 60, unit: 'm/s' })
  assertInRange('fetch.fetch', fetch, { min: 1, max: 100_000, unit: 'm' })
  assertInRange('fetch.depth', depth, { min: 0.05, max: 100, unit: 'm' })
  const adjustedWind = 0.71 * windSpeed ** 1.23
  return {
    adjustedWind,
    height: grownHeight(adjustedWind, { fetch, depth, gravity }),
    period: grownPeriod(adjustedWind, { fetch, depth, gravity }),
  }
}

type Basin = Omit<Fetch, 'windSpeed'>

/** Significant wave height from the adjusted wind speed U_A [m]. */
export function grownHeight(wind: number, { fetch, depth, gravity }: Basin): number {
  const unit = wind ** 2 / gravity
  const limit = Math.tanh(0.53 * (depth / unit) ** 0.75)
  return 0.283 * unit * limit * Math.tanh((0.00565 * Math.sqrt(fetch / unit)) / limit)
}

/** Significant period from the adjusted wind speed U_A [s]. */
export function grownPeriod(wind: number, { fetch, depth, gravity }: Basin): number {
  const unit = wind ** 2 / gravity
  const limit = Math.tanh(0.833 * (depth / unit) ** 0.375)
  return ((7.54 * wind) / gravity) * limit * Math.tanh((0.0379 * Math.cbrt(fetch / unit)) / limit)
}
