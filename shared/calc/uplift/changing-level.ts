import { OutOfRangeError, rangeFault } from '../../errors'
import { erfc } from '../numerics/erfc'
import { findRoot } from '../numerics/find-root'
import { gaussLegendre } from '../numerics/gauss-legendre'
import { developingMean, developingMoment, developingShare } from './developing-uplift'

/** Depth of water at a moment. Two readings at one time are a jump. */
export interface DepthReading {
  readonly time: number
  readonly depth: number
}

/** The base and what lies under it. */
export interface GrowingBase {
  /** B [m], above 0. */
  readonly base: number
  /** Diffusivity, c [m²/s], above 0. */
  readonly diffusivity: number
  /** Share of the head that reaches the edge, η [–]. */
  readonly edgeFactor: number
}

/** Head under the base at one moment, per unit weight of water. */
export interface UnderBase {
  /** ∫ head dx over the base [m²]: U/(ρ g). */
  readonly force: number
  /** First moment of it about the dry toe [m³]. */
  readonly moment: number
  /** True where the falling water lets the skirt vent somewhere. */
  readonly isVented: boolean
}

/** Below this τ the half-space solution is exact to 1e-10. */
const EARLY_TAU = 0.01

/** Exponents beyond this leave nothing. */
const NEGLIGIBLE = 41

/** The parts of a history before a moment: jumps, and straight pieces with their slopes. */
interface Parts {
  readonly jumps: readonly { readonly age: number; readonly size: number }[]
  readonly ramps: readonly { readonly from: number; readonly to: number; readonly slope: number }[]
  readonly depth: number
}

/**
 * Water under the skirt while the level changes. One-dimensional diffusion, by Duhamel's integral on
 * straight pieces in closed form: each jump adds Δh S(X, t), each piece of slope s adds
 * s [G(X, t − t₁) − G(X, t − t₂)], with S the response to a step and G its integral over time; for
 * the mean
 *
 *     G(t) = t/2 − Σ_odd 4B²/(n⁴π⁴c) (1 − e^(−n²π²ct/B²))
 *
 * In falling water the pressure is capped at ρ g h(t), point by point: a limp skirt lifts and vents.
 *
 * @param readings By rising time, two or more; dry before the first.
 * @param time Moment looked at, within the readings [s].
 * @throws OutOfRangeError for times that do not rise, or a moment outside the readings.
 */
export function upliftAtTime(
  readings: readonly DepthReading[],
  base: GrowingBase,
  time: number,
): UnderBase {
  assertHistory(readings, time)
  const parts = partsBefore(readings, time)
  const share = (xi: number): number => base.edgeFactor * headAt(parts, base, xi)
  const crossings = crossingsOf(share, parts.depth)
  if (crossings === null) {
    const { base: width, edgeFactor } = base
    return {
      force: edgeFactor * width * sumOf(parts, base, STEP_MEAN, RAMP_MEAN),
      moment: edgeFactor * width ** 2 * sumOf(parts, base, STEP_MOMENT, RAMP_MOMENT),
      isVented: false,
    }
  }
  return cappedIntegral(share, parts.depth, base.base, crossings)
}

function partsBefore(readings: readonly DepthReading[], time: number): Parts {
  const first = readings[0]!
  const jumps = [{ age: time - first.time, size: first.depth }]
  const ramps: Parts['ramps'][number][] = []
  let depth = first.depth
  for (let i = 1; i < readings.length; i += 1) {
    const [a, b] = [readings[i - 1]!, readings[i]!]
    if (b.time === a.time) {
      if (b.time <= time) jumps.push({ age: time - b.time, size: b.depth - a.depth })
    } else if (a.time < time) {
      const slope = (b.depth - a.depth) / (b.time - a.time)
      const end = Math.min(b.time, time)
      ramps.push({ from: time - a.time, to: time - end, slope })
      depth = a.depth + slope * (end - a.time)
      continue
    }
    if (b.time <= time) depth = b.depth
  }
  return { jumps, ramps, depth }
}

type Response = (tau: number) => number

const STEP_MEAN: Response = developingMean
const STEP_MOMENT: Response = developingMoment

/** ∫₀^τ of the mean response, with time in units of B²/c. */
const RAMP_MEAN: Response = (tau) => {
  if (tau < EARLY_TAU) return (4 / 3) * Math.sqrt(tau ** 3 / Math.PI)
  return tau / 2 - decayed(tau, 2, (n) => 4 / (n * Math.PI) ** 4)
}

/** ∫₀^τ of the moment response. */
const RAMP_MOMENT: Response = (tau) => {
  if (tau < EARLY_TAU) return (4 / 3) * Math.sqrt(tau ** 3 / Math.PI) - tau ** 2 / 2
  return tau / 3 - decayed(tau, 1, (n) => 2 / (n * Math.PI) ** 4)
}

/** Terms of an undamped sum that matter to 1e-16: they fall with n⁴. */
const SERIES_TERMS = 2000

/** Σ weight(n) (1 − e^(−n²π²τ)); the undamped sum is known, the damped one is short. */
function decayed(tau: number, step: 1 | 2, weight: (n: number) => number): number {
  // Σ_all 1/n⁴ = π⁴/90, Σ_odd 1/n⁴ = π⁴/96.
  const whole = step === 1 ? (weight(1) * Math.PI ** 4) / 90 : (weight(1) * Math.PI ** 4) / 96
  let damped = 0
  for (let n = 1; n < SERIES_TERMS && n ** 2 * Math.PI ** 2 * tau < NEGLIGIBLE; n += step) {
    damped += weight(n) * Math.exp(-(n ** 2) * Math.PI ** 2 * tau)
  }
  return whole - damped
}

function sumOf(parts: Parts, { base, diffusivity }: GrowingBase, step: Response, ramp: Response) {
  const unit = base ** 2 / diffusivity
  const jumps = parts.jumps.reduce((sum, { age, size }) => sum + size * step(age / unit), 0)
  return parts.ramps.reduce(
    (sum, { from, to, slope }) => sum + slope * unit * (ramp(from / unit) - ramp(to / unit)),
    jumps,
  )
}

/** Head at the fraction ξ from the wet edge for η = 1 [m]. */
function headAt(parts: Parts, { base, diffusivity }: GrowingBase, xi: number): number {
  const unit = base ** 2 / diffusivity
  const jumps = parts.jumps.reduce(
    (sum, { age, size }) => sum + size * (xi === 0 ? 1 : developingShare(age / unit, xi)),
    0,
  )
  return parts.ramps.reduce(
    (sum, { from, to, slope }) =>
      sum + slope * unit * (rampShare(from / unit, xi) - rampShare(to / unit, xi)),
    jumps,
  )
}

/** ∫₀^τ of the step response at ξ: 4τ i²erfc early, else the integrated sine series. */
function rampShare(tau: number, xi: number): number {
  if (tau <= 0) return 0
  if (xi === 0) return tau
  if (tau < EARLY_TAU) {
    const z = xi / (2 * Math.sqrt(tau))
    return tau * ((1 + 2 * z ** 2) * erfc(z) - (2 * z * Math.exp(-(z ** 2))) / Math.sqrt(Math.PI))
  }
  let damped = 0
  for (let n = 1; n ** 2 * Math.PI ** 2 * tau < NEGLIGIBLE; n += 1) {
    const weight = (2 * Math.sin(n * Math.PI * xi)) / (n * Math.PI) ** 3
    damped += weight * Math.exp(-(n ** 2) * Math.PI ** 2 * tau)
  }
  // Σ 2 sin(nπξ)/(nπ)³ = ξ/3 − ξ²/2 + ξ³/6.
  return (1 - xi) * tau - (xi / 3 - xi ** 2 / 2 + xi ** 3 / 6) + damped
}

/** Places along the base that are looked at for a crossing. */
const LOOKS = 96

/** Fractions ξ at which the head passes the depth; null where it stays below it everywhere. */
function crossingsOf(head: (xi: number) => number, depth: number): readonly number[] | null {
  // The edge itself equals the depth for η = 1: a hair above it is no crossing.
  const above = (xi: number): number => head(xi) - depth * (1 + 1e-12)
  const places = Array.from({ length: LOOKS + 1 }, (_, i) => (i / LOOKS) ** 2)
  places[0] = 1e-9
  const values = places.map(above)
  // Above it everywhere, such as when the water has just gone: no crossing, and all of it vents.
  if (!values.some((value) => value > 0)) return null
  return places.slice(1).flatMap((high, i) => {
    const [low, atLow, atHigh] = [places[i]!, values[i]!, values[i + 1]!]
    if (Math.sign(atLow) === Math.sign(atHigh)) return []
    return [findRoot(above, { low, high, atLow, atHigh }, 1e-13)]
  })
}

const PIECE = gaussLegendre(8)
const PIECES = 24

/** Integrals of min(head, depth) over the base, split where the head crosses the depth. */
function cappedIntegral(
  head: (xi: number) => number,
  depth: number,
  base: number,
  crossings: readonly number[],
): UnderBase {
  const bounds = [0, ...crossings, 1]
  let force = 0
  let moment = 0
  for (let i = 1; i < bounds.length; i += 1) {
    const span = (bounds[i]! - bounds[i - 1]!) / PIECES
    for (let piece = 0; piece < PIECES; piece += 1) {
      for (const { at, weight } of PIECE) {
        const xi = bounds[i - 1]! + (piece + at) * span
        const value = Math.min(head(xi), depth) * weight * span
        force += value
        moment += value * (1 - xi)
      }
    }
  }
  return { force: base * force, moment: base ** 2 * moment, isVented: true }
}

function assertHistory(readings: readonly DepthReading[], time: number): void {
  const faults = readings.flatMap(({ time: at, depth }, i) => {
    const before = readings[i - 1]?.time ?? -Infinity
    return [
      ...(at >= before && Number.isFinite(at)
        ? []
        : [rangeFault(`readings[${i}].time`, at, { min: before, max: Infinity, unit: 's' })]),
      ...(depth >= 0 && Number.isFinite(depth)
        ? []
        : [rangeFault(`readings[${i}].depth`, depth, { min: 0, max: Infinity, unit: 'm' })]),
    ]
  })
  const [first, last] = [readings[0], readings.at(-1)]
  if (!first || !last || !(time >= first.time && time <= last.time)) {
    const range = { min: first?.time ?? 0, max: last?.time ?? 0, unit: 's' }
    faults.push(rangeFault('time', time, range))
  }
  if (faults.length > 0) throw new OutOfRangeError(faults)
}
