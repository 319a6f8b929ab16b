import { assertInRange } from '../../errors'

/** Something that floats against the barrier and is brought to a stand. */
export interface StoppedDebris {
  /** Mass, m [kg]. */
  readonly mass: number
  /** Speed towards the barrier, v [m/s]. */
  readonly speed: number
  /** Time from the first touch to standing still, t [s]. */
  readonly stoppingTime: number
}

export interface DebrisImpact {
  /** Mean force while it is stopped, m v/t [N]. */
  readonly mean: number
  /** Highest force of a half sine with the same impulse, π m v/(2 t) [N]. */
  readonly peak: number
}

/**
 * Force of debris by impulse and momentum:
 *
 *     F_mean = m v / t        F_peak = π m v / (2 t)
 *
 * @remarks Valid for 1 to 10⁶ kg, 0.01 to 10 m/s and 0.01 to 10 s. Published methods differ 75-fold,
 * mostly in the stopping time: the result is only as good as that.
 * @throws OutOfRangeError outside these ranges.
 * @see Newton's second law; the half sine as in ASCE 7, commentary to chapter 5 (from memory).
 */
export function debrisImpact({ mass, speed, stoppingTime }: StoppedDebris): DebrisImpact {
  assertInRange('debris.mass', mass, { min: 1, max: 1e6, unit: 'kg' })
  assertInRange('debris.speed', speed, { min: 0.01, max: 10, unit: 'm/s' })
  assertInRange('debris.stoppingTime', stoppingTime, { min: 0.01, max: 10, unit: 's' })
  const mean = (mass * speed) / stoppingTime
  return { mean, peak: (Math.PI / 2) * mean }
}
