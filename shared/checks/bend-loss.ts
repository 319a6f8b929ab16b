import { bend } from '../calc/line/bend'
import type { LineSection } from '../calc/line/line-sections'
import { LARGEST_CLOSURE_TURN } from '../catalogue/joints'

/** Share of friction resistance and skirt grip that is left, by skirt length [m]. */
export type GripShareFor = (skirtLength: number) => number

/** Turns at both ends of a section [rad], and the length of its tube [m]. */
export interface Bends {
  readonly turnAtStart: number
  readonly turnAtEnd: number
  readonly sectionLength: number
}

/** The share that is left beside given bends; without any, all of it. */
export function gripShareBeside(bends: Bends | null): GripShareFor {
  if (bends === null) return () => 1
  return (skirtLength) => gripShareOf(bends, skirtLength, bends.sectionLength)
}

/**
 * Share of friction resistance and skirt grip that is left in a section after what is missing at the
 * bends at both of its ends, 0 to 1.
 *
 * @param skirtLength Skirt of the size that is laid [m].
 * @param sectionLength Length of a tube [m].
 * @see bend, for the missing sector ½ L² θ and its share.
 */
export function gripShareOf(
  { turnAtStart, turnAtEnd }: Pick<LineSection, 'turnAtStart' | 'turnAtEnd'>,
  skirtLength: number,
  sectionLength: number,
): number {
  if (turnAtStart === 0 && turnAtEnd === 0) return 1
  const lost = [turnAtStart, turnAtEnd].map(
    (angle) =>
      bend({
        angle,
        diameter: 0,
        skirtLength,
        sectionLength,
        largestTurn: LARGEST_CLOSURE_TURN,
      }).lostShare,
  )
  return Math.max(0, 1 - lost[0]! - lost[1]!)
}
