import { checksTexts } from '../texts/checks.en'
import { lineTexts } from '../texts/line.en'
import { linePlanTexts } from '../texts/line-plan.en'
import { textResolver, type Message } from '../texts/format-text'
import { LabelPlacer } from './label-placer'
import { planFrame, type PlanFrame } from './plan/plan-frame'
import type { PlanInput } from './plan/plan-input'
import { labelPlan } from './plan/plan-labels'
import { planShapes } from './plan/plan-shapes'
import type { Scene } from './scene'
import { measureWith } from './text-width'

export { hasPlan, ZOOM_RANGE, type PlanFrame, type PlanWindow } from './plan/plan-frame'
export type { PlanInput, PlannedRun } from './plan/plan-input'

/** A plan with the axes in which a pointer finds its place. */
export interface PlanScene extends Scene {
  readonly frame: PlanFrame
}

const measureMetric = measureWith(
  textResolver({ linePage: lineTexts, linePlan: linePlanTexts, checks: checksTexts }, 'metric'),
)

/**
 * Plan of a line, to scale: the line with tubes and skirts as wide as they are, verdicts by section,
 * marks, ends and turns. It is turned so that the line runs down the page: the water lies on the left,
 * the dry side on the right.
 */
export function planScene(input: PlanInput): PlanScene {
  const { view, stations, alternative, window } = input
  const frame = planFrame({ view, stations, window, others: alternative ? [alternative] : [] })
  const placer = new LabelPlacer(view, input.measure ?? measureMetric)
  const shapes = planShapes(input, frame)
  labelPlan(input, frame, placer)
  return {
    width: view.width,
    height: view.height,
    title: { key: 'linePlan.drawing.title' },
    description: describe(input),
    items: [...shapes, ...placer.placed],
    frame,
  }
}

function describe({ stations, marks, flowing, sections }: PlanInput): readonly Message[] {
  const [from, to] = [stations[0]!.chainage, stations[stations.length - 1]!.chainage]
  const failing = sections.filter(({ verdict }) => verdict === 'fails').length
  return [
    {
      key: 'linePlan.drawing.describe',
      values: { from: String(from), to: String(to), count: stations.length },
    },
    ...(marks.length > 0
      ? [
          {
            key: 'linePlan.drawing.describeMarks',
            values: { count: marks.length, open: flowing.length },
          },
        ]
      : []),
    ...(sections.length > 0
      ? [
          {
            key: 'linePlan.drawing.describeSections',
            values: { count: sections.length, failing },
          },
        ]
      : []),
  ]
}
