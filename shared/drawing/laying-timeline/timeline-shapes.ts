import type { PlannedLaying } from '../../schemas/deployment'
import { areaPath, linePath, segmentsPath } from '../path-data'
import type { Point, SceneItem, ShapeRole } from '../scene'
import type { TimelineFrame } from './timeline-frame'
import type { TimelineInput } from './timeline-input'

interface Bar {
  readonly section: PlannedLaying
  readonly y: number
  readonly height: number
}

/** Bars of pairs and sections, filling marked, and the water that comes to each section. */
export function timelineShapes(input: TimelineInput, frame: TimelineFrame): readonly SceneItem[] {
  const items: SceneItem[] = []
  const add = (id: string, role: ShapeRole, d: string) => {
    if (d !== '') items.push({ kind: 'path', id, role, d })
  }
  const { left, right, bottom, laneY, lane, rows, row, ticks, toX } = frame
  const { plan } = input
  const upright = (x: number): [Point, Point] => [
    { x, y: laneY(1) - lane / 2 },
    { x, y: bottom },
  ]
  const lanes = plan.sections.map((section) => ({
    ...{ section, y: laneY(section.pair), height: lane - 9 },
  }))
  const inRows = rows.map(({ section, y }) => ({ section, y, height: Math.max(2, row - 6) }))
  const bars = [...lanes, ...inRows]
  add('grid', 'grid', segmentsPath(ticks.map((tick) => upright(toX(tick)))))
  add('water', 'waterOverlay', rows.map((one) => water(input, frame, one)).join(''))
  add('bands', 'levelLine', segmentsPath(rows.flatMap((one) => bandOf(frame, one))))
  add('coming', 'ghost', segmentsPath(comingOf(input, frame)))
  add('work', 'barrierFill', bars.map((bar) => bodyOf(frame, bar)).join(''))
  add('fills', 'workFill', bars.map((bar) => fillOf(frame, bar)).join(''))
  add('outline', 'tubeEdge', bars.map((bar) => bodyOf(frame, bar)).join(''))
  add('waits', 'dimension', segmentsPath(bars.flatMap((bar) => waitOf(frame, bar))))
  add('arrival', 'waterLine', segmentsPath(rows.flatMap((one) => arrivalOf(input, frame, one))))
  add('late', 'sectionFails', inRows.map((bar) => lateOf(input, frame, bar)).join(''))
  add('start', 'placeLine', segmentsPath([upright(toX(plan.layingFrom))]))
  add(
    'axis',
    'axis',
    linePath([
      { x: left, y: bottom },
      { x: right, y: bottom },
    ]),
  )
  return items
}

function box(x1: number, x2: number, y: number, height: number): string {
  const [top, bottom] = [y - height / 2, y + height / 2]
  return areaPath([
    { x: x1, y: top },
    { x: x2, y: top },
    { x: x2, y: bottom },
    { x: x1, y: bottom },
  ])
}

/** Work before and after a wait is drawn; the wait itself is a line. */
function bodyOf({ toX }: TimelineFrame, { section, y, height }: Bar): string {
  const fill = section.steps.find(({ step }) => step === 'fill')!
  const { start, finish } = section
  if (fill.waited <= 0) return box(toX(start), toX(finish), y, height)
  const wants = fill.from - fill.waited * 1000
  return box(toX(start), toX(wants), y, height) + box(toX(fill.from), toX(finish), y, height)
}

function fillOf({ toX }: TimelineFrame, { section, y, height }: Bar): string {
  const fill = section.steps.find(({ step }) => step === 'fill')!
  return fill.to > fill.from ? box(toX(fill.from), toX(fill.to), y, height) : ''
}

function waitOf({ toX }: TimelineFrame, { section, y }: Bar): [Point, Point][] {
  const fill = section.steps.find(({ step }) => step === 'fill')!
  if (fill.waited <= 0) return []
  const wants = fill.from - fill.waited * 1000
  return [
    [
      { x: toX(wants), y },
      { x: toX(fill.from), y },
    ],
  ]
}

/** From the decision until a pair is at the line. */
function comingOf({ plan }: TimelineInput, { toX, laneY }: TimelineFrame): [Point, Point][] {
  return plan.pairs.map(({ number, onSite }) => [
    { x: toX(plan.decidedAt), y: laneY(number) },
    { x: toX(onSite), y: laneY(number) },
  ])
}

type Row = TimelineFrame['rows'][number]

function water({ plan }: TimelineInput, frame: TimelineFrame, { section, y }: Row): string {
  const deadline = section.deadline[plan.judgedBy]
  if (deadline === null || deadline >= frame.to) return ''
  return box(frame.toX(Math.max(frame.from, deadline)), frame.right, y, frame.row)
}

function arrivalOf({ plan }: TimelineInput, frame: TimelineFrame, { section, y }: Row) {
  const deadline = section.deadline[plan.judgedBy]
  if (deadline === null || deadline > frame.to || deadline < frame.from) return []
  const x = frame.toX(deadline)
  const half = frame.row / 2
  return [
    [
      { x, y: y - half },
      { x, y: y + half },
    ] as [Point, Point],
  ]
}

/** From the hour of the high band to that of the low one. */
function bandOf({ from, to, toX }: TimelineFrame, { section, y }: Row): [Point, Point][] {
  const { high, low } = section.deadline
  if (high === null || high >= to) return []
  const end = Math.min(low ?? to, to)
  const start = Math.max(high, from)
  return end > start
    ? [
        [
          { x: toX(start), y },
          { x: toX(end), y },
        ],
      ]
    : []
}

/** The part of the work that is done in the water, as a bar under it. */
function lateOf(
  { plan }: TimelineInput,
  frame: TimelineFrame,
  { section, y, height }: Bar,
): string {
  const margin = section.margin[plan.judgedBy]
  const deadline = section.deadline[plan.judgedBy]
  if (margin === null || deadline === null || margin >= 0) return ''
  const from = frame.toX(Math.max(section.start, deadline))
  return box(
    Math.min(from, frame.toX(section.finish) - 2),
    frame.toX(section.finish),
    y + height / 2,
    3,
  )
}
