import type { View } from '../scene'

/** How h/D and crest/D become pixels. */
export interface DesignFrame {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
  /** Width that the names of the curves need beside the chart [px]. */
  readonly names: number
  /** Lowest crest/D of the axis. */
  readonly lowest: number
  readonly font: number
  readonly toX: (depth: number) => number
  readonly toY: (crest: number) => number
  readonly depthTicks: readonly number[]
  readonly crestTicks: readonly number[]
}

/** Lowest crest/D unless the marked case lies below it. */
const LOWEST = 0.8
const STEP = 0.05

/** Fixes the axes: h/D from 0 to 1, crest/D from `lowest` to 1. */
export function designFrame(view: View, presentCrest: number | null): DesignFrame {
  const font = view.width >= 520 ? 12.5 : 12
  const names = 3.4 * font
  const left = 12 + 2.8 * font
  const right = view.width - 8 - names
  const top = 2.6 * font
  const bottom = view.height - 2 * font - 19
  const below = Math.floor(((presentCrest ?? 1) - 0.02) / STEP) * STEP
  const lowest = Number(Math.max(0, Math.min(LOWEST, below)).toFixed(2))
  const steps = Math.round((1 - lowest) / STEP)
  const depths = right - left > 400 ? 10 : 5
  return {
    left,
    right,
    top,
    bottom,
    names,
    lowest,
    font,
    toX: (depth) => left + (right - left) * depth,
    toY: (crest) => bottom - ((bottom - top) * (crest - lowest)) / (1 - lowest),
    depthTicks: Array.from({ length: depths + 1 }, (_, i) => i / depths),
    crestTicks: Array.from({ length: steps + 1 }, (_, i) => Number((lowest + i * STEP).toFixed(2))),
  }
}
