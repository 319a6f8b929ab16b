import { checkBasis, type CheckBasis } from '../catalogue/check-bases'
import { horizontalLoads, type HorizontalLoads } from '../calc/section/horizontal-loads'
import { loadedShape, type LoadedShape } from '../calc/loaded-shape/loaded-shape'
import { sectionGeometry, type SectionGeometry } from '../calc/section/section-geometry'
import {
  frictionResistance,
  UNFACTORED,
  type StrengthFactors,
} from '../calc/section/friction-resistance'
import { flatSkirt } from '../calc/section/flat-skirt'
import { verticalLoads, type VerticalLoads } from '../calc/section/vertical-loads'
import { modelledPressure, type BasePressure } from '../calc/uplift/base-pressure'
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
  /** The same with partial factors on the strength of the ground [N/m]. */
  readonly gripWith: (factors: StrengthFactors) => number
  /** The dry water stands higher than the wet: the thrust points to the water, which is not covered. */
  readonly isReversed: boolean
}

/**
 * Loads and loaded shape of a section.
 *
 * @param findPressure Finds what presses from below; by default the model of the case.
 */
export function sectionState(
  section: SectionCase,
  findPressure: (geometry: SectionGeometry) => BasePressure = (geometry) =>
    modelledPressure(section, geometry),
): SectionState {
  const geometry = sectionGeometry(section)
  const pressure = findPressure(geometry)
  const shape = loadedShape({
    diameter: section.barrier.diameter,
    airPressure: section.barrier.airPressure,
    wettedSkirt: section.barrier.skirtLength === 0 ? 0 : geometry.wettedSkirt,
    depth: geometry.depth,
    unitWeight: geometry.unitWeight,
  })
  const onGround = shape.solved ? flatSkirt(geometry, shape.freeSkirt, pressure) : null
  const gripWith = (factors: StrengthFactors): number =>
    onGround === null ? 0 : frictionResistance(section.ground, onGround, factors)
  return {
    section,
    basis: checkBasis(section.basis),
    geometry,
    shape,
    horizontal: horizontalLoads(section, shape.solved ? shape.crest : section.barrier.diameter),
    vertical: verticalLoads(section, geometry, pressure),
    grip: gripWith(UNFACTORED),
    gripWith,
    isReversed: section.water.dryDepth > geometry.depth,
  }
}
