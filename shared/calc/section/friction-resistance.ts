import type { SectionCase } from '../../schemas/section-case'

/** Undrained clay that water can reach carries no more than this share of the normal force. */
const UNDRAINED_SHARE = 0.4

/** What presses on the ground, and over which length. */
export interface OnGround {
  /** Force normal to the ground, less uplift, N [N/m]. */
  readonly normal: number
  /** Length of the base that is pressed on the ground [m]. */
  readonly length: number
}

/** Partial factors on tan φ and on c_u. */
export interface StrengthFactors {
  readonly friction: number
  readonly cohesion: number
}

/** No partial factors. */
export const UNFACTORED: StrengthFactors = { friction: 1, cohesion: 1 }

/**
 * Resistance of the ground against sliding [N/m]:
 *
 *     μ N;   on soft ground, where the undrained strength c_u is given: min(μ N, c_u B, 0.4 N)
 *
 * The last bound is that of undrained clay whose interface water can reach; flood water always can.
 *
 * @see EN 1997-1:2004, 6.5.3(10)–(12) (from memory).
 */
export function frictionResistance(
  { friction, undrainedStrength }: SectionCase['ground'],
  { normal, length }: OnGround,
  factors = UNFACTORED,
): number {
  const rubbing = (friction / factors.friction) * normal
  if (undrainedStrength === null || undrainedStrength === undefined) return rubbing
  const sticking = (undrainedStrength / factors.cohesion) * length
  return Math.min(rubbing, sticking, UNDRAINED_SHARE * normal)
}
