import { atmosphereAt, vapourPressure, waterDensity } from '../water/water-properties'

/** The suction side of a pump. */
export interface Suction {
  /** Height of the place above the sea [m]. */
  readonly altitude: number
  /** Temperature of the water [°C]. */
  readonly temperature: number
  /** Pump above the water [m]; negative where it stands below. */
  readonly suctionLift: number
  /** Head lost in the suction hose [m]. */
  readonly suctionLoss: number
  readonly gravity: number
}

/**
 * Net positive suction head available:
 *
 *     NPSHa = (p_atm − p_v)/(ρ g) − lift − loss   [m]
 *
 * @see Hydraulic Institute, NPSH margin (from memory); vapour pressure IF97, density CIPM.
 */
export function suctionHeadAvailable(suction: Suction): number {
  const { altitude, temperature, suctionLift, suctionLoss, gravity } = suction
  const free = atmosphereAt(altitude) - vapourPressure(temperature)
  return free / (waterDensity(temperature) * gravity) - suctionLift - suctionLoss
}

/** Suction head that is left over what the pump needs [m]; below 0 the pump cavitates. */
export function suctionHeadMargin(suction: Suction, required: number): number {
  return suctionHeadAvailable(suction) - required
}
