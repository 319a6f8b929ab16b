import type { CheckId, Verdict } from '../../schemas/check-ids'
import type { AtMoment, EventAnswer, Failure } from '../event/event-answer'
import type { EventTrace } from '../event/event-trace'
import type { LeaveTime } from '../event/leave-time'

/** Least factor of the friction resistance: of sliding or of the pull on the skirt. */
export interface LeastFactor extends AtMoment {
  readonly check: 'sliding' | 'skirt'
}

/** What a section does in one band. */
export interface SectionOutcome {
  readonly verdict: Verdict
  readonly worst: EventAnswer['worst']
  /** First exceedance; null: it holds throughout. */
  readonly firstFailure: Failure | null
  readonly failures: readonly Failure[]
  readonly leastFactor: LeastFactor | null
  readonly leastFreeboard: AtMoment | null
  readonly lowestAirPressure: AtMoment
  /** Level to which it holds with the lowest pressure and the highest pond [m]; null: nothing holds. */
  readonly holdsToLevel: number | null
  readonly holdsToCheck: CheckId
  readonly leave: LeaveTime
}

/** Outcome of one job, with every moment where somebody will look at them. */
export interface JobOutcome extends SectionOutcome {
  readonly trace: EventTrace | null
}
