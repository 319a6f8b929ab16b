import type { LineAnswer } from '@shared/checks/line-check'
import { laidSections } from '@shared/checks/layout/layout-bill'
import type { PlannedRun } from '@shared/drawing/plan'
import type { Station } from '@shared/schemas/line'
import type { Background } from '@shared/schemas/mark'
import type { Line, ProjectFile } from '@shared/schemas/project'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { fileContent } from '@/api/files'
import type { DrawnPlan } from '@/composables/usePlanView'
import { flowingMarks } from './drawn-line'

/** A survey from above, without tubes. */
export function drawnPlan({ stations, marks, ends }: Line): DrawnPlan {
  return {
    stations,
    marks,
    ends,
    runs: [],
    sections: [],
    weakest: null,
    place: null,
    flowing: [],
    alternative: null,
  }
}

/** A scenario from above, another line beside it. */
export function drawnScenarioPlan(
  line: Line,
  content: ScenarioContent,
  { sections, weakest }: LineAnswer,
  alternative: readonly Station[] | null,
): DrawnPlan {
  return {
    ...drawnPlan(line),
    runs: plannedRuns(line, content),
    sections,
    weakest: { chainage: weakest.place, holdsToLevel: weakest.holdsToLevel },
    place: content.place,
    flowing: flowingMarks(line, content),
    alternative,
  }
}

function plannedRuns(line: Line, content: ScenarioContent): readonly PlannedRun[] {
  return laidSections(line, content).flatMap(({ section: { from, to }, run }) => {
    if (!run) return []
    const { diameter, skirtLength, contactWidth } = run.barrier
    return [{ from, to, diameter, skirtLength, contactWidth }]
  })
}

/** The picture under a plan; null where there is none, or its file is gone. */
export function pictureUnder(
  projectId: string,
  background: Background | null,
  files: readonly ProjectFile[],
) {
  const file = files.find(({ id }) => id === background?.fileId)
  if (!background || !file?.width || !file.height) return null
  const { id, width, height } = file
  return { href: fileContent(projectId, id), width, height, placed: background }
}
