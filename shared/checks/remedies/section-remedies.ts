import type { LineSection } from '../../calc/line/line-sections'
import { STANDARD_ATMOSPHERE } from '../../constants'
import { EDGE_WORK, sectionTime, stepTimes } from '../../catalogue/laying-times'
import { fieldRange } from '../../schemas/section-ranges'
import type { ScenarioBarrier, ScenarioContent, SizeRun } from '../../schemas/scenario'
import { missingRoom } from '../layout/size-options'
import { edgeCost } from '../layout/layout-bill'
import { answerSection, type LineWork, type SectionAnswer } from '../line-check'
import { sizeAt } from '../place-case'
import { edgeFactorsOf } from '../what-decides'
import { compareRemedies, LEAST_GAIN, type Remedy, type RemedyKind } from './remedy'

/** What remedies of one line rest on. */
export interface RemedyWork extends LineWork {
  readonly content: ScenarioContent
  /** Sizes on offer, smallest first, of the section length of the line. */
  readonly sizes: readonly ScenarioBarrier[]
  /** Pieces of a size, or edge bags, that are left in the store; null where no store is known. */
  readonly left: StoreLeft | null
}

/** What the store still holds when all that is laid now is taken from it. */
export interface StoreLeft {
  readonly tubes: (barrierId: string | null) => number
  readonly edgeBags: number
}

/** More air that is tried, as shares of the pressure. Judgement. */
const MORE_AIR = [1.1, 1.25, 1.5] as const

/** Longer skirts that are tried [m]. Judgement. */
const LONGER_SKIRTS = [0.25, 0.5, 1] as const

/**
 * Remedies for one section, the cheapest first: each is computed as a change of the scenario. What
 * gains less than 5 mm is left out.
 *
 * @param now Answer for the section as it is.
 */
export function sectionRemedies(
  section: LineSection,
  now: SectionAnswer,
  work: RemedyWork,
): readonly Remedy[] {
  if (now.gap === 'no-ground' || now.gap === 'sharp-turn') return []
  const run = sizeAt(work.content, (section.from + section.to) / 2)
  const tried = run
    ? [
        ...sizeRemedies(section, run, work),
        ...edgeRemedies(section, run, work),
        ...airRemedies(section, run, work),
        ...skirtRemedies(section, run, work),
      ]
    : sizeRemedies(section, null, work)
  const found = tried.map((remedy) => withGain(remedy, now)).filter(isWorthIt)
  return [...onePerKind(found), ...moveRemedies(now, work)].sort(compareRemedies)
}

/** A change and its cost, before it is known what it gains. */
interface Tried extends Omit<Remedy, 'gain'> {
  readonly answer: SectionAnswer
}

function tried(
  section: LineSection,
  work: RemedyWork,
  change: Pick<Remedy, 'kind' | 'crewTime' | 'mass' | 'short'> & {
    readonly run: SizeRun
    readonly value?: number
  },
): Tried {
  const run = { ...change.run, from: section.from, to: section.to }
  const content = { ...work.content, sizes: [run] }
  const answer = answerSection(section, content, work)
  return {
    value: null,
    ...change,
    run,
    answer,
    holdsToLevel: answer.holdsToLevel,
    limitedBy: answer.limitedBy,
    isEnough: answer.verdict === 'holds' || answer.verdict === 'narrow',
  }
}

/** Larger sizes; where nothing is laid, each size that fits. One that does not fit lacks room. */
function sizeRemedies(
  section: LineSection,
  run: SizeRun | null,
  work: RemedyWork,
): readonly Tried[] {
  const kind: RemedyKind = run ? 'size' : 'lay'
  const laid = run?.barrier ?? null
  return work.sizes
    .filter(({ diameter }) => diameter > (laid?.diameter ?? 0) + 1e-9)
    .map((barrier) => {
      const room = missingRoom(section, barrier)
      const time = sectionTime(barrier.diameter) - (laid ? sectionTime(laid.diameter) : 0)
      const mass = (barrier.mass - (laid?.mass ?? 0)) * work.sectionLength
      const option = tried(section, work, {
        kind: room > 0 ? 'room' : kind,
        run: { from: 0, to: 0, edgeFactor: run?.edgeFactor ?? null, barrier },
        crewTime: time,
        mass,
        short: work.left && Math.max(0, 1 - work.left.tubes(barrier.catalogueId)),
        ...(room > 0 ? { value: room } : {}),
      })
      return room > 0 ? { ...option, run: { ...option.run! } } : option
    })
}

function edgeRemedies(section: LineSection, run: SizeRun, work: RemedyWork): readonly Tried[] {
  const { content, sectionLength, left } = work
  if (content.uplift.model === 'none') return []
  const now = run.edgeFactor ?? content.uplift.edgeFactor
  const before = edgeCost(run, content, sectionLength)
  const factors = edgeFactorsOf(content.uplift)
  return (['weigh', 'seal'] as const).flatMap((kind) => {
    const edgeFactor = kind === 'weigh' ? factors.weighed : factors.sealed
    if (edgeFactor >= now) return []
    const after = edgeCost({ edgeFactor }, content, sectionLength)
    const bags = after.bags - before.bags
    return [
      tried(section, work, {
        kind,
        run: { ...run, edgeFactor },
        crewTime: after.time - before.time,
        mass: bags * EDGE_WORK.bagMass,
        short: left && Math.max(0, bags - left.edgeBags),
      }),
    ]
  })
}

/** Filling takes longer by the air that goes in besides, at constant volume. */
function airRemedies(section: LineSection, run: SizeRun, work: RemedyWork): readonly Tried[] {
  const { airPressure, diameter } = run.barrier
  const most = fieldRange('barrier.airPressure').max as number
  return MORE_AIR.map((share) => Math.round(share * airPressure))
    .filter((pressure) => pressure > airPressure && pressure <= most)
    .map((pressure) => {
      const more = (pressure - airPressure) / (STANDARD_ATMOSPHERE + airPressure)
      return tried(section, work, {
        kind: 'air',
        run: { ...run, barrier: { ...run.barrier, airPressure: pressure } },
        crewTime: stepTimes(diameter).fill * more,
        mass: 0,
        short: work.left && 0,
        value: pressure,
      })
    })
}

/** A longer skirt is another tube: it is offered for the next purchase, and nothing is laid tonight. */
function skirtRemedies(section: LineSection, run: SizeRun, work: RemedyWork): readonly Tried[] {
  const most = fieldRange('barrier.skirtLength').max as number
  return LONGER_SKIRTS.map((more) => ({ more, skirtLength: run.barrier.skirtLength + more }))
    .filter(({ skirtLength }) => skirtLength <= most)
    .filter((longer) => missingRoom(section, longer) === 0)
    .map(({ more, skirtLength }) =>
      tried(section, work, {
        kind: 'skirt',
        run: { ...run, barrier: { ...run.barrier, skirtLength, catalogueId: null } },
        crewTime: 0,
        mass: 0,
        short: null,
        value: more,
      }),
    )
}

function withGain({ answer: _, ...remedy }: Tried, now: SectionAnswer): Remedy {
  const { holdsToLevel } = remedy
  const isKnown = now.holdsToLevel !== null && holdsToLevel !== null
  const gain = isKnown ? holdsToLevel - now.holdsToLevel! : null
  return { ...remedy, run: remedy.kind === 'room' ? null : remedy.run, gain }
}

function isWorthIt({ holdsToLevel, gain }: Remedy): boolean {
  return holdsToLevel !== null && (gain === null || gain >= LEAST_GAIN)
}

/** Of several sizes, pressures or skirts the least that is enough; else the one that gains most. */
function onePerKind(remedies: readonly Remedy[]): readonly Remedy[] {
  const kinds = [...new Set(remedies.map(({ kind }) => kind))]
  return kinds.map((kind) => {
    const own = remedies.filter((remedy) => remedy.kind === kind)
    return own.find(({ isEnough }) => isEnough) ?? own.reduce((a, b) => (isMore(b, a) ? b : a))
  })
}

function isMore(a: Remedy, b: Remedy): boolean {
  return (a.holdsToLevel ?? -Infinity) > (b.holdsToLevel ?? -Infinity) + LEAST_GAIN
}

/** Ground on which what is laid would hold; where the ground itself fails, any other ground. */
function moveRemedies(now: SectionAnswer, { content }: RemedyWork): readonly Remedy[] {
  const isOnBadGround = now.governs === 'ground'
  const isLow = now.holdsToLevel !== null && now.holdsToLevel < content.waterLevel
  if (!isOnBadGround && !isLow) return []
  const raise = isLow ? content.waterLevel - now.holdsToLevel! : 0
  return [
    {
      kind: 'move',
      run: null,
      holdsToLevel: isLow ? content.waterLevel : null,
      gain: isLow ? raise : null,
      limitedBy: null,
      isEnough: true,
      crewTime: 0,
      mass: 0,
      short: null,
      value: isOnBadGround ? null : now.groundLevel + raise,
    },
  ]
}
