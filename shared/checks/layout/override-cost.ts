import { sectionTime } from '../../catalogue/laying-times'
import type { ScenarioBarrier } from '../../schemas/scenario'
import { CHANGE_MASS } from './choose-sizes'
import type { LaidSection } from './layout-bill'

/** What a size laid by hand costs beyond the best one; negative where it is the lighter. */
export interface OverrideCost {
  /** Σ mass + 20 kg × changes, beyond what the best size would make of the line as it is [kg]. */
  readonly mass: number
  /** Time of a crew [s]. */
  readonly crewTime: number
}

/**
 * The cost of what is laid in one section against another size there, all else as it is.
 *
 * @param index Of the section in `laid`.
 * @param sectionLength Length of a tube [m].
 */
export function overrideCost(
  laid: readonly LaidSection[],
  index: number,
  other: ScenarioBarrier,
  sectionLength: number,
): OverrideCost {
  const own = laid[index]!.run?.barrier ?? null
  const changes = (barrier: ScenarioBarrier | null) =>
    [index - 1, index + 1].filter((neighbour) => {
      const beside = laid[neighbour]?.run?.barrier
      return beside && barrier && beside.diameter !== barrier.diameter
    }).length
  const mass = (barrier: ScenarioBarrier | null) =>
    (barrier ? barrier.mass * sectionLength : 0) + CHANGE_MASS * changes(barrier)
  return {
    mass: mass(own) - mass(other),
    crewTime: (own ? sectionTime(own.diameter) : 0) - sectionTime(other.diameter),
  }
}
