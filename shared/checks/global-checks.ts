import { frictionResistance } from '../calc/section/friction-resistance'
import type { DemandAndResistance } from './compare'
import type { SectionState } from './section-state'

/** Demand and resistance of the checks that a basis may weigh in its own way. */
export interface StabilityPairs {
  readonly sliding: DemandAndResistance
  readonly overturning: DemandAndResistance
  readonly flotation: DemandAndResistance
  readonly skirt: DemandAndResistance
  readonly fabric: DemandAndResistance
}

/**
 * Pairs for a basis with global factors of safety.
 *
 *     sliding      μ N against F cos β + (W_b − V_lift − V_dry) sin β, with
 *                  N = ρg(L_w h − ½ L_w² sin β) + (W_b − V_lift − V_dry) cos β − F sin β − U;
 *                  on soft ground at most c_u B and 0.4 N
 *     overturning  M_Ww + M_Wb − M_U against M_F, about the dry toe: the two faces of one membrane
 *                  are one source (EN 1997-1, single source), so the ratio is net
 *     flotation    W against U
 *     skirt        grip of the flat skirt against all horizontal loads
 *     fabric       strength against the larger of skin tension and thrust
 */
export function globalPairs(state: SectionState): StabilityPairs {
  const { section, geometry, horizontal, vertical, grip } = state
  const { sinFall, cosFall } = geometry
  const { force, moment } = horizontal.total
  const afloat = vertical.self - vertical.lift - vertical.dryLift
  const normal = vertical.skirtWater + afloat * cosFall - force * sinFall - vertical.uplift.force

  return {
    sliding: {
      demand: force * cosFall + afloat * sinFall,
      resistance: frictionResistance(section.ground, { normal, length: geometry.base }),
    },
    overturning: {
      demand: moment,
      resistance: vertical.waterMoment + vertical.selfMoment - vertical.uplift.moment,
    },
    flotation: {
      demand: vertical.uplift.force,
      resistance: vertical.waterOnSkirt + vertical.self - vertical.dryLift,
    },
    skirt: { demand: force, resistance: grip },
    fabric: {
      demand: skinDemand(state),
      resistance: section.barrier.fabricStrength ?? 0,
    },
  }
}

/** The larger of skin tension and thrust; the unloaded tension p D/2 where no shape stands [N/m]. */
export function skinDemand({ section, shape, horizontal }: SectionState): number {
  const { airPressure, diameter } = section.barrier
  const tension = shape.solved ? shape.skinTension : (airPressure * diameter) / 2
  return Math.max(tension, horizontal.total.force)
}
