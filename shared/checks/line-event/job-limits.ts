import { stretchesOf } from '../../calc/series/time-series'
import type { EventInput } from '../event/event-input'
import { worstSection } from '../event/event-limits'
import type { EventMoment } from '../event/event-trace'
import { leaveTime } from '../event/leave-time'
import { holdsToAt } from '../holds-to'
import { CLEARING_TIME } from '../leave-level'
import { keptProfile, type HoldingProfiles } from '../line-check'
import type { JobOutcome } from './job-outcome'

/** Uplift that has grown for less time counts as grown to the next quarter of an hour [s]. */
const GROWN_STEP = 900

/** Least air pressures this close share a profile, the lower one counting for both [Pa]. */
const PRESSURE_STEP = 10

/** Highest ponds this close share a profile, the higher one counting for both [m]. */
const POND_STEP = 1e-3

type Limits = Pick<JobOutcome, 'holdsToLevel' | 'holdsToCheck' | 'leave'>

/**
 * What a section holds through its event and when it is left, as `limitsOf` has it, with profiles that
 * sections share: hours of growth, least pressure and highest pond are rounded to the safe side.
 */
export function jobLimits(
  input: EventInput,
  moments: readonly EventMoment[],
  { highest, profiles }: { readonly highest: EventMoment; readonly profiles: HoldingProfiles },
): Limits {
  const { groundLevel, gripShare = 1, timeToClear = CLEARING_TIME } = input
  const worst = worstSection(input, moments)
  const { barrier, uplift, water } = worst
  const dryDepth = Math.ceil(water.dryDepth / POND_STEP - 1e-6) * POND_STEP
  const shared = {
    ...worst,
    barrier: {
      ...barrier,
      airPressure: Math.max(1, Math.floor(barrier.airPressure / PRESSURE_STEP) * PRESSURE_STEP),
    },
    uplift:
      uplift.model === 'developing'
        ? { ...uplift, time: Math.ceil((uplift.time ?? 0) / GROWN_STEP) * GROWN_STEP }
        : { ...uplift, time: null },
    water: { ...water, dryDepth },
  }
  const profile = keptProfile(shared, gripShare, profiles)
  const { from, depth, check } = holdsToAt(profile, highest.depth)
  const stretches = stretchesOf(input.water)
  return {
    holdsToLevel: from === null ? null : groundLevel + depth,
    holdsToCheck: check,
    leave: leaveTime({ stretches, groundLevel, holdsFrom: from, holdsTo: depth, timeToClear }),
  }
}
