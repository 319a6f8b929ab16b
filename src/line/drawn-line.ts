import type { LineAnswer } from '@shared/checks/line-check'
import type { LongSectionInput } from '@shared/drawing/long-section'
import { DEFAULT_ENDS, type LineEnds } from '@shared/schemas/mark'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { waterWays } from '@shared/checks/water-ways'
import type { SurveyedLine } from '@/scenario/place-on-line'

type Drawn = Omit<LongSectionInput, 'view' | 'measure'>

/** A survey alone, without water and tubes. */
export function drawnSurvey(line: SurveyedLine & { readonly ends?: LineEnds }): Drawn {
  const { stations, sectionLength, marks = [], ends = null } = line
  return {
    stations,
    sectionLength,
    waterLevel: null,
    runs: [],
    sections: [],
    weakest: null,
    place: null,
    marks,
    ends,
  }
}

/** A line in a scenario with what the check of the line says. */
export function drawnScenario(
  line: SurveyedLine & { readonly ends?: LineEnds },
  content: ScenarioContent,
  { sections, weakest }: LineAnswer,
): Drawn {
  return {
    ...drawnSurvey(line),
    band: { low: content.levelLow ?? null, high: content.levelHigh ?? null },
    flowing: flowingMarks(line, content),
    waterLevel: content.waterLevel,
    runs: drawnRuns(content, sections),
    sections,
    weakest: { chainage: weakest.place, holdsToLevel: weakest.holdsToLevel },
    place: content.place,
  }
}

/** Marks that lead water to the dry side at the level that is checked. */
export function flowingMarks(
  { stations, marks = [], ends = DEFAULT_ENDS }: SurveyedLine & { readonly ends?: LineEnds },
  content: ScenarioContent,
): readonly number[] {
  return waterWays({ stations, marks, ends }, content).flatMap(({ mark, standing }) =>
    mark !== null && standing === 'flows' ? [mark] : [],
  )
}

/** Where runs overlap the later one counts: neighbours of one size are drawn as one. */
export function drawnRuns(
  { sizes }: ScenarioContent,
  sections: readonly { readonly from: number; readonly to: number }[],
) {
  const runs: { from: number; to: number; diameter: number }[] = []
  for (const { from, to } of sections) {
    const middle = (from + to) / 2
    const size = sizes.filter((run) => run.from <= middle && middle <= run.to).at(-1)
    if (!size) continue
    const { diameter } = size.barrier
    const before = runs.at(-1)
    if (before?.to === from && before.diameter === diameter) before.to = to
    else runs.push({ from, to, diameter })
  }
  return runs
}
