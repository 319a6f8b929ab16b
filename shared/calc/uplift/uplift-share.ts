import type { SectionCase } from '../../schemas/section-case'
import {
  developingMean,
  developingMoment,
  developingPartial,
  developingShare,
} from './developing-uplift'

export type UpliftAssumption = SectionCase['uplift']

/** How much of the excess pressure at the wet edge acts under the base. */
export interface UpliftShare {
  /** Mean over the base, r [–]. */
  readonly mean: number
  /** First moment about the dry toe in units of B², m [–]. */
  readonly moment: number
}

const NOTHING: UpliftShare = { mean: 0, moment: 0 }
const LINEAR: UpliftShare = { mean: 1 / 2, moment: 1 / 3 }
const DEEP: UpliftShare = { mean: 1 / 2, moment: 5 / 16 }

/** τ = c t / B² of the developing model. */
function diffusionTime(uplift: UpliftAssumption, base: number): number {
  return ((uplift.diffusivity ?? 0) * (uplift.time ?? 0)) / base ** 2
}

/**
 * Mean and moment of the pressure share under a base of width B.
 *
 * | model | r | m | when |
 * | --- | --- | --- | --- |
 * | none | – | – | sealed: teaching, or a tested seal on an impervious surface |
 * | linear | 1/2 | 1/3 | falls evenly along the line of creep, steady |
 * | deep | 1/2 | 5/16 | deep uniform sand; same force, other lever |
 * | developing | series | series | grows with time after a step in level |
 *
 * @see EM 1110-2-2100 for the even fall (from memory); Harr, Groundwater and Seepage, for the deep base.
 */
export function upliftMoments(uplift: UpliftAssumption, base: number): UpliftShare {
  switch (uplift.model) {
    case 'none':
      return NOTHING
    case 'linear':
      return LINEAR
    case 'deep':
      return DEEP
    case 'developing': {
      const tau = diffusionTime(uplift, base)
      return { mean: developingMean(tau), moment: developingMoment(tau) }
    }
  }
}

/**
 * Share of the edge's excess head that acts at the distance x from the wet edge, 0 to 1.
 *
 * @param base Width of the base B = L + b [m], above 0.
 * @param x Distance from the wet edge [m], 0 to B.
 */
export function upliftShare(uplift: UpliftAssumption, base: number, x: number): number {
  const xi = x / base
  switch (uplift.model) {
    case 'none':
      return 0
    case 'linear':
      return 1 - xi
    case 'deep':
      return Math.acos(Math.max(-1, Math.min(1, 2 * xi - 1))) / Math.PI
    case 'developing':
      return developingShare(diffusionTime(uplift, base), xi)
  }
}

/** Integral of the share from the wet edge over the length x [m], in closed form. */
export function upliftSharePartial(uplift: UpliftAssumption, base: number, x: number): number {
  const xi = x / base
  switch (uplift.model) {
    case 'none':
      return 0
    case 'linear':
      return base * (xi - xi ** 2 / 2)
    case 'deep': {
      const z = Math.max(-1, Math.min(1, 2 * xi - 1))
      return (base * (z * Math.acos(z) - Math.sqrt(1 - z ** 2) + Math.PI)) / (2 * Math.PI)
    }
    case 'developing':
      return base * developingPartial(diffusionTime(uplift, base), xi)
  }
}
