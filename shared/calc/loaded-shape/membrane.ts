/**
 * A weightless, inextensible air-filled tube on a frictionless seat, held by its skirt alone, with
 * drained void under the lifted skirt, on level ground, without water on the dry side.
 *
 * Tensions are divided by the air pressure and pressures by it as well, so that only lengths remain:
 * the skin away from the water is an arc of radius r = T/p, and the crest stands at H = 2 r.
 *
 * @see Anwar, Journal of the Hydraulics Division 93 (1967), for the theory of inflatable dams (from
 * memory); the form with a skirt is derived on the Method page.
 */
export interface Membrane {
  /** Depth of the water, h [m], above 0. */
  readonly depth: number
  /** Circumference of the skin, πD [m]. */
  readonly perimeter: number
  /** κ = ρ g / 2p [1/m]: how fast the water pressure eats up the air pressure. */
  readonly kappa: number
}

/**
 * Angles of the skin and the skirt at the weld line, from their cosines without cancellation:
 *
 *     cos α = 1 − y/r,   cos β = −1 + (y + κ w²)/r,   cos φ = (1 − y/h)²,   w = h − y
 */
export interface WeldAngles {
  readonly sinAlpha: number
  readonly sinBeta: number
  readonly sinPhi: number
}

/** Angles at a weld height y for a skin of radius r. */
export function weldAngles(membrane: Membrane, radius: number, weldHeight: number): WeldAngles {
  const { depth, kappa } = membrane
  const lower = weldHeight / radius
  const upper = (weldHeight + kappa * (depth - weldHeight) ** 2) / radius
  const rest = (1 - weldHeight / depth) ** 2
  return {
    sinAlpha: Math.sqrt(lower * Math.max(0, 2 - lower)),
    sinBeta: Math.sqrt(upper * Math.max(0, 2 - upper)),
    sinPhi: Math.sqrt((1 - rest) * (1 + rest)),
  }
}
