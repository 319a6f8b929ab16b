import { STANDARD_ATMOSPHERE } from '../../constants'

/** One section to be filled. */
export interface FillingInput {
  readonly diameter: number
  readonly sectionLength: number
  /** Gauge pressure at the end [Pa]. */
  readonly airPressure: number
  /** Free air that the blower delivers [m³/s]. */
  readonly blowerFlow: number
  readonly atmosphere?: number
}

export interface Filling {
  /** Volume of the tube [m³]. */
  readonly volume: number
  /** Free air that goes into it [m³]. */
  readonly freeAir: number
  /** Time [s]. */
  readonly time: number
}

/** Time to fill a section: volume (1 + p/p_atm) / blower flow. */
export function filling(input: FillingInput): Filling {
  const { diameter, sectionLength, airPressure, blowerFlow } = input
  const atmosphere = input.atmosphere ?? STANDARD_ATMOSPHERE
  const volume = (Math.PI * diameter ** 2 * sectionLength) / 4
  const freeAir = volume * (1 + airPressure / atmosphere)
  return { volume, freeAir, time: freeAir / blowerFlow }
}
