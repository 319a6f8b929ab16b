import type { HorizontalLoads } from '../calc/section/horizontal-loads'
import type { SectionCase } from '../schemas/section-case'
import { compare, isWorse } from './compare'
import { globalPairs } from './global-checks'
import {
  COMBINATION_1,
  COMBINATION_2,
  EQU,
  partialSliding,
  UPL,
  type Combination,
} from './partial-checks'
import { sectionState, type SectionState } from './section-state'

/** What a term of a check stands for. */
export type TermId =
  | 'still'
  | 'current'
  | 'wave'
  | 'debris'
  | 'dry'
  | 'skirtWater'
  | 'onSkirt'
  | 'self'
  | 'lift'
  | 'dryLift'
  | 'uplift'
  | 'loads'
  | 'grip'

/** One addend of a demand or a resistance. */
export interface CheckTerm {
  readonly id: TermId
  /** The force per metre run [N/m], or its moment [N], without any factor. */
  readonly value: number
  /** Partial factor with its sign: −1.35 is taken off with 1.35. */
  readonly factor: number
  /** What the crossfall β makes of it. */
  readonly slope: 'cos' | 'sin' | null
  /** What it adds to the sum: value × factor, times cos β or sin β [N/m] or [N]. */
  readonly adds: number
}

/** A check as sums that can be added up by hand. */
export interface CheckTerms {
  /** Combination of EN 1997-1 that is the worse one for sliding; null with global factors. */
  readonly combination: 1 | 2 | null
  readonly demand: readonly CheckTerm[]
  readonly resistance: readonly CheckTerm[]
  /** What the sum of the resistance is multiplied with: the friction in sliding, else 1. */
  readonly friction: number
  /** What it is divided by: the partial factor on tan φ; 1 with global factors. */
  readonly frictionFactor: number
  /** What soft ground bears at most [N/m], where that is less: then it is the resistance. */
  readonly softGround: number | null
}

/** Checks that are sums of terms. */
export type SummedCheck = 'sliding' | 'overturning' | 'flotation' | 'skirt'

/** No factor at all, as a basis with global factors has it. */
const GLOBAL: Combination = { permanent: 1, variable: 1, friction: 1 }

/**
 * Every term that enters demand and resistance of a check, in the form in which `globalPairs` and
 * `partialPairs` compute them: the sum of `adds` is the demand; that of the resistance, times
 * friction over its factor, is the resistance, unless soft ground bears less. Terms that are zero are
 * left out.
 *
 * @remarks Expects a case inside `SECTION_RANGES`.
 */
export function checkTerms(section: SectionCase, check: SummedCheck): CheckTerms {
  const state = sectionState(section)
  if (check === 'sliding') return slidingTerms(state)
  if (check === 'overturning') return overturningTerms(state)
  return check === 'flotation' ? flotationTerms(state) : skirtTerms(state)
}

/** The sum of the terms [N/m] or [N]. */
export function sumOfTerms(terms: readonly CheckTerm[]): number {
  return terms.reduce((sum, { adds }) => sum + adds, 0)
}

type Draft = readonly [TermId, number, number, CheckTerm['slope']?]

function termsOf({ geometry }: SectionState, drafts: readonly Draft[]): readonly CheckTerm[] {
  const { sinFall, cosFall } = geometry
  return drafts.flatMap(([id, value, factor, along = null]) => {
    const isLevel = sinFall === 0
    const turn = along === 'cos' ? cosFall : along === 'sin' ? sinFall : 1
    const slope = isLevel ? null : along
    return value === 0 || turn === 0
      ? []
      : [{ id, value, factor, slope, adds: value * factor * turn }]
  })
}

function worseCombination(state: SectionState): 1 | 2 {
  const [first, second] = ([1, 2] as const).map(
    (which) => compare(partialSliding(state, which), 1).utilisation,
  )
  return isWorse(second!, first!) ? 2 : 1
}

function loadDrafts(
  loads: HorizontalLoads,
  measure: 'force' | 'moment',
  { permanent, variable }: { permanent: number; variable: number },
  slope: CheckTerm['slope'] = null,
): readonly Draft[] {
  return [
    ['still', loads.still[measure], permanent, slope],
    ['current', loads.current[measure], variable, slope],
    ['wave', loads.wave[measure], variable, slope],
    ['debris', loads.debris[measure], variable, slope],
    ['dry', loads.dry[measure], -permanent, slope],
  ]
}

function slidingTerms(state: SectionState): CheckTerms {
  const { basis, horizontal, vertical, section } = state
  const combination = basis.format === 'partial' ? worseCombination(state) : null
  const factors = combination === null ? GLOBAL : combination === 1 ? COMBINATION_1 : COMBINATION_2
  const { permanent, friction } = factors
  const { self, lift, dryLift, skirtWater, uplift } = vertical
  const loads = loadDrafts(horizontal, 'force', factors)
  const effect = loads.reduce((sum, [, value, factor]) => sum + value * factor, 0)
  return {
    combination,
    demand: termsOf(state, [
      ...loadDrafts(horizontal, 'force', factors, 'cos'),
      ['self', self, 1, 'sin'],
      ['lift', lift, -permanent, 'sin'],
      ['dryLift', dryLift, -permanent, 'sin'],
    ]),
    resistance: termsOf(state, [
      ['skirtWater', skirtWater, permanent],
      ['self', self, 1, 'cos'],
      ['lift', lift, -permanent, 'cos'],
      ['dryLift', dryLift, -permanent, 'cos'],
      ['loads', effect, -1, 'sin'],
      ['uplift', uplift.force, -permanent],
    ]),
    friction: section.ground.friction,
    frictionFactor: friction,
    softGround: softGroundLimit(state, combination),
  }
}

/** The resistance where the undrained strength of soft ground bounds it. */
function softGroundLimit(state: SectionState, combination: 1 | 2 | null): number | null {
  const pairOf = (of: SectionState) =>
    combination === null ? globalPairs(of).sliding : partialSliding(of, combination)
  if (!isSoft(state.section)) return null
  const rubbing = withoutSoftGround(state.section)
  const { resistance } = pairOf(state)
  return resistance < pairOf({ ...state, section: rubbing }).resistance ? resistance : null
}

const UNMULTIPLIED = {
  combination: null,
  friction: 1,
  frictionFactor: 1,
  softGround: null,
} as const

function overturningTerms(state: SectionState): CheckTerms {
  const { basis, horizontal, vertical } = state
  const isPartial = basis.format === 'partial'
  const holding = isPartial ? EQU.favourable : 1
  return {
    ...UNMULTIPLIED,
    demand: termsOf(state, loadDrafts(horizontal, 'moment', isPartial ? EQU : GLOBAL)),
    resistance: termsOf(state, [
      ['onSkirt', vertical.waterMoment, holding],
      ['self', vertical.selfMoment, holding],
      ['uplift', vertical.uplift.moment, -holding],
    ]),
  }
}

/** With partial factors the lifts are unfavourable; with global ones they are taken off what presses. */
function flotationTerms(state: SectionState): CheckTerms {
  const { skirtWater, self, lift, dryLift, uplift } = state.vertical
  const isPartial = state.basis.format === 'partial'
  const { unfavourable, favourable } = isPartial ? UPL : { unfavourable: 1, favourable: 1 }
  const lifts = (factor: number): readonly Draft[] => [
    ['lift', lift, factor],
    ['dryLift', dryLift, factor],
  ]
  return {
    ...UNMULTIPLIED,
    demand: termsOf(state, [
      ['uplift', uplift.force, unfavourable],
      ...(isPartial ? lifts(unfavourable) : []),
    ]),
    resistance: termsOf(state, [
      ['skirtWater', skirtWater, favourable],
      ['self', self, favourable],
      ...(isPartial ? [] : lifts(-1)),
    ]),
  }
}

/** The grip by friction alone, and what soft ground leaves of it where that is less. */
function skirtTerms(state: SectionState): CheckTerms {
  const { basis, gripWith, section, horizontal } = state
  const factors = basis.format === 'partial' ? COMBINATION_2 : GLOBAL
  const { friction, cohesion = 1 } = factors
  const rubbing = sectionState(withoutSoftGround(section)).grip
  const borne = gripWith({ friction, cohesion })
  return {
    ...UNMULTIPLIED,
    demand: termsOf(state, loadDrafts(horizontal, 'force', factors)),
    resistance: termsOf(state, [['grip', rubbing, 1]]),
    frictionFactor: friction,
    softGround: isSoft(section) && borne < rubbing / friction ? borne : null,
  }
}

function isSoft({ ground }: SectionCase): boolean {
  return (ground.undrainedStrength ?? null) !== null
}

function withoutSoftGround(section: SectionCase): SectionCase {
  return { ...section, ground: { ...section.ground, undrainedStrength: null } }
}
