import { gaussLegendre } from '../numerics/gauss-legendre'

const RULE = gaussLegendre(20)

/** The skirt between the ground and the weld line, lifted by the tube. */
export interface FreeSkirt {
  /** Length along the fabric [m]. */
  readonly length: number
  /** Its run along the ground [m]. */
  readonly run: number
}

/**
 * Free skirt: it leaves the ground tangentially and carries the water above it,
 *
 *     cos φ = (1 − y/h)²,   length = ∫₀^y_A dy / sin φ,   run = ∫₀^y_A cot φ dy
 *
 * The start is singular like 1/√y; y = s² takes that away.
 */
export function freeSkirt(depth: number, weldHeight: number): FreeSkirt {
  const end = Math.sqrt(weldHeight)
  let length = 0
  let run = 0
  for (const { at, weight } of RULE) {
    const v = (end * at) ** 2 / depth
    const cosine = (1 - v) ** 2
    // sin²φ = v (2 − v)(1 + (1 − v)²); ds carries the √v.
    const perStep = weight / Math.sqrt((2 - v) * (1 + cosine))
    length += perStep
    run += perStep * cosine
  }
  const scale = 2 * end * Math.sqrt(depth)
  return { length: scale * length, run: scale * run }
}
