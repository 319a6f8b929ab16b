import { checkBasis, type CheckBasis } from '../catalogue/check-bases'
import { horizontalLoads, type HorizontalLoads } from '../calc/section/horizontal-loads'
import { loadedShape, type LoadedShape } from '../calc/loaded-shape/loaded-shape'
import { sectionGeometry, type SectionGeometry } from '../calc/section/section-geometry'
import { skirtGrip } from '../calc/section/skirt-grip'
import { verticalLoads, type VerticalLoads } from '../calc/section/vertical-loads'
import type { SectionCase } from '../schemas/section-case'

/** Everything that the checks of one section look at. */
export interface SectionState {
  readonly section: SectionCase
  readonly basis: CheckBasis
  readonly geometry: SectionGeometry
  readonly shape: LoadedShape
  readonly horizontal: HorizontalLoads
  readonly vertical: VerticalLoads
  /** Friction resistance of the flat skirt [N/m]; 0 where no shape stands. */
  readonly grip: number
  /** The dry water stands higher than the wet: the thrust points to the water, which is not covered. */
  readonly isReversed: boolean
}

/** Loads and loaded shape of a section. */
export function sectionState(section: SectionCase): SectionState {
  const geometry = sectionGeometry(section)
  const shape = loadedShape({
    diameter: section.barrier.diameter,
    airPressure: section.barrier.airPressure,
    wettedSkirt: section.barrier.skirtLength === 0 ? 0 : geometry.wettedSkirt,
    depth: geometry.depth,
    unitWeight: geometry.unitWeight,
  })
  return {
    section,
    basis: checkBasis(section.basis),
    geometry,
    shape,
    horizontal: horizontalLoads(section, shape.solved ? shape.crest : section.barrier.diameter),
    vertical: verticalLoads(section, geometry),
    grip: shape.solved ? skirtGrip(section, geometry, shape.freeSkirt) : 0,
    isReversed: section.water.dryDepth > geometry.depth,
  }
}
