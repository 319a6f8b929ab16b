import { evaluateSection } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Verdict } from '@shared/schemas/section-result'

export type MarkId = 'low' | 'expected' | 'high'

/** One mark of the band in which the water may come. */
export interface WaterMark {
  readonly id: MarkId
  /** Depth [m]; 0 where the water stays below the ground. */
  readonly depth: number
  /** `dry`: below the ground; `beyond`: over anything that a tube of this size can be asked. */
  readonly verdict: Verdict | 'dry' | 'beyond'
}

/** Low, expected and high water with their verdicts; empty where the water is taken as certain. */
export function waterMarks(section: SectionCase, uncertainty: number): readonly WaterMark[] {
  if (uncertainty <= 0) return []
  const { depth } = section.water
  return [
    markAt(section, 'low', depth - uncertainty),
    markAt(section, 'expected', depth),
    markAt(section, 'high', depth + uncertainty),
  ]
}

function markAt(section: SectionCase, id: MarkId, depth: number): WaterMark {
  if (depth <= 0) return { id, depth, verdict: 'dry' }
  if (depth > 1.5 * section.barrier.diameter) return { id, depth, verdict: 'beyond' }
  const { verdict } = evaluateSection({ ...section, water: { ...section.water, depth } })
  return { id, depth, verdict }
}
