import type { HorizontalLoad } from '../hydrostatics/still-water-thrust'

/** A current that runs against the line. */
export interface Current {
  /** Speed normal to the line, V [m/s], 0 to 3.048 m/s (10 ft/s). */
  readonly speed: number
  /** Drag coefficient, C_d [–]. */
  readonly dragCoefficient: number
  readonly depth: number
  readonly unitWeight: number
  readonly gravity: number
}

/**
 * Water depth that stands for the dynamic effect of a current below 10 ft/s:
 *
 *     d_h = C_d V² / 2g   [m]
 *
 * @see ASCE 7, 5.4.3, there written a V²/2g.
 */
export function dynamicDepth(speed: number, dragCoefficient: number, gravity: number): number {
  return (dragCoefficient * speed ** 2) / (2 * gravity)
}

/**
 * Thrust of a current normal to the line: the uniform pressure ρ g d_h over the depth, at h/2.
 *
 * @remarks A current along the line gives no thrust.
 * @see FEMA P-259, Engineering Principles and Practices, "Hydrodynamic forces".
 */
export function currentThrust(current: Current): HorizontalLoad {
  const { depth, unitWeight } = current
  const added = dynamicDepth(current.speed, current.dragCoefficient, current.gravity)
  const force = unitWeight * added * depth
  return { force, moment: (force * depth) / 2 }
}

/** Upper bound of length over depth, and the drag coefficient up to it. FEMA P-259, from memory. */
const DRAG_BY_LENGTH_OVER_DEPTH = [
  [12, 1.25],
  [20, 1.3],
  [32, 1.4],
  [40, 1.5],
  [80, 1.75],
  [120, 1.8],
] as const

/**
 * Drag coefficient of a barrier by its length over the depth of water. A line is long: 2.0 is the
 * default of the program.
 *
 * @see FEMA P-259, drag coefficients by width-to-depth ratio (from memory).
 */
export function dragCoefficientOf(lengthOverDepth: number): number {
  const row = DRAG_BY_LENGTH_OVER_DEPTH.find(([bound]) => lengthOverDepth <= bound)
  return row ? row[1] : 2
}
