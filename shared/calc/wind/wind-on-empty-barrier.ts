import { WIND_AIR_DENSITY, WIND_FORCE_COEFFICIENT } from '../../constants'
import { assertInRange } from '../../errors'

/** An inflated barrier on dry ground, before the water holds it. */
export interface EmptyBarrier {
  readonly diameter: number
  /** Mass per metre run [kg/m]. */
  readonly mass: number
  readonly friction: number
  readonly gravity: number
  /** Peak gust, v [m/s], 0 to 60. */
  readonly gust: number
  /** Required sliding factor of the check basis [–]; 1.5 for the basis with partial factors. */
  readonly required: number
}

export interface WindDemand {
  /** Wind force per metre run [N/m]. */
  readonly force: number
  /** Friction resistance without ballast [N/m]. */
  readonly resistance: number
  /** Resistance over force; null without wind. */
  readonly factor: number | null
  /** Ballast to be laid on the skirt [kg/m], 0 where none is needed. */
  readonly ballast: number
}

/**
 * Wind on the empty barrier and the ballast against it:
 *
 *     F = ½ ρ_a v² c_f D,   ballast = FS F / (μ g) − m
 *
 * @throws OutOfRangeError for a gust outside 0 to 60 m/s.
 * @see EN 1991-1-4, 5.3, for the form; ρ_a 1.25 kg/m³, c_f 1.2: common practice.
 */
export function windOnEmptyBarrier(barrier: EmptyBarrier): WindDemand {
  const { diameter, mass, friction, gravity, gust, required } = barrier
  assertInRange('wind.gust', gust, { min: 0, max: 60, unit: 'm/s' })
  const force = 0.5 * WIND_AIR_DENSITY * gust ** 2 * WIND_FORCE_COEFFICIENT * diameter
  const resistance = friction * mass * gravity
  return {
    force,
    resistance,
    factor: force > 0 ? resistance / force : null,
    ballast: Math.max(0, (required * force) / (friction * gravity) - mass),
  }
}
