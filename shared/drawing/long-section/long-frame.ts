import { groundLevelAt } from '../../calc/line/line-sections'
import { niceAbove } from '../nice-ticks'
import type { LongSectionInput } from './long-section-input'

/** Axes of a long section: chainage to the right, level upwards, heights exaggerated. */
export interface LongFrame {
  readonly left: number
  readonly right: number
  readonly top: number
  readonly bottom: number
  /** Chainages at both ends [m]. */
  readonly from: number
  readonly to: number
  /** How many times heights are drawn larger than lengths. */
  readonly exaggeration: number
  readonly font: number
  readonly toX: (chainage: number) => number
  readonly toY: (level: number) => number
  readonly chainageTicks: readonly number[]
  readonly levelTicks: readonly number[]
}

/** Exaggerations that are read at a glance; the largest that fits is taken. */
const STEPS = [1, 1.2, 1.5, 2, 2.5, 3, 4, 5, 6, 7, 8, 9] as const

/** px for one step of an axis, at least. */
const CHAINAGE_STEP = 64
const LEVEL_STEP = 26

/** Room over the highest and under the lowest figure [m]. */
const AIR = 0.12
const SOIL = 0.25

/** Room under the axis for chainages, the strip of verdicts and surfaces, in lines of text. */
const FOOT_LINES = 4.2

/** Fixes scale and ticks of a long section. */
export function longFrame(input: LongSectionInput): LongFrame {
  const { view, stations, sectionLength } = input
  const font = view.width >= 620 ? 12.5 : 11.5
  const left = 14 + 3.2 * font
  const right = view.width - 16
  const top = 2.2 * font + 10
  const bottom = view.height - FOOT_LINES * font - 10
  const from = stations[0]!.chainage
  const last = stations[stations.length - 1]!.chainage
  const to = last > from ? last : from + sectionLength
  const { low, high } = levelsOf(input)
  const perLength = (right - left) / (to - from)
  const exaggeration = roundDown((bottom - top) / (high - low) / perLength)
  const perHeight = perLength * exaggeration
  return {
    left,
    right,
    top,
    bottom,
    from,
    to,
    exaggeration,
    font,
    toX: (chainage) => left + (chainage - from) * perLength,
    toY: (level) => bottom - (level - low) * perHeight,
    chainageTicks: ticksBetween(from, to, Math.floor((right - left) / CHAINAGE_STEP)),
    levelTicks: ticksBetween(
      low,
      low + (bottom - top) / perHeight,
      Math.floor((bottom - top) / LEVEL_STEP),
    ),
  }
}

/** Levels that the drawing must show. */
function levelsOf(input: LongSectionInput): { low: number; high: number } {
  const { stations, waterLevel, runs, weakest, band } = input
  const grounds = stations.map(({ groundLevel }) => groundLevel)
  const crests = runs.flatMap(({ from, to, diameter }) => {
    const within = stations.filter(({ chainage }) => chainage >= from && chainage <= to)
    const ends = [groundLevelAt(stations, from), groundLevelAt(stations, to)]
    return [...within.map(({ groundLevel }) => groundLevel), ...ends].map((g) => g + diameter)
  })
  const marks = [
    waterLevel,
    weakest?.holdsToLevel ?? null,
    band?.low ?? null,
    band?.high ?? null,
  ].filter((level) => level !== null)
  const all = [...grounds, ...crests, ...marks]
  return {
    low: Math.min(...all) - SOIL,
    high: Math.max(...all) + AIR,
  }
}

/** The largest step that is not above the value; below 1 the drawing is flattened honestly. */
function roundDown(value: number): number {
  const power = 10 ** Math.floor(Math.log10(value))
  const lead = value / power
  const step = STEPS.filter((candidate) => candidate <= lead + 1e-9).at(-1) ?? 1
  return Number((step * power).toPrecision(3))
}

/** Multiples of a nice step between two values, at most `most` steps. */
function ticksBetween(from: number, to: number, most: number): readonly number[] {
  const step = niceAbove((to - from) / Math.max(1, most))
  const first = Math.ceil(from / step - 1e-9)
  const last = Math.floor(to / step + 1e-9)
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, i) =>
    Number(((first + i) * step).toPrecision(12)),
  )
}
