import type { DeploymentPlan, PlannedLaying } from '../../schemas/deployment'
import type { TimelineInput } from './timeline-input'

/** Where moments, pairs and sections lie in the timeline. */
export interface TimelineFrame {
  readonly left: number
  readonly right: number
  readonly width: number
  readonly height: number
  readonly font: number
  readonly from: number
  readonly to: number
  readonly toX: (moment: number) => number
  /** Middle of the lane of a pair, from 1. */
  readonly laneY: (pair: number) => number
  readonly lane: number
  /** Sections by chainage, and the middle of their rows. */
  readonly rows: readonly { readonly section: PlannedLaying; readonly y: number }[]
  readonly row: number
  readonly sectionsTop: number
  readonly bottom: number
  /** Moments of the ticks. */
  readonly ticks: readonly number[]
}

const LANE = 26
const HOUR = 3_600_000
/** Steps of the axis [ms]. */
const STEPS = [0.25, 0.5, 1, 2, 3, 6, 12, 24, 48, 96].map((hours) => hours * HOUR)
/** Room for the margins at the right, in heights of letters. */
const MARGIN_COLUMN = 4.6
/** Room for one tick [px]. */
const TICK = 48
/** Water that comes later than this share of the whole work after its end is not drawn. */
const BEYOND = 0.45

/** Fixes the axes of the timeline. */
export function timelineFrame(input: TimelineInput): TimelineFrame {
  const { plan, width } = input
  const font = width >= 520 ? 12.5 : 11
  const left = 10 + font * 4.4
  const right = width - 10 - font * MARGIN_COLUMN
  const { from, to } = spanOf(plan)
  const row = rowHeight(plan.sections.length)
  const lanesTop = 8
  const sectionsTop = lanesTop + plan.pairs.length * LANE + font + 20
  const bottom = sectionsTop + plan.sections.length * row
  const sorted = [...plan.sections].sort((a, b) => a.from - b.from)
  return {
    ...{ left, right, width, font, from, to, row, lane: LANE, sectionsTop, bottom },
    height: bottom + 2 * font + 12,
    toX: (moment) => left + ((right - left) * (moment - from)) / (to - from),
    laneY: (pair) => lanesTop + (pair - 0.5) * LANE,
    rows: sorted.map((section, i) => ({ section, y: sectionsTop + (i + 0.5) * row })),
    ticks: ticksOf({ from, to, room: right - left, offset: input.clockOffset }),
  }
}

function rowHeight(sections: number): number {
  if (sections <= 40) return 19
  return Math.max(3, Math.round(760 / sections))
}

function spanOf({ decidedAt, finish, sections }: DeploymentPlan) {
  const arrivals = sections.flatMap(({ deadline }) => deadline.expected ?? [])
  const work = Math.max(finish - decidedAt, HOUR)
  const latest = Math.max(finish, ...arrivals)
  const to = Math.min(latest, finish + BEYOND * work)
  return { from: decidedAt, to: to + 0.03 * work }
}

function ticksOf(axis: { from: number; to: number; room: number; offset: number }) {
  const { from, to, room, offset } = axis
  const most = Math.max(2, Math.floor(room / TICK))
  const step = STEPS.find((size) => (to - from) / size <= most) ?? STEPS[STEPS.length - 1]!
  const first = Math.ceil((from + offset) / step) * step - offset
  const count = Math.max(0, Math.floor((to - first) / step) + 1)
  return Array.from({ length: count }, (_, i) => first + i * step)
}
