import type { Message } from '../texts/format-text'
import { textResolver } from '../texts/format-text'
import { drawingTexts } from '../texts/drawing.en'
import { chartFrame, type ChartFrame } from './chart/chart-frame'
import { curvePieces, factorAt } from './chart/curves'
import { labelChart } from './chart/chart-labels'
import type { FactorChartInput } from './chart/factor-chart-input'
import { LabelPlacer } from './label-placer'
import { areaPath, linePath, segmentsPath } from './path-data'
import type { Point, Scene, SceneItem, ShapeRole } from './scene'
import { measureWith } from './text-width'

export type { FactorChartInput, FactorPoint, FactorSeries } from './chart/factor-chart-input'

const measureMetric = measureWith(textResolver({ drawing: drawingTexts }, 'metric'))

/**
 * Factor against depth: the case as it is, what it would be, the required factor, the water now and
 * the depth to which the section holds. Every curve carries its name; factors above the upper edge
 * are cut off, and the chart says so.
 */
export function factorChartScene(input: FactorChartInput): Scene {
  const frame = chartFrame(input)
  const placer = new LabelPlacer(input.view, input.measure ?? measureMetric)
  const shapes = chartShapes(input, frame)
  labelChart(input, frame, placer)
  return {
    width: input.view.width,
    height: input.view.height,
    title: { key: 'drawing.chart.title' },
    description: describeChart(input),
    items: [...shapes, ...placer.placed],
  }
}

function chartShapes(input: FactorChartInput, frame: ChartFrame): readonly SceneItem[] {
  const items: SceneItem[] = []
  const add = (id: string, role: ShapeRole, d: string) => {
    if (d !== '') items.push({ kind: 'path', id, role, d })
  }
  const { left, right, top, bottom } = frame
  const across = (y: number): [Point, Point] => [
    { x: left, y },
    { x: right, y },
  ]
  const { required } = input
  if (required !== null) add('shortfall', 'shortfall', shortfall(frame, required))
  add('grid', 'grid', segmentsPath(frame.factorTicks.slice(1).map((f) => across(frame.toY(f)))))
  add(
    'axes',
    'axis',
    linePath([
      { x: left, y: top },
      { x: left, y: bottom },
      { x: right, y: bottom },
    ]),
  )
  add('ticks', 'axis', segmentsPath(tickMarks(frame)))
  if (required !== null) add('required', 'required', segmentsPath([across(frame.toY(required))]))
  addMarks(input, frame, add)
  for (const { id, style, points } of input.series) {
    const d = curvePieces(frame, points).map(linePath).join('')
    add(`curve-${id}`, style === 'chosen' ? 'curve' : 'curveAlternative', d)
  }
  const dot = nowDot(input, frame)
  if (dot)
    items.push({ kind: 'circle', id: 'now-dot', role: 'nowDot', cx: dot.x, cy: dot.y, r: 4.5 })
  return items
}

function shortfall({ left, right, toY }: ChartFrame, required: number): string {
  const [from, to] = [toY(required), toY(0)]
  return areaPath([
    { x: left, y: from },
    { x: right, y: from },
    { x: right, y: to },
    { x: left, y: to },
  ])
}

function tickMarks(frame: ChartFrame): readonly (readonly [Point, Point])[] {
  return frame.depthTicks.map((depth): readonly [Point, Point] => {
    const x = frame.toX(depth)
    return [
      { x, y: frame.bottom },
      { x, y: frame.bottom + 4 },
    ]
  })
}

function addMarks(
  input: FactorChartInput,
  frame: ChartFrame,
  add: (id: string, role: ShapeRole, d: string) => void,
): void {
  const upright = (depth: number): [Point, Point] => [
    { x: frame.toX(depth), y: frame.top - 2 },
    { x: frame.toX(depth), y: frame.bottom },
  ]
  const { holdsTo, now, greatestDepth } = input
  if (holdsTo !== null && holdsTo <= greatestDepth) {
    add('holds-to', 'holdsToLine', segmentsPath([upright(holdsTo)]))
  }
  if (now <= greatestDepth) add('now', 'now', segmentsPath([upright(now)]))
}

/** The point of the case itself, where it lies inside the chart. */
function nowDot(input: FactorChartInput, frame: ChartFrame): Point | null {
  const chosen = input.series.find(({ style }) => style === 'chosen')
  const factor = chosen ? factorAt(chosen.points, input.now) : null
  if (factor === null || factor < 0 || factor > frame.cap) return null
  return { x: frame.toX(input.now), y: frame.toY(factor) }
}

function describeChart(input: FactorChartInput): readonly Message[] {
  const chosen = input.series.find(({ style }) => style === 'chosen')
  const factor = chosen ? factorAt(chosen.points, input.now) : null
  const depth = (value: number) => ({ value, kind: 'length' }) as const
  const ratio = (value: number) => ({ value, kind: 'ratio' }) as const
  const say = (name: string, values: Message['values'] = {}): Message => ({
    key: `drawing.chart.describe.${name}`,
    values,
  })
  return [
    say('axes', { depth: depth(input.greatestDepth) }),
    ...(input.required === null ? [] : [say('required', { factor: ratio(input.required) })]),
    factor === null
      ? say('nowNone', { depth: depth(input.now) })
      : say('now', { depth: depth(input.now), factor: ratio(factor) }),
    input.holdsTo === null
      ? say('holdsNowhere')
      : say('holdsTo', { depth: { ...depth(input.holdsTo), rounding: 'down' } }),
  ]
}
