import { assertInRange } from '../../errors'
import { CELSIUS_ZERO, STANDARD_ATMOSPHERE } from '../../constants'

/** Air shut in at one temperature and looked at in another. */
export interface ShutInAir {
  /** Gauge pressure when filled, p₁ [Pa]. */
  readonly airPressure: number
  /** Air temperature when filled, T₁ [°C]. */
  readonly filledAt: number
  /** Air temperature now, T₂ [°C]. */
  readonly now: number
  /** Atmospheric pressure [Pa]. */
  readonly atmosphere?: number
}

/**
 * Gauge pressure of a constant volume of air after a change of temperature:
 *
 *     p₂ = (p₁ + p_atm) T₂/T₁ − p_atm   [Pa], T in kelvin
 *
 * 12 K colder costs about 5 kPa of 15 kPa. The result may be zero or negative: then the tube is limp.
 *
 * @throws OutOfRangeError for temperatures outside −40 to 60 °C.
 * @see Gay-Lussac's law; standard atmosphere ISO 2533.
 */
export function pressureAtTemperature(air: ShutInAir): number {
  const { airPressure, filledAt, now, atmosphere = STANDARD_ATMOSPHERE } = air
  const range = { min: -40, max: 60, unit: '°C' }
  assertInRange('air.filledAt', filledAt, range)
  assertInRange('air.now', now, range)
  const ratio = (now + CELSIUS_ZERO) / (filledAt + CELSIUS_ZERO)
  return (airPressure + atmosphere) * ratio - atmosphere
}
