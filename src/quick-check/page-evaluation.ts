import { evaluateSection, type SectionEvaluation } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'

/**
 * The evaluation that a page shows. A barrier whose skirt is off is never said to hold, not even on
 * dry ground, where nothing presses yet and so no check fails: the first water would take it.
 */
export function pageEvaluation(section: SectionCase, gripShare = 1): SectionEvaluation {
  const evaluation = evaluateSection(section, gripShare)
  const passes = evaluation.verdict === 'holds' || evaluation.verdict === 'narrow'
  if (section.barrier.skirtLength > 0 || !passes) return evaluation
  return { ...evaluation, verdict: 'fails', governs: 'skirt' }
}
