import { deploymentTexts } from '../texts/deployment.en'
import { drawingTexts } from '../texts/drawing.en'
import { textResolver, type Message } from '../texts/format-text'
import { LabelPlacer } from './label-placer'
import { timelineFrame } from './laying-timeline/timeline-frame'
import type { TimelineInput } from './laying-timeline/timeline-input'
import { labelTimeline } from './laying-timeline/timeline-labels'
import { timelineShapes } from './laying-timeline/timeline-shapes'
import type { Scene } from './scene'
import { measureWith } from './text-width'

export type { TimelineInput } from './laying-timeline/timeline-input'

const measureMetric = measureWith(
  textResolver({ drawing: drawingTexts, deployment: deploymentTexts }, 'metric'),
)

/**
 * Timeline of a deployment: above, what each pair does when, with filling marked and waiting for a
 * blower left open; below, each section by its chainage with the work on it and the water that comes
 * to it, the hours of low and high band beside the one that is judged by.
 */
export function layingTimelineScene(input: TimelineInput): Scene {
  const frame = timelineFrame(input)
  const { width, height } = frame
  const placer = new LabelPlacer({ width, height }, input.measure ?? measureMetric)
  const shapes = timelineShapes(input, frame)
  labelTimeline(input, frame, placer)
  return {
    width,
    height,
    title: { key: 'deployment.drawing.title' },
    description: describe(input),
    items: [...shapes, ...placer.placed],
  }
}

function describe({ plan, dayTime }: TimelineInput): readonly Message[] {
  const say = (name: string, values: Message['values'] = {}): Message => ({
    key: `deployment.drawing.describe.${name}`,
    values,
  })
  const worst = plan.worst[plan.judgedBy]
  return [
    say('work', {
      pairs: plan.pairs.length,
      sections: plan.sections.length,
      from: dayTime(plan.layingFrom),
      to: dayTime(plan.finish),
    }),
    worst
      ? say(worst.margin < 0 ? 'late' : 'left', {
          minutes: Math.round(Math.abs(worst.margin) / 60),
          chainage: String(Number(worst.from.toFixed(2))),
        })
      : say('dry'),
  ]
}
