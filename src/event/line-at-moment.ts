import type { WaterAtMoment } from '@shared/checks/line-event/event-times'
import type { SectionAtMoment } from '@shared/checks/line-event/line-at-moment'
import { isWorse } from '@shared/checks/compare'
import type { LongSectionInput } from '@shared/drawing/long-section'
import type { Line } from '@shared/schemas/project'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { drawnRuns, drawnSurvey, flowingMarks } from '@/line/drawn-line'

interface MomentOfLine {
  readonly line: Line
  readonly content: ScenarioContent
  readonly water: WaterAtMoment
  readonly sections: readonly SectionAtMoment[]
  readonly place: number
}

/** The long section with the water and the verdicts of one moment. */
export function lineAtMoment({
  line,
  content,
  water,
  sections,
  place,
}: MomentOfLine): Omit<LongSectionInput, 'view' | 'measure'> {
  const { expected, low, high } = water
  const worst = sections.reduce((a, b) => (isWorse(b.utilisation, a.utilisation) ? b : a))
  const isComputed = worst.verdict !== 'notChecked'
  return {
    ...drawnSurvey(line),
    band: { low, high },
    flowing: expected === null ? [] : flowingMarks(line, { ...content, waterLevel: expected }),
    waterLevel: expected,
    runs: drawnRuns(content, sections),
    sections,
    weakest: isComputed ? { chainage: worst.place, holdsToLevel: worst.holdsToLevel } : null,
    place,
  }
}
