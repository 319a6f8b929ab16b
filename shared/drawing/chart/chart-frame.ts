import { niceAbove, niceShownTicks, niceTicks } from '../nice-ticks'
import type { FactorChartInput } from './factor-chart-input'

/** How depths and factors become pixels. */
export interface ChartFrame {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
  /** Factor at the upper edge; higher ones are not drawn. */
  readonly cap: number
  /** True where a factor is higher than the upper edge. */
  readonly isCapped: boolean
  readonly font: number
  readonly toX: (depth: number) => number
  readonly toY: (factor: number) => number
  readonly depthTicks: readonly number[]
  readonly factorTicks: readonly number[]
}

/** The axis goes to this many times the required factor, unless every factor is lower. */
const CAP_IN_REQUIRED = 2.5
const WITHOUT_REQUIRED = 4

/** px for one step of an axis, at least. */
const DEPTH_STEP = 62
const FACTOR_STEP = 34

/** Fixes axes and ticks; they follow the case, not the depth of the moment. */
export function chartFrame(input: FactorChartInput): ChartFrame {
  const { view, greatestDepth } = input
  const font = view.width >= 520 ? 12.5 : 12
  const left = 12 + 2.4 * font
  const right = view.width - 14
  const top = font + 16
  const bottom = view.height - 2 * font - 19
  const { cap, isCapped } = capOf(input)
  return {
    left,
    right,
    top,
    bottom,
    cap,
    isCapped,
    font,
    toX: (depth) => left + ((right - left) * depth) / greatestDepth,
    toY: (factor) => bottom - ((bottom - top) * factor) / cap,
    depthTicks: niceShownTicks(
      greatestDepth,
      Math.max(1, Math.floor((right - left) / DEPTH_STEP)),
      'length',
      input.units ?? 'metric',
    ),
    factorTicks: niceTicks(cap, Math.max(1, Math.floor((bottom - top) / FACTOR_STEP))),
  }
}

function capOf({ series, required }: FactorChartInput): { cap: number; isCapped: boolean } {
  let highest = 0
  for (const { points } of series) {
    for (const { factor } of points) highest = Math.max(highest, factor ?? 0)
  }
  const most = required === null ? WITHOUT_REQUIRED : CAP_IN_REQUIRED * required
  if (highest > most) return { cap: most, isCapped: true }
  const needed = Math.max(highest, 1.3 * (required ?? 1))
  return { cap: Math.min(most, niceAbove(needed)), isCapped: false }
}
