/** Least margin between the level that holds and the one at which everybody leaves [m]. */
export const LEAST_LEAVE_MARGIN = 0.05

/** Time to clear the area unless the user says otherwise [s]. */
export const CLEARING_TIME = 20 * 60

/** What the leave level is worked out from. */
export interface LeaveInput {
  /** Depth to which all checks hold [m]; 0 where nothing holds. */
  readonly holdsToDepth: number
  /** Depth from which they hold [m]; 0 or left out: from the first drop. */
  readonly holdsFrom?: number | null
  /** Depth that is checked [m]. */
  readonly depth: number
  /** Depth of the water at this moment [m], where it is known. */
  readonly depthNow?: number | null
  /** Rate of rise [m/s]; null where it is not known. */
  readonly rateOfRise: number | null
  /** Time needed to clear the area [s]. */
  readonly timeToClear: number
}

/**
 * - `leave-at`: everybody leaves before the water reaches it.
 * - `leave-before-level`: the level checked holds, but lies above the leave level.
 * - `leave-now`: the water is above it already.
 * - `none`: nothing holds, or not at this water or below it, so there is no leave level; do not rely
 *   on the barrier.
 */
export type LeaveState = 'leave-at' | 'leave-before-level' | 'leave-now' | 'none'

export interface LeaveLevel {
  /**
   * Depth at which everybody leaves [m]; null where nothing holds. Negative where the water must be
   * left before it reaches the barrier at all.
   */
  readonly depth: number | null
  /** What it lies below the level that holds [m]. */
  readonly margin: number
  readonly state: LeaveState
}

/**
 * Leave level: what holds, less what the water rises while the area is cleared, at least 0.05 m.
 */
export function leaveLevel(input: LeaveInput): LeaveLevel {
  const { holdsToDepth, holdsFrom, depth, depthNow = null, rateOfRise, timeToClear } = input
  const margin = Math.max((rateOfRise ?? 0) * timeToClear, LEAST_LEAVE_MARGIN)
  const leave = holdsToDepth - margin
  // Where it holds only from some depth on, it cannot be relied on below that.
  const from = holdsFrom ?? 0
  const isBelowHold = from > 0 && (depth < from || leave <= from)
  if (holdsToDepth <= 0 || isBelowHold) return { depth: null, margin, state: 'none' }
  return { depth: leave, margin, state: leaveState(leave, depth, depthNow, holdsToDepth) }
}

function leaveState(
  leave: number,
  depth: number,
  depthNow: number | null,
  holdsToDepth: number,
): LeaveState {
  if (depthNow !== null && depthNow >= leave) return 'leave-now'
  return depth > leave && depth <= holdsToDepth ? 'leave-before-level' : 'leave-at'
}
