import type { CrossSectionInput } from './section-input'

/**
 * Friction that the skirt can give, μ N with
 * `N = ρg(L_w h − ½ L_w² sin β) + (W_b − V_lift − V_dry) cos β − F sin β − U` [N/m].
 */
export function frictionResistance(input: CrossSectionInput): number {
  const { thrust, vertical } = input.evaluation
  const { fall, friction } = input.case.ground
  const cos = 1 / Math.hypot(1, fall)
  const square = vertical.waterOnSkirt + vertical.lift - vertical.uplift
  const upright = vertical.self - vertical.lift - vertical.dryLift
  return friction * (square + upright * cos - thrust.total * fall * cos)
}
