import type { Message } from '../texts/format-text'
import { DESIGN_RATIOS, designCurve, type DesignCurve } from './chart/design-curves'
import { designFrame, type DesignFrame } from './chart/design-frame'
import type { PresentCase } from './chart/present-case'
import { boxAround, LabelPlacer, spreadColumn, type Spot } from './label-placer'
import { areaPath, linePath, segmentsPath } from './path-data'
import type { Point, Scene, SceneItem, ShapeRole, TextItem, View } from './scene'
import type { MeasureText } from './text-width'

export interface DesignChartInput {
  readonly view: View
  readonly measure: MeasureText
  readonly present: PresentCase | null
}

/** Crest over diameter against depth over diameter, one curve for each pressure; each carries its name. */
export function designChartScene(input: DesignChartInput): Scene {
  const { view, present, measure } = input
  const curves = DESIGN_RATIOS.map(designCurve)
  const own = present && designCurve(present.ratio)
  const frame = designFrame(view, present?.crest ?? null)
  const placer = new LabelPlacer(view, measure)
  labelAxes(frame, placer)
  const names = curveNames(curves, frame)
  for (const { points } of own ? [...curves, own] : []) avoid(points.map(toPixel(frame)), placer)
  if (present) labelPresent(present, frame, placer)
  return {
    ...view,
    title: { key: 'method.chart.title' },
    description: describe(present),
    items: [...shapes(curves, own, present, frame), ...names, ...placer.placed],
  }
}

const toPixel =
  ({ toX, toY }: DesignFrame) =>
  ({ depth, crest }: { depth: number; crest: number }): Point => ({ x: toX(depth), y: toY(crest) })

function shapes(
  curves: readonly DesignCurve[],
  own: DesignCurve | null,
  present: PresentCase | null,
  frame: DesignFrame,
): readonly SceneItem[] {
  const { top, bottom, toX, toY, lowest } = frame
  const items: SceneItem[] = []
  const add = (id: string, role: ShapeRole, d: string) => items.push({ kind: 'path', id, role, d })
  const start = { x: toX(lowest), y: bottom }
  const end = { x: toX(1), y: toY(1) }
  add('over', 'shortfall', areaPath([start, end, { x: toX(1), y: bottom }]))
  for (const [id, role, d] of axisPaths(frame)) add(id, role, d)
  add('limit', 'required', linePath([start, end]))
  for (const { ratio, points } of curves) {
    add(`curve-${ratio}`, 'curveAlternative', linePath(points.map(toPixel(frame))))
  }
  if (own) add('own', 'curve', linePath(own.points.map(toPixel(frame))))
  if (present && present.depth <= 1) {
    const x = toX(present.depth)
    add(
      'now',
      'now',
      segmentsPath([
        [
          { x, y: top },
          { x, y: bottom },
        ],
      ]),
    )
  }
  if (present && present.crest !== null) {
    const { x, y } = toPixel(frame)({ depth: present.depth, crest: present.crest })
    items.push({ kind: 'circle', id: 'now-dot', role: 'nowDot', cx: x, cy: y, r: 4.5 })
  }
  return items
}

/** Grid, axes and ticks. */
function axisPaths(frame: DesignFrame): readonly (readonly [string, ShapeRole, string])[] {
  const { left, right, top, bottom, toX, toY } = frame
  const across = frame.crestTicks.map((crest): [Point, Point] => [
    { x: left, y: toY(crest) },
    { x: right, y: toY(crest) },
  ])
  const axes = [
    { x: left, y: top },
    { x: left, y: bottom },
    { x: right, y: bottom },
  ]
  const ticks = frame.depthTicks.map((depth): [Point, Point] => [
    { x: toX(depth), y: bottom },
    { x: toX(depth), y: bottom + 4 },
  ])
  return [
    ['grid', 'grid', segmentsPath(across)],
    ['axes', 'axis', linePath(axes)],
    ['ticks', 'axis', segmentsPath(ticks)],
  ]
}

function labelAxes(frame: DesignFrame, placer: LabelPlacer): void {
  const { left, right, bottom, top, toX, toY, font } = frame
  const size = font - 1
  const tick = (id: string, value: number): Parameters<LabelPlacer['put']>[0] => ({
    id,
    role: 'labelQuiet',
    size,
    message: { key: 'method.chart.tick', values: { value: { value, kind: 'ratio' } } },
  })
  for (const crest of frame.crestTicks) {
    const y = toY(crest) + size * 0.35
    placer.put(tick(`crest-${crest}`, crest), { x: left - 6, y, anchor: 'end' })
  }
  for (const depth of frame.depthTicks) {
    const spot = { x: toX(depth), y: bottom + size + 6, anchor: 'middle' } as const
    placer.put(tick(`depth-${depth}`, depth), spot)
  }
  const quiet = { role: 'labelQuiet', size } as const
  placer.put(
    { ...quiet, id: 'depth-axis', message: { key: 'method.chart.depthAxis' } },
    { x: (left + right) / 2, y: bottom + 2 * size + 10, anchor: 'middle' },
  )
  placer.put(
    { ...quiet, id: 'crest-axis', message: { key: 'method.chart.crestAxis' } },
    { x: left, y: top - 8, anchor: 'start' },
  )
  placer.put(
    { ...quiet, id: 'ratio-axis', message: { key: 'method.chart.ratioAxis' } },
    { x: right + frame.names, y: top - 8, anchor: 'end' },
  )
  placer.put(
    { id: 'limit', role: 'labelFails', size, message: { key: 'method.chart.limit' } },
    { x: toX(1) - 6, y: bottom - 8, anchor: 'end' },
  )
}

/** Names beside the ends of the curves, spread where they would meet. */
function curveNames(curves: readonly DesignCurve[], frame: DesignFrame): readonly TextItem[] {
  const { toX, toY, font, top, bottom } = frame
  const ends = [...curves].reverse().map(({ ratio, points }) => ({ ratio, ...points.at(-1)! }))
  const heights = spreadColumn(
    ends.map(({ crest }) => toY(crest) + font * 0.35),
    font + 1,
    { top: top + font * 0.35, bottom },
  )
  return ends.map(({ ratio, depth }, i) => ({
    kind: 'text',
    id: `name-${ratio}`,
    role: 'labelQuiet',
    x: toX(depth) + 9,
    y: heights[i]!,
    anchor: 'start',
    size: font,
    weight: 600,
    message: { key: 'method.chart.curve', values: { ratio: { value: ratio, kind: 'ratio' } } },
  }))
}

function avoid(points: readonly Point[], placer: LabelPlacer): void {
  for (let i = 0; i + 1 < points.length; i += 1) {
    placer.avoid(boxAround(points[i]!, points[i + 1]!, 2))
  }
}

function presentMessage({ ratio, depth, crest }: PresentCase): Message {
  const values = {
    ratio: { value: ratio, kind: 'ratio' },
    depth: { value: depth, kind: 'ratio' },
  } as const
  if (crest === null) return { key: 'method.chart.fallen', values }
  return { key: 'method.chart.present', values: { ...values, crest: crest.toFixed(3) } }
}

/** Where the label of the marked case is tried, in lines of text below it. */
const LINES_BELOW = [2.5, 4, 6, 8, 10, 13, 16, 20] as const

function labelPresent(present: PresentCase, frame: DesignFrame, placer: LabelPlacer): void {
  const { toX, toY, font, left, bottom } = frame
  const x = toX(Math.min(1, present.depth))
  const y = present.crest === null ? (frame.top + bottom) / 2 : toY(present.crest)
  const label = { id: 'present', role: 'label', size: font, weight: 600 } as const
  const below = LINES_BELOW.map((lines) => y + lines * font)
  const spots = [
    ...below.map((height): Spot => ({ x: x - 8, y: height, anchor: 'end' })),
    ...below.map((height): Spot => ({ x: x + 8, y: height, anchor: 'start' })),
    ...below.map((height): Spot => ({ x: left + 10, y: height, anchor: 'start' })),
  ]
  placer.placeSurely({ ...label, message: presentMessage(present) }, spots)
}

function describe(present: PresentCase | null): readonly Message[] {
  const axes: Message = { key: 'method.chart.describe' }
  return present ? [axes, presentMessage(present)] : [axes]
}
