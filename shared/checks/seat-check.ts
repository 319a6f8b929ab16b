import { FILM } from '../constants'
import { seatPressure } from '../calc/loaded-shape/seat-pressure'
import { upliftShare } from '../calc/uplift/uplift-share'
import type { SectionCase } from '../schemas/section-case'
import { sectionState } from './section-state'

/** What the water in the void under the lifted skirt may be, and what it is. */
export interface SeatCheck {
  /** Pressure at which the weightless tube loses its seat [Pa]; null: none up to that of the water does. */
  readonly limit: number | null
  /** The same with the tube's own weight on the seat [Pa]; it decides in shallow water. null: as above. */
  readonly limitWithWeight: number | null
  /** Pressure that the uplift model has where the skirt peels off the ground [Pa]. */
  readonly atPeel: number
  /** The tube gives way: the drained void is not what there is. */
  readonly givesWay: boolean
}

/**
 * Void pressure beside what the tube bears: the loaded shape counts on a drained void, and a skirt
 * that leaks over a seat that seals is not safe.
 *
 * The seat carries p × contact, the weight of the water on tube and lifted skirt, and the void at the
 * seat pressure u_s takes just that away. The membrane has no weight, so in a film of water it has no
 * contact and u_s is nothing; the own weight m g rests on the same seat and, to first order, raises what
 * it bears in proportion:
 *
 *     u = u_s (1 + m g/(p × contact))
 *
 * No check: on level ground without water on the dry side, with the even or the developing uplift, a
 * section that meets its checks keeps its seat, and elsewhere this is said beside the answer. It costs a
 * search, so it is not part of every check.
 *
 * @returns null where no shape stands or there is no water.
 */
export function seatCheck(section: SectionCase): SeatCheck | null {
  const known = answered.get(section)
  if (known !== undefined) return known
  const answer = searched(section)
  answered.set(section, answer)
  return answer
}

/** Several places of one page ask about the same case. */
const answered = new WeakMap<SectionCase, SeatCheck | null>()

function searched(section: SectionCase): SeatCheck | null {
  const { shape, geometry, vertical } = sectionState(section)
  const { depth, unitWeight, wettedSkirt, base } = geometry
  if (!shape.solved || depth < FILM || section.barrier.skirtLength === 0) return null
  const { diameter, airPressure } = section.barrier
  const seat = seatPressure({ shape, diameter, airPressure, depth, unitWeight })
  const excess = section.uplift.edgeFactor * depth - section.water.dryDepth
  const share = upliftShare(section.uplift, base, wettedSkirt - shape.freeSkirt)
  const under = section.uplift.model === 'none' ? 0 : section.water.dryDepth + excess * share
  const atPeel = unitWeight * under
  const limit = seat?.pressure ?? null
  // In a film the contact is rounding, of either sign.
  const carried = airPressure * Math.max(0, shape.contact)
  const weighed = (limit ?? Infinity) * (1 + vertical.self / carried)
  const limitWithWeight = weighed < unitWeight * depth ? weighed : null
  return {
    limit,
    limitWithWeight,
    atPeel,
    givesWay: limitWithWeight !== null && atPeel > limitWithWeight,
  }
}
