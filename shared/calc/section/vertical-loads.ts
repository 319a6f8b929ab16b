import type { SectionCase } from '../../schemas/section-case'
import { tubeOverhang } from '../hydrostatics/tube-overhang'
import { modelledPressure, type BasePressure } from '../uplift/base-pressure'
import type { Uplift } from '../uplift/uplift-force'
import type { SectionGeometry } from './section-geometry'

/** What holds the barrier down and what lifts it, per metre run. */
export interface VerticalLoads {
  /** Pressure on the wetted skirt, normal to the ground, ρ g (L_w h − ½ L_w² sin β) [N/m]. */
  readonly skirtWater: number
  /** The same less what the overhanging tube displaces, W_w [N/m]. */
  readonly waterOnSkirt: number
  /** Lift of the tube by the water on the wet side, V_lift = ρ g A_o [N/m]. */
  readonly lift: number
  /** Lift by the water on the dry side, V_dry [N/m]. */
  readonly dryLift: number
  /** Own weight, W_b [N/m]. */
  readonly self: number
  readonly uplift: Uplift
  /** Weight less uplift, W − U with W = W_w + W_b − V_dry [N/m]. */
  readonly net: number
  /** Moments about the dry toe [N]. */
  readonly waterMoment: number
  readonly selfMoment: number
}

/**
 * Vertical loads and their moments about the dry toe, with the pressure under the base as the case
 * models it, or as it was found elsewhere:
 *
 *     M_Ww = ρ g [h (b L_w + L_w²/2) − sin β (b L_w²/2 + L_w³/3)] − ρ g M_o
 *     M_Wb = W_b b / 2
 */
export function verticalLoads(
  section: SectionCase,
  geometry: SectionGeometry,
  pressure: BasePressure = modelledPressure(section, geometry),
): VerticalLoads {
  const { barrier, water, gravity } = section
  const { unitWeight, depth: h, sinFall, wettedSkirt: l } = geometry
  const { diameter, contactWidth: b } = barrier
  const wet = tubeOverhang(diameter, b, h)
  const lift = unitWeight * wet.area
  const dryLift = unitWeight * tubeOverhang(diameter, b, water.dryDepth).area
  const skirtWater = unitWeight * (l * h - 0.5 * l ** 2 * sinFall)
  const self = barrier.mass * gravity
  const onSkirt = h * (b * l + l ** 2 / 2) - sinFall * ((b * l ** 2) / 2 + l ** 3 / 3)
  return {
    skirtWater,
    waterOnSkirt: skirtWater - lift,
    lift,
    dryLift,
    self,
    uplift: pressure.uplift,
    net: skirtWater - lift + self - dryLift - pressure.uplift.force,
    waterMoment: unitWeight * (onSkirt - wet.moment),
    selfMoment: (self * b) / 2,
  }
}
