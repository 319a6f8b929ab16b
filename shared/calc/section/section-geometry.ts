import type { SectionCase } from '../../schemas/section-case'

/** How the water lies on the ground and on the skirt. */
export interface SectionGeometry {
  /** ρ g [N/m³]. */
  readonly unitWeight: number
  /** Depth at the weld line, h [m]. */
  readonly depth: number
  readonly sinFall: number
  readonly cosFall: number
  /** Depth at the wet edge of the skirt, h_e [m]; 0 where the edge stays dry. */
  readonly edgeDepth: number
  /** Length of skirt under water, L_w [m]. */
  readonly wettedSkirt: number
  /** Base from the wet edge to the dry toe, B = L + b [m]. */
  readonly base: number
}

/**
 * Depths and lengths of a section on ground with the crossfall tan β:
 *
 *     h_e = max(0, h − L sin β)     L_w = L, or h / sin β where the edge stays dry
 */
export function sectionGeometry(section: SectionCase): SectionGeometry {
  const { barrier, ground, water, gravity } = section
  const cosFall = 1 / Math.sqrt(1 + ground.fall ** 2)
  const sinFall = ground.fall * cosFall
  const edge = water.depth - barrier.skirtLength * sinFall
  return {
    unitWeight: water.density * gravity,
    depth: water.depth,
    sinFall,
    cosFall,
    edgeDepth: Math.max(0, edge),
    wettedSkirt: edge >= 0 ? barrier.skirtLength : water.depth / sinFall,
    base: barrier.skirtLength + barrier.contactWidth,
  }
}
