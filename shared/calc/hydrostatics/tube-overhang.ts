/** The part of the tube that hangs over the skirt and keeps water off it. */
export interface TubeOverhang {
  /** Cross-section area under water beyond the weld line, A_o [m²]. */
  readonly area: number
  /** First moment of that area about the dry toe, M_o [m³]. */
  readonly moment: number
}

/**
 * Area of the circular tube that overhangs the weld line below the water surface, and its first
 * moment about the dry toe:
 *
 *     o(y)  = max(0, √(R² − (y − R)²) − b/2)
 *     A_o   = ∫₀^min(h, D) o dy
 *     M_o   = ∫₀^min(h, D) o (b + o/2) dy
 *
 * Both in closed form. The water on the skirt is L h − A_o, and ρ g A_o is the tube's own lift: for
 * b = 0 half a circular segment. Leaving it out overstates the grip by 10 to 40 %.
 *
 * @remarks Valid for 0 ≤ b ≤ D and h ≥ 0; above the crest A_o stays that of the whole tube.
 * @see Bansal, A Textbook of Fluid Mechanics, problem 3.31, for the lift of a cylinder on the ground.
 */
export function tubeOverhang(diameter: number, contactWidth: number, depth: number): TubeOverhang {
  const radius = diameter / 2
  const halfStrip = contactWidth / 2
  const bounds = overhangBounds(diameter, contactWidth, depth)
  if (bounds === null) return { area: 0, moment: 0 }

  const { lower, upper, underArc } = bounds
  const span = upper - lower
  const area = underArc - halfStrip * span
  const squared =
    (radius ** 2 + halfStrip ** 2) * span - (upper ** 3 - lower ** 3) / 3 - contactWidth * underArc
  return { area, moment: contactWidth * area + squared / 2 }
}

/** The part of the circle that hangs over the weld line under water, from its centre up [m]. */
export interface OverhangBounds {
  readonly lower: number
  readonly upper: number
  /** Area between the upright axis and the circle from `lower` to `upper` [m²]. */
  readonly underArc: number
}

/** Bounds of the overhang; null where the water does not reach it. */
export function overhangBounds(
  diameter: number,
  contactWidth: number,
  depth: number,
): OverhangBounds | null {
  const radius = diameter / 2
  const reach = Math.sqrt(Math.max(0, radius ** 2 - (contactWidth / 2) ** 2))
  const upper = Math.min(Math.min(depth, diameter) - radius, reach)
  if (upper <= -reach) return null
  const underArc = arcIntegral(radius, upper) - arcIntegral(radius, -reach)
  return { lower: -reach, upper, underArc }
}

/** ∫ √(R² − s²) ds. */
function arcIntegral(radius: number, s: number): number {
  const sine = Math.max(-1, Math.min(1, s / radius))
  const chord = Math.sqrt(Math.max(0, radius ** 2 - s ** 2))
  return (s * chord + radius ** 2 * Math.asin(sine)) / 2
}
