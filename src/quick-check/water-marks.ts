import type { LeaveLevel } from '@shared/checks/leave-level'
import type { SectionMarks } from '@shared/drawing/cross-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { HoldsTo, Verdict } from '@shared/schemas/section-result'

export type MarkId = 'low' | 'expected' | 'high'
import { pageEvaluation } from './page-evaluation'

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
  const { verdict } = pageEvaluation({ ...section, water: { ...section.water, depth } })
  return { id, depth, verdict }
}

/** Marks of the drawing: the band of the water, what holds, and when to leave. */
export function drawnMarks(
  marks: readonly WaterMark[],
  holdsTo: HoldsTo,
  leave: Pick<LeaveLevel, 'depth'>,
): SectionMarks {
  const depthOf = (wanted: MarkId) => {
    const mark = marks.find(({ id }) => id === wanted)
    return mark && mark.depth > 0 ? mark.depth : null
  }
  return {
    low: depthOf('low'),
    high: depthOf('high'),
    holdsTo: holdsTo.from === null ? null : holdsTo.depth,
    // Below the ground there is nothing to mark: the words say when to leave.
    leave: leave.depth !== null && leave.depth > 0 ? leave.depth : null,
  }
}
