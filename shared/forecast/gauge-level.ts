import type { LevelReference } from '../schemas/forecast'

/** What carries a reading of a gauge to the line. */
export interface GaugeDatum {
  /** Gauge zero in the datum of the project [m]. */
  readonly zero: number
  /** Level at the line less level at the gauge [m]. */
  readonly correction: number
}

/**
 * What is added to a reading to make it a level at the line [m]: gauge zero + stage + correction.
 *
 * @see WMO-No. 1044, Manual on Stream Gauging, vol. I: stage is the height above gauge datum.
 */
export function addedToReading(
  { zero, correction }: GaugeDatum,
  reference: LevelReference,
): number {
  if (reference === 'siteLevel') return 0
  return reference === 'stage' ? zero + correction : correction
}

/** A level at the line as the gauge shows it: the stage that a crew reads on its board [m]. */
export function stageAtGauge({ zero, correction }: GaugeDatum, siteLevel: number): number {
  return siteLevel - correction - zero
}
