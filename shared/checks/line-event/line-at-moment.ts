import { modelledPressure } from '../../calc/uplift/base-pressure'
import { sectionGeometry } from '../../calc/section/section-geometry'
import type { Verdict } from '../../schemas/check-ids'
import type { SectionCase } from '../../schemas/section-case'
import { momentAt, type EventMoment, type EventTrace } from '../event/event-trace'
import { waterAllowance } from '../freeboard-check'
import type { LineEventAnswer, SectionThroughTime, ShownPiece } from './line-event-answer'

/** The last moment of a trace at or before a time [s]; null before its first. */
export function traceAt(trace: EventTrace, time: number): EventMoment | null {
  const columns = trace.figures.length / Math.max(1, trace.length)
  let [low, high] = [0, trace.length]
  while (low < high) {
    const middle = (low + high) >> 1
    if (trace.figures[middle * columns]! <= time) low = middle + 1
    else high = middle
  }
  return low === 0 ? null : momentAt(trace, low - 1)
}

/** Longest time for which uplift is looked for that has grown to a given force [s]: a year. */
const LONGEST_GROWTH = 31_557_600

/**
 * The cross-section of a section at a moment of its event: depths, air pressure, and where water under
 * the skirt grows, the hours of a step under which as much has grown. In falling water, where more
 * presses than under a step that has stood for ever, it is that of the even fall.
 */
export function caseAtMoment({ section }: ShownPiece, moment: EventMoment): SectionCase {
  const { depth, dryDepth, airPressure } = moment
  const at: SectionCase = {
    ...section,
    barrier: { ...section.barrier, airPressure: Math.max(1, airPressure) },
    water: { ...section.water, depth, dryDepth },
  }
  const { model, diffusivity } = section.uplift
  if (model !== 'developing' || diffusivity === null) return at
  return { ...at, uplift: { ...at.uplift, time: grownFor(at, moment.uplift) } }
}

/** Hours of a step under which the uplift has grown to a force, by halving [s]. */
function grownFor(section: SectionCase, uplift: number): number {
  const geometry = sectionGeometry(section)
  const after = (time: number): number =>
    modelledPressure({ ...section, uplift: { ...section.uplift, time } }, geometry).uplift.force
  let [early, late] = [0, LONGEST_GROWTH]
  if (after(late) <= uplift) return late
  for (let halving = 0; halving < 60; halving += 1) {
    const middle = (early + late) / 2
    if (after(middle) < uplift) early = middle
    else late = middle
  }
  return late
}

/** What a section does at a moment, as far as the long section shows it. */
export interface SectionAtMoment {
  readonly from: number
  readonly to: number
  /** Chainage of the ground that is used furthest. */
  readonly place: number
  readonly verdict: Verdict
  readonly utilisation: number | null
  readonly holdsToLevel: number | null
  /** Loaded crest [m]; null where no shape stands, or nothing is computed. */
  readonly crestLevel: number | null
}

/** All sections at a moment [s]; in a gap nothing is known of any. */
export function sectionsAt(answer: LineEventAnswer, time: number): readonly SectionAtMoment[] {
  const isGap = answer.gaps.some(({ from, to }) => from < time && time < to)
  return answer.sections.map((section) => {
    const { from, to, shown, outcomes } = section
    const moment = shown && !isGap ? traceAt(shown.trace, time) : null
    return {
      from,
      to,
      place: shown?.place ?? section.lowest.place,
      verdict: moment ? moment.verdict : 'notChecked',
      utilisation: moment?.utilisation ?? null,
      holdsToLevel: outcomes?.expected.holdsToLevel ?? null,
      crestLevel: moment && shown ? crestOf(section, moment) : null,
    }
  })
}

/** Crest = depth + freeboard + what waves and current add. */
function crestOf({ shown }: SectionThroughTime, moment: EventMoment): number | null {
  const { depth, freeboard } = moment
  if (!shown || freeboard === null) return null
  const { section, groundLevel } = shown
  const water = { ...section.water, depth }
  return groundLevel + depth + freeboard + waterAllowance({ section: { ...section, water } })
}
