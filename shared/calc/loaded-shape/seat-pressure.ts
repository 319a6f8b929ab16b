import { findRoot } from '../numerics/find-root'
import type { StandingShape } from './loaded-shape'
import type { Membrane } from './membrane'
import { surfaceAngle, wetLengthPlusRun, wetRun } from './skin-length'

/** A standing tube whose skirt leaks over a seat that seals. */
export interface SeatInput {
  readonly shape: StandingShape
  readonly diameter: number
  readonly airPressure: number
  readonly depth: number
  readonly unitWeight: number
}

/** The pressure under the lifted skirt at which the tube loses its seat. */
export interface SeatPressure {
  /** u at which the contact width falls to zero [Pa]. */
  readonly pressure: number
  /** u over ρ g h [–]; 0.41 to 0.50 in worked cases. */
  readonly ratio: number
}

/** A membrane with a uniform pressure u in the void under the lifted skirt, as a share v = u/p. */
interface VentedMembrane extends Membrane {
  readonly voidShare: number
}

/**
 * Void pressure at which the seat is lost. With a pressure u under the lifted skirt
 *
 *     cos φ = (1 − y/h)² + 2 u y/(ρ g h²),   arc under the weld of radius T/(p − u)
 *
 * and everything else as without it. Leaving u out is not safe; where the uplift model gives more
 * than this at the peel point, the tube gives way.
 *
 * @returns null where the contact stays up to ρ g h, or there is no water.
 */
export function seatPressure(input: SeatInput): SeatPressure | null {
  const { shape, diameter, airPressure, depth, unitWeight } = input
  const head = unitWeight * depth
  if (depth === 0) return null
  const membrane: Membrane = {
    depth,
    perimeter: Math.PI * diameter,
    kappa: unitWeight / (2 * airPressure),
  }
  const contact = (pressure: number): number =>
    contactWith({ ...membrane, voidShare: pressure / airPressure }, shape.crest / 2)
  const high = Math.min(head, 0.999 * airPressure)
  const atHigh = contact(high)
  if (!(atHigh < 0)) return null
  const pressure = findRoot(contact, { low: 0, high, atLow: shape.contact, atHigh }, 1e-13)
  return { pressure, ratio: pressure / head }
}

/** Contact width with void pressure; negative once the touch-down points have passed each other. */
function contactWith(membrane: VentedMembrane, unvented: number): number {
  const residual = (radius: number): number => {
    const weld = ventedWeld(membrane, radius)
    const { alpha, lower } = seat(membrane, radius, weld)
    const beta = surfaceAngle(membrane.depth, radius)
    const arcs = lower * (alpha - Math.sin(alpha)) + radius * (beta + Math.sin(beta) + Math.PI)
    return arcs + wetLengthPlusRun(membrane, radius, weld) - membrane.perimeter
  }
  const [low, high] = bracket(residual, unvented, membrane.depth / 2)
  const radius = findRoot(residual, { low, high, atLow: residual(low), atHigh: residual(high) })
  const weld = ventedWeld(membrane, radius)
  const { alpha, lower } = seat(membrane, radius, weld)
  const beta = surfaceAngle(membrane.depth, radius)
  return wetRun(membrane, radius, weld) + radius * Math.sin(beta) - lower * Math.sin(alpha)
}

/** Widens around the unvented radius until the residual changes its sign. */
function bracket(
  residual: (radius: number) => number,
  middle: number,
  least: number,
): readonly [number, number] {
  for (let width = 0.002; width < 0.5; width *= 2) {
    const low = Math.max(least, middle * (1 - width))
    const high = middle * (1 + width)
    if (residual(low) <= 0 && residual(high) >= 0) return [low, high]
  }
  return [least, 1.5 * middle]
}

/** Angle and radius of the arc under the weld line. */
function seat({ voidShare }: VentedMembrane, radius: number, weld: number) {
  const lower = radius / (1 - voidShare)
  return { alpha: 2 * Math.asin(Math.min(1, Math.sqrt(weld / (2 * lower)))), lower }
}

/** Weld height in balance, T sin β − T sin α − T_s sin φ = 0, in the form without cancellation. */
function ventedWeld(membrane: VentedMembrane, radius: number): number {
  const { depth: h, kappa, voidShare: v } = membrane
  const balance = (y: number): number => {
    const w = h - y
    const s = ((1 - v) * y) / radius
    const a = (y + kappa * w ** 2) / radius
    const cosPhi = (w / h) ** 2 + (v * y) / (kappa * h ** 2)
    const sines = Math.sqrt(s * (2 - s)) + Math.sqrt(a * (2 - a))
    const sinPhi = Math.sqrt(Math.max(0, 1 - cosPhi ** 2))
    return ((kappa * w ** 2 + v * y) * (2 - a - s)) / sines - kappa * h ** 2 * sinPhi
  }
  const [low, high] = [1e-9 * h, h * (1 - 1e-12)]
  return findRoot(balance, { low, high, atLow: balance(low), atHigh: balance(high) })
}
