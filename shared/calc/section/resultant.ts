/** Where the resultant meets the ground: information, not a check. */
export interface Resultant {
  /** Distance from the dry toe [m]; null where nothing presses on the ground. */
  readonly x: number | null
  /** Share of the base in compression, 0 to 1; null likewise. */
  readonly share: number | null
}

/**
 * Resultant on a rigid base, x = (moment about the dry toe) / (W − U), and the share of the base in
 * compression, max(0, min(1, 3 min(x, B − x)/B)).
 */
export function resultant(moment: number, net: number, base: number): Resultant {
  if (net <= 0 || base === 0) return { x: null, share: null }
  const x = moment / net
  if (!Number.isFinite(x)) return { x: null, share: null }
  const share = Math.max(0, Math.min(1, (3 * Math.min(x, base - x)) / base))
  return { x, share }
}
