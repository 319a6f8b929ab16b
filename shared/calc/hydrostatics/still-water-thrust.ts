/** A resultant per metre run and the moment that it has about the ground. */
export interface HorizontalLoad {
  /** Resultant force per metre run [N/m], positive to the dry side. */
  readonly force: number
  /** Moment about the ground per metre run [N]. */
  readonly moment: number
}

/**
 * Horizontal resultant of still water standing against a face, per metre run:
 *
 *     F = ρ g h² / 2   at   h / 3 above the ground
 *
 * The horizontal component does not depend on the shape of the face: it is that of its vertical
 * projection.
 *
 * @param depth Depth of the water h [m], 0 or more.
 * @param unitWeight ρ g [N/m³].
 * @see Bansal, A Textbook of Fluid Mechanics, ch. 3, "Curved surface sub-merged in liquid".
 */
export function stillWaterThrust(depth: number, unitWeight: number): HorizontalLoad {
  const force = (unitWeight * depth ** 2) / 2
  return { force, moment: (force * depth) / 3 }
}
