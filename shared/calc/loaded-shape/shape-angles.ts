import type { StandingShape } from './loaded-shape'
import { seatAngle, surfaceAngle } from './skin-length'

/** Slopes of skin and skirt where forces meet [rad]. */
export interface ShapeAngles {
  /** Skin under the weld line, α. */
  readonly seat: number
  /** Wet skin at the weld line, β_A, from the ground. */
  readonly weld: number
  /** Lifted skirt at the weld line, φ. */
  readonly skirt: number
  /** Skin at the water surface, β_h. */
  readonly surface: number
}

/**
 * Angles of a standing shape, in half-angle forms in which nothing cancels:
 *
 *     cos α = 1 − p y/T     cos β_A = −1 + (p y + ½ ρ g w²)/T     cos φ = (1 − y/h)²     w = h − y
 *
 * @param airPressure Gauge pressure p [Pa].
 * @param depth Depth of water h [m], above 0.
 * @param unitWeight ρ g [N/m³].
 */
export function shapeAngles(
  shape: StandingShape,
  airPressure: number,
  depth: number,
  unitWeight: number,
): ShapeAngles {
  const radius = shape.crest / 2
  const y = shape.weldHeight
  const risen = (airPressure * y + (unitWeight * (depth - y) ** 2) / 2) / shape.skinTension
  const v = y / depth
  const rest = v * (2 - v)
  return {
    seat: seatAngle(y, radius),
    weld: Math.PI - 2 * Math.asin(Math.min(1, Math.sqrt(risen / 2))),
    skirt: 2 * Math.asin(Math.min(1, Math.sqrt(rest / 2))),
    surface: surfaceAngle(depth, radius),
  }
}
