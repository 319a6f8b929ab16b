import type { SectionCase } from '../../schemas/section-case'
import type { SectionGeometry } from '../section/section-geometry'
import { upliftForce, upliftUnderSkirt, type Uplift } from './uplift-force'
import type { HeadUnderBase } from './under-base'

/** What presses on a section from below at one moment, whichever way it was found. */
export interface BasePressure {
  /** Resultant under the whole base, with the depth h_e at the wet edge [N/m], [N]. */
  readonly uplift: Uplift
  /** Resultant over the first `length` metres, with the depth h at the wet edge [N/m]. */
  readonly underSkirt: (length: number) => number
}

/** Pressure by the model that the case names. */
export function modelledPressure(section: SectionCase, geometry: SectionGeometry): BasePressure {
  const { unitWeight, edgeDepth, depth, base } = geometry
  const { uplift } = section
  const { dryDepth } = section.water
  return {
    uplift: upliftForce({ uplift, edgeDepth, dryDepth, base, unitWeight }),
    underSkirt: (length) =>
      upliftUnderSkirt({ uplift, edgeDepth: depth, dryDepth, base, unitWeight }, length),
  }
}

/**
 * Pressure that has grown through a changing level.
 *
 * @param under Head under the base with the depth h_e at the wet edge.
 * @param underSkirt The same with the depth h; on level ground there is no difference.
 * @param unitWeight ρ g [N/m³].
 */
export function grownPressure(
  under: HeadUnderBase,
  underSkirt: HeadUnderBase,
  unitWeight: number,
): BasePressure {
  return {
    uplift: { force: unitWeight * under.force, moment: unitWeight * under.moment },
    underSkirt: (length) => unitWeight * underSkirt.upTo(length),
  }
}
