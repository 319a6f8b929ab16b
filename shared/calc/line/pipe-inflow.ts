/** A pipe that leads from the wet to the dry side. */
export interface PipeInflow {
  /** Inner diameter [m]. */
  readonly diameter: number
  /** Head over the outlet, or over the water on the dry side where that is higher [m]. */
  readonly head: number
  readonly gravity: number
}

/** Discharge coefficient of a sharp-edged orifice [–]. Handbook value, from memory. */
const ORIFICE_COEFFICIENT = 0.6

/**
 * Flow through an open pipe, taken as an orifice: Q = C_d A √(2 g h), C_d = 0.6   [m³/s].
 *
 * Friction in the pipe is left out, and a pipe that is not full gives less: an upper bound.
 */
export function pipeInflow({ diameter, head, gravity }: PipeInflow): number {
  if (head <= 0) return 0
  const area = (Math.PI * diameter ** 2) / 4
  return ORIFICE_COEFFICIENT * area * Math.sqrt(2 * gravity * head)
}
