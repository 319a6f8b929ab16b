/** Waves against a crest that stands above the water. */
export interface OvertoppingInput {
  /** Significant wave height at the barrier, H_m0 [m]. */
  readonly height: number
  /** Crest of the loaded tube above still water, R_c [m]. */
  readonly crestFreeboard: number
  readonly gravity: number
}

/** The two ways of reading the formula: mean, or design and assessment with its margin. */
export type OvertoppingApproach = 'mean' | 'design'

const COEFFICIENTS = { mean: [0.047, 2.35], design: [0.054, 2.12] } as const

/** R_c/H in which the formula was fitted; outside, the product says so. */
export const OVERTOPPING_FITTED = { min: 0.1, max: 3.5, unit: '–' } as const

/**
 * Mean discharge of waves over a vertical wall, per metre run:
 *
 *     q = 0.047 √(g H³) exp[−(2.35 R_c/H)^1.3]   [m²/s]     (design: 0.054, 2.12)
 *
 * No waves, no overtopping. A crest under water overflows instead: see `overflow`.
 *
 * @see EurOtop, Manual on wave overtopping, 2nd edition 2018, eq. 7.1 (from memory).
 */
export function overtopping(
  { height, crestFreeboard, gravity }: OvertoppingInput,
  approach: OvertoppingApproach = 'mean',
): number {
  if (height <= 0) return 0
  const [scale, decay] = COEFFICIENTS[approach]
  const exponent = (decay * Math.max(0, crestFreeboard / height)) ** 1.3
  return scale * Math.sqrt(gravity * height ** 3) * Math.exp(-exponent)
}

/**
 * Water that runs over a broad crest, per metre run:
 *
 *     q = C (2/3)^1.5 √g H^1.5   [m²/s],   C = 1
 *
 * @param head Still water above the crest [m]; none where it is not positive.
 */
export function overflow(head: number, gravity: number, coefficient = 1): number {
  return head > 0 ? coefficient * (2 / 3) ** 1.5 * Math.sqrt(gravity) * head ** 1.5 : 0
}
