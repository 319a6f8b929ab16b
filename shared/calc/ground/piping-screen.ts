/** Figures to screen piping by. They are never a gate. */
export interface PipingScreen {
  /** Exit gradient averaged over a depth of B/4 [–]. */
  readonly exitGradient: number
  /** Line of creep over head after Bligh, B/h; null without head. */
  readonly bligh: number | null
  /** Weighted creep after Lane, B/3h; null without head. */
  readonly lane: number | null
}

/**
 * (4/π) Re arccos(1 + i/2) = 0.859 295 17: exit gradient averaged over B/4 by the conformal map, in
 * h/B. The real part of arccos z is arccos((|z + 1| − |z − 1|)/2).
 */
const AVERAGE_EXIT = (4 / Math.PI) * Math.acos((Math.sqrt(4.25) - 0.5) / 2)

/**
 * Screening figures for piping under a flat base:
 *
 *     i = (4/π) Re arccos(1 + i/2) h/B = 0.859 295 17 h/B
 *
 * @remarks Bligh's and Lane's ratios were fitted to permanent weirs on bare alluvium.
 */
export function pipingScreen(head: number, base: number): PipingScreen {
  const drop = Math.max(0, head)
  return {
    exitGradient: base > 0 ? (AVERAGE_EXIT * drop) / base : 0,
    bligh: drop > 0 ? base / drop : null,
    lane: drop > 0 ? base / 3 / drop : null,
  }
}

/** Critical gradient of a soil, (G_s − 1)/(1 + e) [–]. */
export function criticalGradient(specificGravity: number, voidRatio: number): number {
  return (specificGravity - 1) / (1 + voidRatio)
}
