import { lineEventAnswer, type LineEventAnswer } from './line-event-answer'
import type { LineEventInput } from './line-event-input'
import { planLineEvent, type EventJob, type LineEventPlan } from './line-event-plan'
import { LineEventRun, type LineEventWork } from './line-event-run'

/** The work of a plan, or of a share of its jobs. */
export function workOf(
  { water, settings, content }: LineEventInput,
  jobs: readonly EventJob[],
): LineEventWork {
  return { jobs, water, settings, dryLevel: content.dryLevel }
}

/**
 * Shares of the jobs of a plan, for so many workers, by place in the plan: neighbours go to different
 * workers, so that both are finished at about the same time.
 */
export function sharesOf({ jobs }: LineEventPlan, workers: number): readonly (readonly number[])[] {
  const order = jobs.map((_, i) => i)
  return Array.from({ length: workers }, (_, worker) =>
    order.filter((i) => i % workers === worker),
  ).filter(({ length }) => length > 0)
}

/**
 * A whole line through an event in one go: every section of the laid line in every band, with first
 * exceedance, least factor and freeboard, leave level and leave time.
 *
 * @throws OutOfRangeError with every fault of the series and settings.
 */
export function lineEvent(input: LineEventInput): LineEventAnswer {
  const plan = planLineEvent(input)
  const outcomes = new LineEventRun(workOf(input, plan.jobs)).answer()
  return lineEventAnswer(plan, outcomes, input.water)
}
