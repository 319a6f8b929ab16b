import { seatPressure } from '../calc/loaded-shape/seat-pressure'
import { upliftShare } from '../calc/uplift/uplift-share'
import type { SectionCase } from '../schemas/section-case'
import { sectionState } from './section-state'

/** What the water in the void under the lifted skirt may be, and what it is. */
export interface SeatCheck {
  /** Pressure at which the tube loses its seat [Pa]; null: none up to that of the water does. */
  readonly limit: number | null
  /** Pressure that the uplift model has where the skirt peels off the ground [Pa]. */
  readonly atPeel: number
  /** The tube gives way: the drained void is not what there is. */
  readonly givesWay: boolean
}

/**
 * Void pressure beside what the tube bears: the loaded shape counts on a drained void, and a skirt
 * that leaks over a seat that seals is not safe. Information beside the answer; it costs a search, so
 * it is not part of every check.
 *
 * @returns null where no shape stands or there is no water.
 */
export function seatCheck(section: SectionCase): SeatCheck | null {
  const { shape, geometry } = sectionState(section)
  const { depth, unitWeight, wettedSkirt, base } = geometry
  if (!shape.solved || depth === 0) return null
  const { diameter, airPressure } = section.barrier
  const seat = seatPressure({ shape, diameter, airPressure, depth, unitWeight })
  const excess = section.uplift.edgeFactor * depth - section.water.dryDepth
  const share = upliftShare(section.uplift, base, wettedSkirt - shape.freeSkirt)
  const under = section.uplift.model === 'none' ? 0 : section.water.dryDepth + excess * share
  const atPeel = unitWeight * under
  const limit = seat?.pressure ?? null
  return { limit, atPeel, givesWay: limit !== null && atPeel > limit }
}
