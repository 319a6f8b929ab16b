import type { BasePressure } from '../uplift/base-pressure'
import type { OnGround } from './friction-resistance'
import type { SectionGeometry } from './section-geometry'

/**
 * The skirt that stays flat under the loaded tube, and what presses it on the ground:
 *
 *     L_f = L_w − free skirt,   N_f = ρ g h L_f − U_f
 *
 * U_f is the pressure under the skirt over the first L_f metres, with the edge pressure η ρ g h. Null
 * where none stays flat.
 */
export function flatSkirt(
  { unitWeight, depth, wettedSkirt }: SectionGeometry,
  freeSkirt: number,
  pressure: BasePressure,
): OnGround | null {
  const length = wettedSkirt - freeSkirt
  if (length <= 0) return null
  return { normal: unitWeight * depth * length - pressure.underSkirt(length), length }
}
