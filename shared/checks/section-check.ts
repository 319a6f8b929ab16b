import type { SectionCase } from '../schemas/section-case'
import type { SectionResult } from '../schemas/section-result'
import { evaluateSection } from './evaluate-section'
import { holdingProfile, holdsToAt } from './holds-to'
import { justEnough } from './just-enough'

/**
 * The whole answer for one section, as the batch command and the API give it.
 *
 * @remarks Expects a case inside `SECTION_RANGES`; `parseSectionCase` sees to that.
 */
export function checkSection(section: SectionCase): SectionResult {
  const { workings: _, ...evaluation } = evaluateSection(section)
  return {
    ...evaluation,
    justEnough: justEnough(section),
    holdsTo: holdsToAt(holdingProfile(section), section.water.depth),
  }
}
