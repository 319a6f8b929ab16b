import type { HorizontalLoad } from '../hydrostatics/still-water-thrust'

/** Something that floats against one section. */
export interface FloatingDebris {
  /** Force on the section [N]. Published methods to find it differ 75-fold: name yours. */
  readonly force: number
  /** Depth from which the object floats as far as the barrier [m]. */
  readonly draught: number
  /** Length over which one section spreads the force [m]. */
  readonly sectionLength: number
  readonly depth: number
}

/**
 * Thrust of floating debris, spread over one section and acting at the water surface, once the water
 * is deep enough to carry the object there. Per metre run.
 */
export function debrisThrust(debris: FloatingDebris): HorizontalLoad {
  const { force, draught, sectionLength, depth } = debris
  const perMetre = depth >= draught ? force / sectionLength : 0
  return { force: perMetre, moment: perMetre * depth }
}
