import { upliftMoments, upliftSharePartial, type UpliftAssumption } from './uplift-share'

/** What presses from below. */
export interface UpliftInput {
  readonly uplift: UpliftAssumption
  /** Depth of water at the wet edge of the skirt, h_e [m]. */
  readonly edgeDepth: number
  /** Depth of water on the dry side, h_d [m]. */
  readonly dryDepth: number
  /** Width of the base, B = L + b [m]. */
  readonly base: number
  readonly unitWeight: number
}

/** Resultant of the water under skirt and tube, per metre run. */
export interface Uplift {
  /** U [N/m]. */
  readonly force: number
  /** Moment about the dry toe [N]. */
  readonly moment: number
}

/**
 * Water under the skirt: from η ρ g h_e at the wet edge to ρ g h_d at the dry toe. With
 * e = η h_e − h_d:
 *
 *     U   = ρ g B (h_d + e r)
 *     M_U = ρ g B² (h_d/2 + e m)      about the dry toe
 *
 * `none` stands for a sealed base: U = 0. A base without width has no uplift.
 */
export function upliftForce(input: UpliftInput): Uplift {
  const { uplift, edgeDepth, dryDepth, base, unitWeight } = input
  if (uplift.model === 'none' || base === 0) return { force: 0, moment: 0 }
  const excess = uplift.edgeFactor * edgeDepth - dryDepth
  const { mean, moment } = upliftMoments(uplift, base)
  return {
    force: unitWeight * base * (dryDepth + excess * mean),
    moment: unitWeight * base ** 2 * (dryDepth / 2 + excess * moment),
  }
}

/** Resultant of the same pressure over the first `length` metres from the wet edge [N/m]. */
export function upliftUnderSkirt(input: UpliftInput, length: number): number {
  const { uplift, edgeDepth, dryDepth, base, unitWeight } = input
  if (uplift.model === 'none' || base === 0) return 0
  const excess = uplift.edgeFactor * edgeDepth - dryDepth
  return unitWeight * (dryDepth * length + excess * upliftSharePartial(uplift, base, length))
}
