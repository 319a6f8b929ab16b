import type { Span } from '../../calc/series/time-series'
import type { CheckId, Verdict } from '../../schemas/check-ids'
import type { PondLimit } from '../pond-limit'
import type { EventTrace } from './event-trace'
import type { LeaveTime } from './leave-time'

/** A time in which a section fails. */
export interface Failure {
  /** When it begins, to a second or better [s]. */
  readonly from: number
  /** When it ends; null: it still fails where the water is last known. */
  readonly to: number | null
  /** Water level when it begins [m]. */
  readonly level: number
  /** What fails first. */
  readonly check: CheckId
}

/** A figure and the moment that it belongs to. */
export interface AtMoment {
  readonly time: number
  readonly value: number
}

/** The answer for one section through an event. */
export interface EventAnswer {
  /** Worst verdict of all moments. */
  readonly verdict: Verdict
  /** What was used furthest, when and how far; null utilisation: nothing resisted. */
  readonly worst: {
    readonly time: number
    readonly check: CheckId
    readonly utilisation: number | null
  }
  /** First exceedance; null: it holds throughout. */
  readonly firstFailure: Failure | null
  readonly failures: readonly Failure[]
  /** Least factor of sliding and least freeboard; null where there is none at any moment. */
  readonly leastSliding: AtMoment | null
  readonly leastFreeboard: AtMoment | null
  readonly highestLevel: AtMoment
  readonly lowestAirPressure: AtMoment
  /** Level to which it holds with the lowest pressure and the highest pond; null: nothing holds. */
  readonly holdsToLevel: number | null
  readonly holdsToCheck: CheckId
  readonly leave: LeaveTime
  /** The pond level at which it fails while the water stands highest; null: it never does. */
  readonly pondLimit: (PondLimit & { readonly level: number | null }) | null
  /** Spans in which nothing is known and nothing was computed. */
  readonly gaps: readonly Span[]
  readonly trace: EventTrace
}
