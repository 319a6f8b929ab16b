import { CELSIUS_ZERO, STANDARD_ATMOSPHERE } from '../../constants'
import { assertInRange } from '../../errors'
import { valueWithin, type KnownReading } from '../series/time-series'

/** Air of one section, or of several joined into one volume, through a night. */
export interface AirThroughTime {
  /** Gauge pressure when filled [Pa]. */
  readonly airPressure: number
  /** Air temperature when filled [°C]. */
  readonly filledAt: number
  /** Air temperature by time [°C]; before the first reading and after the last one, that one. */
  readonly temperature: readonly KnownReading[]
  /** A leak; left out: tight. */
  readonly leak?: AirLeak
  readonly atmosphere?: number
}

/** A leak, and what tops it up. */
export interface AirLeak {
  /** Volume of air that is joined [m³], above 0. */
  readonly volume: number
  /** Coefficient C of Q = C √p, Q in free air [m³/(s √Pa)], 0 or more. */
  readonly coefficient: number
  /** Compressor that starts at a pressure; left out: nobody tops up. */
  readonly compressor?: { readonly flow: number; readonly startPressure: number }
}

/** A leak is marched in steps of this length at most [s], and of this fall of √p [√Pa]. */
const LEAK_STEP = 60
const LEAK_FALL = 1

/** Steps of one march at most: a tube that bursts is empty long before. */
const MOST_STEPS = 20_000

/**
 * Gauge pressure through a night, carried forward step by step. The mass of air, as its pressure at
 * the filling temperature, falls with the leak and is topped up by a compressor; temperature acts on
 * what is there:
 *
 *     p + p_atm = a T/T₀,   V da/dt = −p_atm (C √p − Q)
 *
 * Without a leak it is Gay-Lussac's law at every moment.
 *
 * @throws OutOfRangeError for a volume that is not above 0, a negative leak, or no temperature.
 */
export class AirRun {
  /** Absolute pressure at the filling temperature [Pa]. */
  private amount: number
  private readonly atmosphere: number

  constructor(private readonly air: AirThroughTime) {
    const { airPressure, filledAt, temperature, leak } = air
    assertInRange('air.temperature.length', temperature.length, {
      min: 1,
      max: Infinity,
      unit: 'readings',
    })
    assertInRange('air.filledAt', filledAt, { min: -40, max: 60, unit: '°C' })
    if (leak) assertLeak(leak)
    this.atmosphere = air.atmosphere ?? STANDARD_ATMOSPHERE
    this.amount = airPressure + this.atmosphere
  }

  /** Gauge pressure of the air that is there, at a moment [Pa]; 0 where the tube is limp. */
  pressureAt(time: number): number {
    return Math.max(0, this.amount * this.ratioAt(time) - this.atmosphere)
  }

  /** Carries the leak from one moment to another [s]. */
  advance(from: number, to: number): void {
    const { leak } = this.air
    if (!leak || leak.coefficient === 0) return
    const fall = (this.atmosphere * leak.coefficient * (to - from)) / (2 * leak.volume)
    const wanted = Math.ceil(Math.max((to - from) / LEAK_STEP, fall / LEAK_FALL))
    const steps = Math.max(1, Math.min(MOST_STEPS, wanted))
    const step = (to - from) / steps
    for (let i = 0; i < steps; i += 1) this.lose(leak, from + i * step, step)
  }

  /** Goes back to where another run of the same air stands. */
  take(other: AirRun): void {
    this.amount = other.amount
  }

  /** A copy that can be carried forward on its own. */
  copy(): AirRun {
    const copy = new AirRun(this.air)
    copy.amount = this.amount
    return copy
  }

  /** T/T₀ at a moment. */
  private ratioAt(time: number): number {
    const { filledAt, temperature } = this.air
    return (valueWithin(temperature, time) + CELSIUS_ZERO) / (filledAt + CELSIUS_ZERO)
  }

  /** Leaks at the temperature in the middle of the step: √p falls in a straight line. */
  private lose(leak: AirLeak, time: number, step: number): void {
    const pressure = this.pressureAt(time + step / 2)
    if (pressure > 0) {
      const ratio = (pressure + this.atmosphere) / this.amount
      const fall = (ratio * this.atmosphere * leak.coefficient * step) / (2 * leak.volume)
      const left = Math.max(0, Math.sqrt(pressure) - fall) ** 2
      this.amount = (left + this.atmosphere) / ratio
    }
    this.topUp(leak, time + step, step)
  }

  /** Brings the pressure back to the start of the compressor, as far as its flow goes. */
  private topUp({ compressor, volume }: AirLeak, time: number, step: number): void {
    if (!compressor) return
    if (this.pressureAt(time) >= compressor.startPressure) return
    const wanted = (compressor.startPressure + this.atmosphere) / this.ratioAt(time) - this.amount
    this.amount += Math.min(wanted, (this.atmosphere * compressor.flow * step) / volume)
  }
}

function assertLeak({ volume, coefficient, compressor }: AirLeak): void {
  const some = { min: 0, max: Infinity }
  assertInRange('air.leak.volume', volume, { ...some, minExcluded: true, unit: 'm³' })
  assertInRange('air.leak.coefficient', coefficient, { ...some, unit: 'm³/(s √Pa)' })
  if (!compressor) return
  assertInRange('air.leak.compressor.flow', compressor.flow, { ...some, unit: 'm³/s' })
  assertInRange('air.leak.compressor.startPressure', compressor.startPressure, {
    ...some,
    unit: 'Pa',
  })
}
