import { gapsOf, type Span } from '../../calc/series/time-series'
import type { Verdict } from '../../schemas/check-ids'
import type { ForecastBand } from '../../schemas/forecast'
import type { SectionCase } from '../../schemas/section-case'
import { isWorse } from '../compare'
import type { AtMoment, Failure } from '../event/event-answer'
import type { EventTrace } from '../event/event-trace'
import type { LeaveTime } from '../event/leave-time'
import type { JobOutcome, SectionOutcome } from './job-outcome'
import { EVENT_BANDS, type BandSeries } from './line-event-input'
import type { LineEventPlan, PlannedPiece, PlannedSection } from './line-event-plan'

/** The piece of a section that is used furthest, to be looked at through time. */
export interface ShownPiece {
  readonly place: number
  readonly groundLevel: number
  readonly surface: string
  /** Its case without water, and the ground that it was computed on. */
  readonly section: SectionCase
  readonly computedGround: number
  readonly trace: EventTrace
}

/** One section of a line through an event. */
export interface SectionThroughTime extends PlannedSection {
  /** What it does in each band; null where nothing is computed. */
  readonly outcomes: Readonly<Record<ForecastBand, SectionOutcome>> | null
  readonly shown: ShownPiece | null
}

/** The whole line in one band. */
export interface LineOutcome {
  readonly verdict: Verdict
  /** First section that fails, by its place in the list; null: none does. */
  readonly first: { readonly section: number; readonly failure: Failure } | null
  /** Section that is left first, by its place in the list; null where there is no leave level at all. */
  readonly leave: (LeaveTime & { readonly section: number }) | null
  /** Least factor and least freeboard of all sections, by their place in the list. */
  readonly leastFactor: (AtMoment & { readonly section: number }) | null
  readonly leastFreeboard: (AtMoment & { readonly section: number }) | null
  /** Sections that fail, and those in which nothing was computed. */
  readonly failing: number
  readonly notChecked: number
}

/** A line through an event. */
export interface LineEventAnswer {
  readonly sections: readonly SectionThroughTime[]
  readonly bands: Readonly<Record<ForecastBand, LineOutcome>>
  /** False: low and high are as expected. */
  readonly hasBand: boolean
  /** Spans in which nothing is known and nothing was computed. */
  readonly gaps: readonly Span[]
}

/** Puts the outcomes of all jobs, in the order of the plan, together to the answer of the line. */
export function lineEventAnswer(
  plan: LineEventPlan,
  outcomes: readonly JobOutcome[],
  water: BandSeries,
): LineEventAnswer {
  const sections = plan.sections.map((section) => throughTime(section, plan, outcomes))
  return {
    sections,
    bands: perBand((band) => lineOutcome(sections, band)),
    hasBand: plan.bands.length > 1,
    gaps: gapsOf(water.expected),
  }
}

function perBand<Value>(of: (band: ForecastBand) => Value): Record<ForecastBand, Value> {
  const [low, expected, high] = EVENT_BANDS
  return { low: of(low), expected: of(expected), high: of(high) }
}

function throughTime(
  section: PlannedSection,
  plan: LineEventPlan,
  outcomes: readonly JobOutcome[],
): SectionThroughTime {
  if (section.pieces.length === 0) return { ...section, outcomes: null, shown: null }
  const place = (band: ForecastBand) => Math.max(0, plan.bands.indexOf(band))
  const fallback = plan.bands.indexOf('expected')
  const at = ({ firstJob }: PlannedPiece, band: ForecastBand) =>
    firstJob + (plan.bands.includes(band) ? place(band) : fallback)
  const outcomeOf = (band: ForecastBand) =>
    mergedOutcome(section.pieces.map((piece) => outcomes[at(piece, band)]!))
  const used = (piece: PlannedPiece) => outcomes[at(piece, 'expected')]!.worst.utilisation
  const worst = section.pieces.reduce((a, b) => (isWorse(used(b), used(a)) ? b : a))
  const job = plan.jobs[at(worst, 'expected')]!
  const { place: chainage, groundLevel, surface } = worst
  return {
    ...section,
    outcomes: perBand(outcomeOf),
    shown: {
      ...{ place: chainage, groundLevel, surface },
      section: job.section,
      computedGround: job.groundLevel,
      trace: outcomes[at(worst, 'expected')]!.trace!,
    },
  }
}

/** A section is its worst piece at each question: earliest, least and lowest of all. */
function mergedOutcome(pieces: readonly JobOutcome[]): SectionOutcome {
  const { trace: _, ...first } = pieces[0]!
  return pieces.slice(1).reduce<SectionOutcome>((a, b) => {
    const limit = isLower(b.holdsToLevel, a.holdsToLevel) ? b : a
    const isEarlier =
      b.firstFailure && (!a.firstFailure || b.firstFailure.from < a.firstFailure.from)
    const failing = isEarlier ? b : a
    return {
      verdict: worstOf([a.verdict, b.verdict]),
      worst: isWorse(b.worst.utilisation, a.worst.utilisation) ? b.worst : a.worst,
      firstFailure: failing.firstFailure,
      failures: failing.failures,
      leastFactor: lesser(a.leastFactor, b.leastFactor),
      leastFreeboard: lesser(a.leastFreeboard, b.leastFreeboard),
      lowestAirPressure: lesser(a.lowestAirPressure, b.lowestAirPressure)!,
      holdsToLevel: limit.holdsToLevel,
      holdsToCheck: limit.holdsToCheck,
      leave: isLower(b.leave.level, a.leave.level) ? b.leave : a.leave,
    }
  }, first)
}

function lineOutcome(sections: readonly SectionThroughTime[], band: ForecastBand): LineOutcome {
  const all = sections.flatMap(({ outcomes }, section) =>
    outcomes ? [{ section, ...outcomes[band] }] : [],
  )
  const failing = all.filter(({ verdict }) => verdict === 'fails')
  const notChecked = sections.filter(({ outcomes }) => outcomes === null).length
  const first = all.reduce<LineOutcome['first']>((found, { section, firstFailure }) => {
    if (!firstFailure || (found && found.failure.from <= firstFailure.from)) return found
    return { section, failure: firstFailure }
  }, null)
  return {
    verdict: worstOf([
      ...all.map(({ verdict }) => verdict),
      ...(notChecked > 0 ? (['notChecked'] as const) : []),
    ]),
    first,
    leave: lineLeave(all),
    leastFactor: all.reduce<LineOutcome['leastFactor']>(
      (found, { section, leastFactor }) =>
        lesser(found, leastFactor && { ...leastFactor, section }),
      null,
    ),
    leastFreeboard: all.reduce<LineOutcome['leastFreeboard']>(
      (found, { section, leastFreeboard }) =>
        lesser(found, leastFreeboard && { ...leastFreeboard, section }),
      null,
    ),
    failing: failing.length,
    notChecked,
  }
}

/** The line is left with the section that is left at the lowest level; where nothing holds, at once. */
function lineLeave(
  all: readonly (SectionOutcome & { readonly section: number })[],
): LineOutcome['leave'] {
  return all.reduce<LineOutcome['leave']>((found, { section, leave }) => {
    const isFirst = found === null || isLower(leave.level, found.level)
    return isFirst ? { ...leave, section } : found
  }, null)
}

/** Null is lowest of all: nothing holds there. */
function isLower(a: number | null, b: number | null): boolean {
  if (b === null) return false
  return a === null || a < b
}

function lesser<Moment extends AtMoment>(a: Moment | null, b: Moment | null): Moment | null {
  if (!a || !b) return a ?? b
  return b.value < a.value ? b : a
}

function worstOf(verdicts: readonly Verdict[]): Verdict {
  return (['fails', 'notChecked', 'narrow'] as const).find((v) => verdicts.includes(v)) ?? 'holds'
}
