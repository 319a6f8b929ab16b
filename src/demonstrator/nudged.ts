import type { Guess } from '@shared/demonstrator/course'

/** A guess moved by so many steps inside its range; none yet: the middle, so that nothing is suggested. */
export function nudged({ min, max, step }: Guess, guess: number | null, steps: number): number {
  const middle = min + Math.round((max - min) / 2 / step) * step
  const moved = guess === null ? middle : guess + steps * step
  return Math.min(max, Math.max(min, moved))
}
