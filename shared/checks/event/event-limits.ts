import { stretchesOf } from '../../calc/series/time-series'
import type { SectionCase } from '../../schemas/section-case'
import { holdingProfile, holdsToAt } from '../holds-to'
import { CLEARING_TIME } from '../leave-level'
import { pondLimit } from '../pond-limit'
import type { EventAnswer } from './event-answer'
import type { EventInput } from './event-input'
import type { EventMoment } from './event-trace'
import { leaveTime } from './leave-time'
import { least } from './least-moment'

/** Depth above which a case is not computed, in diameters. */
const DEEPEST = 1.5

/** What holds, when to leave and which pond is too much, as a part of the answer. */
export type Limits = Pick<EventAnswer, 'holdsToLevel' | 'holdsToCheck' | 'leave' | 'pondLimit'>

/** What holds, when to leave, and which pond is too much. */
export function limitsOf(
  input: EventInput,
  moments: readonly EventMoment[],
  highest: EventMoment,
): Limits {
  const { groundLevel, water, gripShare, timeToClear = CLEARING_TIME } = input
  const worst = worstSection(input, moments)
  const { from, depth, check } = holdsToAt(holdingProfile(worst, gripShare), highest.depth)
  const stretches = stretchesOf(water)
  const { diameter } = input.section.barrier
  const isComputable = highest.depth <= DEEPEST * diameter
  const atCrest = { ...worst, water: { ...worst.water, depth: highest.depth, dryDepth: 0 } }
  const limit = isComputable ? pondLimit(atCrest, gripShare) : null
  return {
    holdsToLevel: from === null ? null : groundLevel + depth,
    holdsToCheck: check,
    leave: leaveTime({ stretches, groundLevel, holdsFrom: from, holdsTo: depth, timeToClear }),
    pondLimit: limit && {
      ...limit,
      level: limit.dryDepth === null ? null : groundLevel + limit.dryDepth,
    },
  }
}

/** The section with the lowest pressure and the highest pond of the event, its uplift grown longest. */
export function worstSection(
  { section, groundBefore = 'soaked' }: Pick<EventInput, 'section' | 'groundBefore'>,
  moments: readonly EventMoment[],
): SectionCase {
  const wet = moments.filter(({ depth }) => depth > 0)
  const time = wet.length > 0 ? wet[wet.length - 1]!.time - wet[0]!.time : 0
  const isSoaked = groundBefore === 'soaked' && moments[0]!.depth > 0
  const model =
    section.uplift.model === 'developing' && isSoaked ? ('linear' as const) : section.uplift.model
  const highestPond = moments.reduce((most, { dryDepth }) => Math.max(most, dryDepth), 0)
  const dryDepth = Math.min(highestPond, DEEPEST * section.barrier.diameter)
  const airPressure = Math.max(1, least(moments, (moment) => moment.airPressure)!.value)
  return {
    ...section,
    barrier: { ...section.barrier, airPressure },
    uplift: { ...section.uplift, model, time },
    water: { ...section.water, dryDepth },
  }
}
