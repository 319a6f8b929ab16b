import type { Dot, GuessScale } from '../schemas/class'

/** The part of a scale that says where its figures lie. */
export type ScaleSteps = Pick<GuessScale, 'min' | 'max' | 'step'>

/** Digits that binary arithmetic leaves alone. */
const EXACT_DIGITS = 12

/** How far beyond an end binary arithmetic may carry a figure, as a share of the scale. */
const NOISE = 1e-9

/** True where a figure lies on the scale; noise of binary arithmetic at its ends is forgiven. */
export function isOnScale(value: number, { min, max }: ScaleSteps): boolean {
  const slack = NOISE * (max - min)
  return value >= min - slack && value <= max + slack
}

/** The nearest step of the scale, so that equal guesses are equal figures. */
export function onStep(value: number, { min, max, step }: ScaleSteps): number {
  const stepped = min + Math.round((value - min) / step) * step
  return Math.min(max, Math.max(min, Number(stepped.toPrecision(EXACT_DIGITS))))
}

/** Guesses in all. */
export function countGuesses(dots: readonly Dot[]): number {
  return dots.reduce((sum, { count }) => sum + count, 0)
}

/**
 * The room's guess: the median, the lower of both in the middle of an even number, so that it is a
 * figure that somebody named. One joker does not move it. Null without a guess.
 */
export function middleGuess(dots: readonly Dot[]): number | null {
  const sorted = [...dots].sort((a, b) => a.value - b.value)
  const half = countGuesses(sorted) / 2
  let before = 0
  for (const { value, count } of sorted) {
    before += count
    if (before >= half) return value
  }
  return null
}

/** Dots of a plot that stand in one column. */
export interface Column {
  /** From 0, at the left end of the scale. */
  readonly index: number
  readonly count: number
}

/** Stacks guesses in so many columns of equal width; a column stands in the middle of its share. */
export function columnsOf(
  dots: readonly Dot[],
  { min, max }: ScaleSteps,
  columns: number,
): readonly Column[] {
  const counts = new Map<number, number>()
  for (const { value, count } of dots) {
    const place = Math.floor(((value - min) / (max - min)) * columns)
    const index = Math.min(columns - 1, Math.max(0, place))
    counts.set(index, (counts.get(index) ?? 0) + count)
  }
  return [...counts].sort(([a], [b]) => a - b).map(([index, count]) => ({ index, count }))
}
