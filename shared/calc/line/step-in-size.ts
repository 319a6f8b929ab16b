import { assertInRange } from '../../errors'
import { stepArea } from './bend'

/** A joint between two sizes. */
export interface SizeStep {
  /** Places of both sizes in the list of sizes offered, smallest first. */
  readonly places: readonly [number, number]
  /** Diameters [m] and loaded crests above the datum [m], in the same order. */
  readonly diameters: readonly [number, number]
  readonly crestLevels: readonly [number, number]
}

export interface SizeStepAnswer {
  /** More than one size at one joint cannot be closed. */
  readonly isAllowed: boolean
  /** Crest that both neighbours count within one closure of the joint [m]. */
  readonly crestLevel: number
  /** End of the larger tube that is left to close [m²]. */
  readonly area: number
}

/**
 * A step in size at a joint: at most one size, the lower crest counts for both within one closure,
 * and the ring π (D₁² − D₂²)/4 is to be closed.
 *
 * @throws OutOfRangeError for a diameter that is not above 0.
 */
export function sizeStep({ places, diameters, crestLevels }: SizeStep): SizeStepAnswer {
  const positive = { min: 0, minExcluded: true, max: Infinity, unit: 'm' }
  diameters.forEach((diameter, i) => {
    assertInRange(`diameters[${i}]`, diameter, positive)
  })
  return {
    isAllowed: Math.abs(places[0] - places[1]) <= 1,
    crestLevel: Math.min(...crestLevels),
    area: stepArea(Math.max(...diameters), Math.min(...diameters)),
  }
}
