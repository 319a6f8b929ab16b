import { STANDARD_ATMOSPHERE } from '../../constants'
import { assertInRange } from '../../errors'
import { breachFlow } from '../moving-water/breach-flow'

/** A section of the line, as far as a puncture cares. */
export interface AirSection {
  /** Depth of water in front of it [m]. */
  readonly depth: number
  readonly length: number
}

/** What one puncture does. */
export interface PunctureAnswer {
  /** Which sections still stand, in the order given. */
  readonly standing: readonly boolean[]
  /** Water through those that do not: steady at most, and the first rush [m³/s]. */
  readonly steady: number
  readonly firstRush: number
}

/**
 * Puncture of one section: isolated, it alone goes soft; linked without a valve, the air of all of
 * them goes, and none stands.
 *
 * @param punctured Index of the section.
 * @param airways Whether the sections share their air.
 */
export function puncture(
  sections: readonly AirSection[],
  punctured: number,
  airways: 'linked' | 'isolated',
  gravity: number,
): PunctureAnswer {
  const range = { min: 0, max: sections.length - 1, unit: '–' }
  assertInRange('puncture.section', punctured, range)
  const standing = sections.map((_, i) => airways === 'isolated' && i !== punctured)
  const flows = sections
    .filter((_, i) => !standing[i])
    .map(({ depth, length }) => breachFlow(depth, length, gravity))
  return {
    standing,
    steady: flows.reduce((sum, { steady }) => sum + steady, 0),
    firstRush: flows.reduce((sum, { firstRush }) => sum + firstRush, 0),
  }
}

/** Discharge coefficient of a sharp hole, and the density of free air [kg/m³]. */
const HOLE_COEFFICIENT = 0.61
const FREE_AIR = 1.225

/**
 * Leak coefficient C of Q = C √p of a hole, Q in free air: air of low pressure through an orifice,
 *
 *     C = 0.61 A √(2 (1 + p/p_atm)/ρ_a)   [m³/(s √Pa)]
 *
 * @param area Area of the hole [m²].
 * @param airPressure Gauge pressure at the start [Pa]; its air is that much denser.
 * @see White, Fluid Mechanics, ch. 6, orifices; ρ_a of ISO 2533 at sea level, 15 °C.
 */
export function holeLeak(
  area: number,
  airPressure: number,
  atmosphere = STANDARD_ATMOSPHERE,
): number {
  return HOLE_COEFFICIENT * area * Math.sqrt((2 * (1 + airPressure / atmosphere)) / FREE_AIR)
}
