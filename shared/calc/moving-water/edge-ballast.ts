/** A current along the line that tries to lift the wet edge of the skirt. */
export interface EdgeCurrent {
  /** Speed along the line, V [m/s]. */
  readonly speed: number
  /** Density of the water, ρ, and of the ballast, ρ_b [kg/m³]. */
  readonly density: number
  readonly ballastDensity: number
  readonly gravity: number
}

/** Height of edge that the current lifts on [m], and its lift coefficient [–]. Common practice. */
const EDGE_HEIGHT = 0.3
const LIFT_COEFFICIENT = 1

/**
 * Ballast that keeps the wet edge down in a current along the line:
 *
 *     m = ½ ρ V² a c_L / [g (1 − ρ/ρ_b)]   [kg/m],   a 0.3 m, c_L 1
 *
 * A demand, not a gate.
 *
 * @remarks Common practice, no source. Ballast must be heavier than water.
 */
export function edgeBallast({ speed, density, ballastDensity, gravity }: EdgeCurrent): number {
  const lift = 0.5 * density * speed ** 2 * EDGE_HEIGHT * LIFT_COEFFICIENT
  return lift / (gravity * (1 - density / ballastDensity))
}
