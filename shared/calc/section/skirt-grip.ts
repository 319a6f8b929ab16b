import type { SectionCase } from '../../schemas/section-case'
import { upliftUnderSkirt } from '../uplift/uplift-force'
import type { SectionGeometry } from './section-geometry'

/**
 * Friction resistance of the skirt that stays flat under the loaded tube:
 *
 *     L_f = L_w − free skirt,   grip = μ (ρ g h L_f − U_f)   [N/m]
 *
 * U_f is the pressure under the skirt over the first L_f metres, with the edge pressure η ρ g h.
 * No flat skirt, no grip.
 */
export function skirtGrip(
  section: SectionCase,
  geometry: SectionGeometry,
  freeSkirt: number,
): number {
  const { unitWeight, depth, wettedSkirt, base } = geometry
  const flat = wettedSkirt - freeSkirt
  if (flat <= 0) return 0
  const under = upliftUnderSkirt(
    {
      uplift: section.uplift,
      edgeDepth: depth,
      dryDepth: section.water.dryDepth,
      base,
      unitWeight,
    },
    flat,
  )
  return section.ground.friction * (unitWeight * depth * flat - under)
}
