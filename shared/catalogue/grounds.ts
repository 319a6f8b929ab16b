import type { SourceTag } from './check-bases'

/** A surface that a barrier can be laid on, or must not be. */
export interface CatalogueGround {
  readonly id: string
  /** Coefficient between a wet coated skirt and the surface [–]. */
  readonly friction: number
  /** Saturated permeability [m/s]. */
  readonly permeability: number
  /** Thickness of the pervious layer [m]. */
  readonly layerThickness: number
  readonly isSuitable: boolean
  readonly tag: SourceTag
  /** No drag test stands behind the friction. */
  readonly isUnverified: true
}

/**
 * Grounds that come with every database. No published friction exists for a coated skirt on wet
 * ground: the values are engineering judgement, and the user is asked for a drag test.
 */
export const GROUNDS: readonly CatalogueGround[] = [
  ground('turf', 0.45, 1e-5),
  ground('concrete', 0.4, 1e-7),
  ground('asphalt', 0.5, 1e-7),
  { ...ground('loose-gravel', 0.45, 1e-2), isSuitable: false, tag: 'practice' },
  { ...ground('bare-mud', 0.2, 1e-7), isSuitable: false, tag: 'practice' },
]

function ground(id: string, friction: number, permeability: number): CatalogueGround {
  return {
    id,
    friction,
    permeability,
    layerThickness: 2,
    isSuitable: true,
    tag: 'judgement',
    isUnverified: true,
  }
}
