import { gaussLegendre } from '../numerics/gauss-legendre'
import type { Membrane } from './membrane'

/**
 * Points of the quadrature along the wet skin. The nearest branch point lies at least a tenth of the
 * depth beyond the weld line, so 24 points leave less than 1e-14.
 */
const RULE = gaussLegendre(24)
const AT = RULE.map((point) => point.at)
const WEIGHT = RULE.map((point) => point.weight)

/**
 * The wet skin between weld line and water surface, in the depth u below the surface. With
 * δ = H − h, ε = 2δ/(1 + q), q = √(1 + 4κδ):
 *
 *     r (1 + cos β) = h − u + κ u²
 *     r (1 − cos β) = (u + ε) ((1 + q)/2 − κ u)
 *
 * The factor u + ε vanishes at the surface when the water reaches the crest; s = √(u + ε) takes that
 * singularity away.
 */
interface WetSkin {
  readonly epsilon: number
  /** (1 + q)/2. */
  readonly lead: number
  readonly from: number
  readonly span: number
}

function wetSkin({ depth, kappa }: Membrane, radius: number, weldHeight: number): WetSkin {
  const gap = Math.max(0, 2 * radius - depth)
  const q = Math.sqrt(1 + 4 * kappa * gap)
  const epsilon = (2 * gap) / (1 + q)
  const from = Math.sqrt(epsilon)
  const to = Math.sqrt(depth - weldHeight + epsilon)
  return { epsilon, lead: (1 + q) / 2, from, span: to - from }
}

/** ∫ (1 + cos β)/sin β dy along the wet skin [m]: its length plus its run towards the dry side. */
export function wetLengthPlusRun(membrane: Membrane, radius: number, weldHeight: number): number {
  const { depth, kappa } = membrane
  const { epsilon, lead, from, span } = wetSkin(membrane, radius, weldHeight)
  let sum = 0
  for (let i = 0; i < AT.length; i += 1) {
    const u = (from + span * AT[i]!) ** 2 - epsilon
    sum += WEIGHT[i]! * Math.sqrt((depth - u + kappa * u ** 2) / (lead - kappa * u))
  }
  return 2 * span * sum
}

/** ∫ cot β dy along the wet skin [m]: its run towards the dry side, negative where it overhangs. */
export function wetRun(membrane: Membrane, radius: number, weldHeight: number): number {
  const { depth, kappa } = membrane
  const { epsilon, lead, from, span } = wetSkin(membrane, radius, weldHeight)
  let sum = 0
  for (let i = 0; i < AT.length; i += 1) {
    const u = (from + span * AT[i]!) ** 2 - epsilon
    const risen = depth - u + kappa * u ** 2
    sum += (WEIGHT[i]! * (risen - radius)) / Math.sqrt(risen * (lead - kappa * u))
  }
  return 2 * span * sum
}

/** Angle of the arc that stands above the water, from the surface to the crest [rad]. */
export function surfaceAngle(depth: number, radius: number): number {
  return (
    2 *
    Math.asin(Math.min(1, Math.sqrt(Math.max(0, 2 * radius - depth) / (4 * radius)) * Math.SQRT2))
  )
}

/** Angle of the arc from the seat up to the weld line [rad]. */
export function seatAngle(weldHeight: number, radius: number): number {
  return 2 * Math.asin(Math.min(1, Math.sqrt(weldHeight / (2 * radius))))
}

/**
 * By how much a skin of radius r, with its contact strip between the touch-down points, is longer
 * than the skin that there is [m]. Its root is the shape; it rises with r on the standing branch.
 */
export function lengthResidual(membrane: Membrane, radius: number, weldHeight: number): number {
  const alpha = seatAngle(weldHeight, radius)
  const beta = surfaceAngle(membrane.depth, radius)
  const arcs = alpha - Math.sin(alpha) + beta + Math.sin(beta) + Math.PI
  return radius * arcs + wetLengthPlusRun(membrane, radius, weldHeight) - membrane.perimeter
}

/** Width on which the tube stands, between its touch-down points [m]. */
export function contactWidthOf(membrane: Membrane, radius: number, weldHeight: number): number {
  const alpha = seatAngle(weldHeight, radius)
  const beta = surfaceAngle(membrane.depth, radius)
  return wetRun(membrane, radius, weldHeight) + radius * (Math.sin(beta) - Math.sin(alpha))
}
