import { evaluateSection } from '../../checks/evaluate-section'
import type { SectionCase } from '../../schemas/section-case'

/** The case that is marked in the design chart. */
export interface PresentCase {
  /** p/(ρ g D). */
  readonly ratio: number
  /** h/D. */
  readonly depth: number
  /** Crest over D; null where no shape stands. */
  readonly crest: number | null
}

/** A section in the ratios of the design chart. */
export function presentCase(section: SectionCase): PresentCase {
  const { barrier, water, gravity } = section
  const { loadedShape } = evaluateSection(section)
  return {
    ratio: barrier.airPressure / (water.density * gravity * barrier.diameter),
    depth: water.depth / barrier.diameter,
    crest: loadedShape.solved ? loadedShape.crest / barrier.diameter : null,
  }
}
