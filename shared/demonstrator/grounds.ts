import { GROUNDS } from '../catalogue/grounds'
import { SLIPPERY_FRICTION } from '../checks/what-decides'
import type { DemoGround } from './setting'

/** A ground of the catalogue. */
export function groundOf(wanted: string): DemoGround {
  const { id, friction, permeability, layerThickness, isSuitable } = GROUNDS.find(
    (ground) => ground.id === wanted,
  )!
  return { id, friction, permeability, layerThickness, isSuitable }
}

/** Grass after rain: what friction does when it is slippery. Judgement, unverified. */
export const WET_GRASS: DemoGround = {
  ...groundOf('turf'),
  id: 'wet-grass',
  friction: SLIPPERY_FRICTION,
}

/** Grounds that the demonstrator offers; the last two are never a place to set up. */
export const DEMO_GROUNDS: readonly DemoGround[] = [
  groundOf('turf'),
  WET_GRASS,
  groundOf('concrete'),
  groundOf('asphalt'),
  groundOf('loose-gravel'),
  groundOf('bare-mud'),
]
