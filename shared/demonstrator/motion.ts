import type { Leg } from './course'
import type { DemoValues } from './setting'

/** A share of the way for a share of the time: at rest at both ends, no jerk in between. */
export function eased(share: number): number {
  const t = Math.min(1, Math.max(0, share))
  return t * t * (3 - 2 * t)
}

/** How long the script of a scene takes [s]. */
export function scriptDuration(legs: readonly Leg[]): number {
  return legs.reduce((sum, { seconds }) => sum + seconds, 0)
}

/**
 * The figures after so many seconds of the script.
 *
 * @param answer Where a leg that goes to the answer ends; null: there is none, and the figure stays.
 */
export function valuesAt(
  from: DemoValues,
  legs: readonly Leg[],
  answer: number | null,
  seconds: number,
): DemoValues {
  const values: Record<keyof DemoValues, number> = { ...from }
  let left = seconds
  for (const leg of legs) {
    if (left <= 0) break
    const end = leg.to === 'answer' ? answer : leg.to
    const begin = values[leg.value]
    if (end !== null) {
      const share = leg.seconds > 0 ? eased(left / leg.seconds) : 1
      values[leg.value] = share === 1 ? end : begin + (end - begin) * share
    }
    left -= leg.seconds
  }
  return values
}
