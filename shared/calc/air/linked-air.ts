import { STANDARD_ATMOSPHERE } from '../../constants'
import { assertInRange } from '../../errors'

const POSITIVE = { min: 0, minExcluded: true, max: Infinity }

/** A pressure drop that was measured on a shut tube. */
export interface MeasuredDrop {
  /** Volume of air that is shut in [m³]. */
  readonly volume: number
  /** Gauge pressure at the start and at the end [Pa]. */
  readonly from: number
  readonly to: number
  /** Time between the readings [s]. */
  readonly duration: number
  readonly atmosphere?: number
}

/**
 * Leak coefficient C of Q = C √p, Q in free air, from a pressure drop at constant temperature. With
 * V dp/dt = −p_atm C √p:
 *
 *     C = 2 V (√p₁ − √p₂) / (p_atm t)   [m³/(s √Pa)]
 *
 * @throws OutOfRangeError for a pressure that rises, or a time or volume that is not there.
 */
export function leakCoefficient(drop: MeasuredDrop): number {
  const { volume, from, to, duration, atmosphere = STANDARD_ATMOSPHERE } = drop
  assertInRange('leak.volume', volume, { ...POSITIVE, unit: 'm³' })
  assertInRange('leak.duration', duration, { ...POSITIVE, unit: 's' })
  assertInRange('leak.from', from, { ...POSITIVE, unit: 'Pa' })
  assertInRange('leak.to', to, { min: 0, max: from, unit: 'Pa' })
  return (2 * volume * (Math.sqrt(from) - Math.sqrt(to))) / (atmosphere * duration)
}

/** Sections joined into one volume, with one leak. */
export interface LinkedAir {
  readonly volume: number
  /** Leak coefficient, C [m³/(s √Pa)]. */
  readonly leak: number
  readonly atmosphere?: number
}

/** How fast √p falls [√Pa/s]. */
function rootFall({ volume, leak, atmosphere = STANDARD_ATMOSPHERE }: LinkedAir): number {
  return (atmosphere * leak) / (2 * volume)
}

/** Gauge pressure after a time of leaking, √p = √p₀ − p_atm C t/2V; 0 once it is gone [Pa]. */
export function leakedPressure(air: LinkedAir, from: number, time: number): number {
  return Math.max(0, Math.sqrt(from) - rootFall(air) * time) ** 2
}

/** Time until the pressure has fallen to `to` [s]; Infinity without a leak. */
export function timeToPressure(air: LinkedAir, from: number, to: number): number {
  if (to >= from) return 0
  return air.leak === 0 ? Infinity : (Math.sqrt(from) - Math.sqrt(to)) / rootFall(air)
}

/** A compressor that tops up between two pressures. */
export interface Compressor {
  /** Free air that it delivers [m³/s]. */
  readonly flow: number
  /** Pressures at which it starts and stops [Pa]. */
  readonly startPressure: number
  readonly stopPressure: number
}

export interface CompressorDuty {
  /** Share of the time that it runs, 0 to 1; null where it never reaches its stop. */
  readonly share: number | null
  readonly onTime: number | null
  readonly offTime: number
  /** Least flow that holds the stop pressure against the leak, C √p [m³/s]. */
  readonly leastFlow: number
}

/**
 * Duty of a compressor on a leaking volume, at constant temperature. While it runs,
 * V dp/dt = p_atm (Q − C √p); with s = √p the time from start to stop is
 *
 *     (2V/p_atm) [ (Q/C²) ln((Q − C s₁)/(Q − C s₂)) − (s₂ − s₁)/C ]
 */
export function compressorDuty(air: LinkedAir, compressor: Compressor): CompressorDuty {
  const { flow, startPressure, stopPressure } = compressor
  const range = { min: 0, max: stopPressure, maxExcluded: true, unit: 'Pa' }
  assertInRange('compressor.startPressure', startPressure, range)
  const { volume, leak, atmosphere = STANDARD_ATMOSPHERE } = air
  const [low, high] = [Math.sqrt(startPressure), Math.sqrt(stopPressure)]
  const leastFlow = leak * high
  const offTime = timeToPressure(air, stopPressure, startPressure)
  if (flow <= leastFlow) return { share: null, onTime: null, offTime, leastFlow }
  const unit = (2 * volume) / atmosphere
  const onTime =
    leak === 0
      ? (unit * (high ** 2 - low ** 2)) / (2 * flow)
      : unit *
        ((flow / leak ** 2) * Math.log((flow - leak * low) / (flow - leak * high)) -
          (high - low) / leak)
  const share = offTime === Infinity ? 0 : onTime / (onTime + offTime)
  return { share, onTime, offTime, leastFlow }
}
