import type { Message } from '../../texts/format-text'
import { boxAround, type LabelPlacer, type Spot } from '../label-placer'
import type { Point, TextRole } from '../scene'
import type { ChartFrame } from './chart-frame'
import { curvePieces } from './curves'
import type { FactorChartInput, FactorSeries } from './factor-chart-input'

function text(name: string, values?: Message['values']): Message {
  return values ? { key: `drawing.chart.${name}`, values } : { key: `drawing.chart.${name}` }
}

/** Names and figures of the chart, by importance; the axes first, so that nothing covers them. */
export function labelChart(input: FactorChartInput, frame: ChartFrame, placer: LabelPlacer): void {
  labelAxes(frame, placer)
  placer.reserve({ left: 0, right: frame.left, top: 0, bottom: input.view.height })
  const curves = input.series.map((series) => ({
    series,
    pieces: curvePieces(frame, series.points),
  }))
  for (const { pieces } of curves) avoidCurve(placer, pieces)
  const required = input.required
  if (required !== null) {
    const y = frame.toY(required)
    placer.avoid({ left: frame.left, right: frame.right, top: y - 1, bottom: y + 1 })
  }
  labelMarks(input, frame, placer)
  if (required !== null) labelRequired(required, frame, placer)
  for (const { series, pieces } of curves) labelCurve(series, pieces, frame, placer)
  labelLimits(input, frame, placer)
}

function labelAxes(frame: ChartFrame, placer: LabelPlacer): void {
  const size = frame.font - 1
  for (const factor of frame.factorTicks) {
    const message = text('tick', { value: { value: factor, kind: 'ratio' } })
    const spot: Spot = { x: frame.left - 6, y: frame.toY(factor) + size * 0.35, anchor: 'end' }
    placer.place({ id: `factor-${factor}`, role: 'labelQuiet', message, size }, [spot])
  }
  frame.depthTicks.forEach((depth, index) => {
    const isLast = index === frame.depthTicks.length - 1
    // The last figure carries the unit for all.
    const value = { value: depth, kind: 'length', isBare: !isLast } as const
    const x = frame.toX(depth)
    const y = frame.bottom + size + 6
    placer.place(
      { id: `depth-${depth}`, role: 'labelQuiet', message: text('tick', { value }), size },
      [
        { x, y, anchor: 'middle' },
        { x: frame.right, y, anchor: 'end' },
      ],
    )
  })
  const middle = (frame.left + frame.right) / 2
  placer.place({ id: 'depth-axis', role: 'labelQuiet', message: text('depthAxis'), size }, [
    { x: middle, y: frame.bottom + 2 * size + 10, anchor: 'middle' },
  ])
}

function avoidCurve(placer: LabelPlacer, pieces: readonly (readonly Point[])[]): void {
  for (const piece of pieces) {
    for (let index = 0; index + 1 < piece.length; index++) {
      placer.avoid(boxAround(piece[index]!, piece[index + 1]!, 2))
    }
  }
}

function labelMarks(input: FactorChartInput, frame: ChartFrame, placer: LabelPlacer): void {
  const { now, holdsTo, greatestDepth } = input
  const marks: readonly [string, TextRole, number | null][] = [
    ['now', 'labelWater', now],
    ['holdsTo', 'labelHolds', holdsTo],
  ]
  for (const [name, role, depth] of marks) {
    if (depth === null || depth > greatestDepth) continue
    const x = frame.toX(depth)
    placer.avoid({ left: x - 1, right: x + 1, top: frame.top, bottom: frame.bottom })
    const shown = { value: depth, kind: 'length', ...(name === 'now' ? {} : DOWN) } as const
    const spots = [frame.top - 6, frame.top + frame.font + 2, frame.top + 2.4 * frame.font].flatMap(
      (y): Spot[] => [
        { x: x + 6, y, anchor: 'start' },
        { x: x - 6, y, anchor: 'end' },
      ],
    )
    const label = { id: `${name}-value`, role, message: text(name, { depth: shown }) }
    placer.placeSurely({ ...label, size: frame.font - 0.5, weight: 600 }, spots)
  }
}

const DOWN = { rounding: 'down' } as const

function labelRequired(required: number, frame: ChartFrame, placer: LabelPlacer): void {
  const message = text('required', { factor: { value: required, kind: 'ratio' } })
  const y = frame.toY(required)
  const label = { id: 'required-value', role: 'labelFails', message, size: frame.font } as const
  placer.placeSurely(label, [
    { x: frame.left + 8, y: y + frame.font + 3, anchor: 'start' },
    { x: frame.left + 8, y: y - 6, anchor: 'start' },
    { x: frame.right - 4, y: y + frame.font + 3, anchor: 'end' },
    { x: frame.right - 4, y: y - 6, anchor: 'end' },
  ])
}

/** Shares of a curve at which its name may hang, from the end backwards. */
const NAME_AT = [1, 0.85, 0.7, 0.55, 0.4, 0.25] as const

function labelCurve(
  series: FactorSeries,
  pieces: readonly (readonly Point[])[],
  frame: ChartFrame,
  placer: LabelPlacer,
): void {
  const points = pieces.flat()
  if (points.length === 0) return
  const spots = NAME_AT.flatMap((share): Spot[] => {
    const at = points[Math.round((points.length - 1) * share)]!
    return [
      { x: at.x, y: at.y - 8, anchor: 'end' },
      { x: at.x, y: at.y + frame.font + 6, anchor: 'end' },
      { x: at.x + 8, y: at.y - 6, anchor: 'start' },
    ]
  })
  const isChosen = series.style === 'chosen'
  placer.placeSurely(
    {
      id: `name-${series.id}`,
      role: isChosen ? 'label' : 'labelQuiet',
      message: series.label,
      size: frame.font,
      weight: isChosen ? 600 : 400,
    },
    spots,
  )
}

/** Says what the chart does not show: factors above its edge, or that there are none. */
function labelLimits(input: FactorChartInput, frame: ChartFrame, placer: LabelPlacer): void {
  const hasFactor = input.series.some(({ points }) => points.some(({ factor }) => factor !== null))
  const middle = (frame.left + frame.right) / 2
  if (!hasFactor) {
    const label = { id: 'no-factor', role: 'labelFails', message: text('noFactor') } as const
    placer.placeSurely({ ...label, size: frame.font }, [
      { x: middle, y: (frame.top + frame.bottom) / 2, anchor: 'middle' },
    ])
  }
  if (!frame.isCapped) return
  const message = text('capped', { factor: { value: frame.cap, kind: 'ratio' } })
  placer.place({ id: 'capped', role: 'labelQuiet', message, size: frame.font - 1 }, [
    { x: frame.right, y: frame.top - 6, anchor: 'end' },
    { x: frame.left + 8, y: frame.top - 6, anchor: 'start' },
    { x: frame.right, y: frame.top + frame.font + 2, anchor: 'end' },
    { x: frame.left + 8, y: frame.top + frame.font + 2, anchor: 'start' },
  ])
}
