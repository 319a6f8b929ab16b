import { frictionResistance, type StrengthFactors } from '../calc/section/friction-resistance'
import { isWorse, compare, type DemandAndResistance } from './compare'
import { skinDemand, type StabilityPairs } from './global-checks'
import type { SectionState } from './section-state'

/** Partial factors on permanent and variable actions, on tan φ and on c_u (1 where left out). */
export interface Combination {
  readonly permanent: number
  readonly variable: number
  readonly friction: number
  readonly cohesion?: number
}

/** EN 1997-1:2004, tables A.3 and A.4: sets A1 + M1 and A2 + M2. */
export const COMBINATION_1: Combination = { permanent: 1.35, variable: 1.5, friction: 1 }
export const COMBINATION_2: Combination = {
  permanent: 1,
  variable: 1.3,
  friction: 1.25,
  cohesion: 1.4,
}

/** Loss of equilibrium. EN 1997-1:2004, table A.1. */
export const EQU = { permanent: 1.1, variable: 1.5, favourable: 0.9 }

/** Uplift by water pressure. EN 1997-1:2004, table A.15. */
export const UPL = { unfavourable: 1, favourable: 0.9 }

/** Partial factor on the strength of coated fabric. Common practice. */
const FABRIC_FACTOR = 3

/**
 * Demand and resistance of sliding in one combination. Still water and weight are permanent;
 * current, waves and debris are variable. One source, one factor: the water that presses and the
 * water that holds carry the same factor.
 */
export function partialSliding(state: SectionState, which: 1 | 2): DemandAndResistance {
  const combination = which === 1 ? COMBINATION_1 : COMBINATION_2
  const { permanent, variable } = combination
  const { geometry, vertical, section } = state
  const { sinFall, cosFall } = geometry
  const effect = factoredThrust(state, permanent, variable)
  const lifts = vertical.lift + vertical.dryLift
  const normal =
    permanent * (vertical.skirtWater - lifts * cosFall - vertical.uplift.force) +
    vertical.self * cosFall -
    effect * sinFall
  return {
    demand: effect * cosFall + (vertical.self - permanent * lifts) * sinFall,
    resistance: frictionResistance(
      section.ground,
      { normal, length: geometry.base },
      strengthFactors(combination),
    ),
  }
}

function strengthFactors({ friction, cohesion = 1 }: Combination): StrengthFactors {
  return { friction, cohesion }
}

function factoredThrust({ horizontal }: SectionState, permanent: number, variable: number): number {
  const { still, dry, current, wave, debris } = horizontal
  return (
    permanent * (still.force - dry.force) + variable * (current.force + wave.force + debris.force)
  )
}

/**
 * Pairs for the basis with partial factors, resistance over effect, required 1:
 * GEO combinations 1 and 2 for sliding (the worse), EQU for overturning, UPL for flotation.
 *
 * It puts no margin on the level: the depth must already be the most unfavourable.
 *
 * @see EN 1997-1:2004+A1:2013, 2.4.6.1(6)P and Annex A.
 */
export function partialPairs(state: SectionState): StabilityPairs {
  const { section, horizontal, vertical } = state
  const { still, dry, current, wave, debris } = horizontal
  const first = partialSliding(state, 1)
  const second = partialSliding(state, 2)
  const usedFirst = compare(first, 1).utilisation
  const usedSecond = compare(second, 1).utilisation
  const permanentMoment = still.moment - dry.moment
  const variableMoment = current.moment + wave.moment + debris.moment

  return {
    sliding: isWorse(usedSecond, usedFirst) ? second : first,
    overturning: {
      demand: EQU.permanent * permanentMoment + EQU.variable * variableMoment,
      resistance:
        EQU.favourable * (vertical.waterMoment + vertical.selfMoment - vertical.uplift.moment),
    },
    flotation: {
      demand: UPL.unfavourable * (vertical.uplift.force + vertical.lift + vertical.dryLift),
      resistance: UPL.favourable * (vertical.skirtWater + vertical.self),
    },
    skirt: {
      demand: factoredThrust(state, COMBINATION_2.permanent, COMBINATION_2.variable),
      resistance: state.gripWith(strengthFactors(COMBINATION_2)),
    },
    fabric: {
      demand: COMBINATION_1.permanent * skinDemand(state),
      resistance: (section.barrier.fabricStrength ?? 0) / FABRIC_FACTOR,
    },
  }
}
