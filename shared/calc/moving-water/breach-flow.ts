/** Water through one section that has gone soft. */
export interface BreachFlow {
  /** Steady flow at most, as over a broad crest at ground level [m³/s]. */
  readonly steady: number
  /** First rush, as from a dam that vanishes [m³/s]. */
  readonly firstRush: number
}

/**
 * Flow through an opening of one section's length:
 *
 *     steady ≤ (2/3)^1.5 √g h^1.5 per metre,   first rush (8/27) √g h^1.5 per metre
 *
 * @see Ritter, 1892, for the first rush; critical depth on a broad crest for the steady flow.
 */
export function breachFlow(depth: number, length: number, gravity: number): BreachFlow {
  const unit = length * Math.sqrt(gravity) * depth ** 1.5
  return { steady: (2 / 3) ** 1.5 * unit, firstRush: (8 / 27) * unit }
}
