import { groundSeepage } from '../calc/ground/ground-seepage'
import { resultant, type Resultant } from '../calc/section/resultant'
import type { SectionCase } from '../schemas/section-case'
import { CHECK_IDS, type CheckId, type Verdict } from '../schemas/check-ids'
import type { CheckResult, LoadedShapeResult, SectionResult } from '../schemas/section-result'
import { compare, finiteOrNull, isWorse, notCovered, type DemandAndResistance } from './compare'
import { freeboardCheck } from './freeboard-check'
import { globalPairs, type StabilityPairs } from './global-checks'
import { partialPairs } from './partial-checks'
import { sectionState, type SectionState } from './section-state'

/** Demand and resistance behind a check, in N/m, or N for overturning. */
export type Workings = Readonly<Record<keyof StabilityPairs, DemandAndResistance>>

/** Answer for one depth, without the searches over depth and design. */
export interface SectionEvaluation extends Omit<SectionResult, 'holdsTo' | 'justEnough'> {
  readonly workings: Workings
}

/** Stability pairs of a state on its own basis. */
export function stabilityPairs(state: SectionState): StabilityPairs {
  return state.basis.format === 'partial' ? partialPairs(state) : globalPairs(state)
}

/** The pairs with the grip that a missing skirt leaves; what pulls a barrier up is never made less. */
function withGripShare(pairs: StabilityPairs, share: number): StabilityPairs {
  if (share === 1) return pairs
  const less = ({ demand, resistance }: DemandAndResistance): DemandAndResistance => ({
    demand,
    resistance: resistance > 0 ? share * resistance : resistance,
  })
  return { ...pairs, sliding: less(pairs.sliding), skirt: less(pairs.skirt) }
}

type Checked = Pick<SectionResult, CheckId>

const FABRIC_NOT_CHECKED: CheckResult = {
  factor: null,
  required: null,
  utilisation: null,
  verdict: 'notChecked',
}

const UNSUITABLE: CheckResult = {
  factor: null,
  required: null,
  utilisation: null,
  verdict: 'fails',
}

function checkResults(state: SectionState, pairs: StabilityPairs): Checked {
  const { basis, isReversed, section } = state
  const checks: Checked = {
    sliding: against(isReversed, pairs.sliding, basis.sliding),
    overturning: against(isReversed, pairs.overturning, basis.overturning),
    flotation: compare(pairs.flotation, basis.flotation),
    skirt: against(isReversed, pairs.skirt, basis.sliding),
    freeboard: freeboardCheck(state),
    fabric:
      section.barrier.fabricStrength === null
        ? FABRIC_NOT_CHECKED
        : compare(pairs.fabric, basis.fabric),
  }
  if (!section.ground.suitable) checks.ground = UNSUITABLE
  return checks
}

/** A thrust towards the water is not covered: then there is nothing to compare. */
function against(
  isReversed: boolean,
  pair: DemandAndResistance,
  required: number | null,
): CheckResult {
  return isReversed ? notCovered(required) : compare(pair, required)
}

/** The check that is used furthest; ties go to the earlier in the order of `CHECK_IDS`. */
function governing(checks: Checked): CheckId {
  let worst: CheckId = 'sliding'
  let found = false
  for (const id of CHECK_IDS) {
    const check = checks[id]
    if (!check || check.verdict === 'notChecked') continue
    if (!found || isWorse(check.utilisation, checks[worst]!.utilisation)) {
      worst = id
      found = true
    }
  }
  return worst
}

/** Worst verdict of all checks; what is not checked counts nowhere. */
function overallVerdict(checks: Checked): Verdict {
  let overall: Verdict = 'holds'
  for (const id of CHECK_IDS) {
    const verdict = checks[id]?.verdict
    if (verdict === 'fails') return 'fails'
    if (verdict === 'narrow') overall = 'narrow'
  }
  return overall
}

function shapeResult({ shape, grip }: SectionState): LoadedShapeResult {
  if (!shape.solved) return shape
  return {
    solved: true,
    crest: shape.crest,
    contact: shape.contact,
    skinTension: shape.skinTension,
    skirtTension: shape.skirtTension,
    weldHeight: shape.weldHeight,
    freeSkirt: shape.freeSkirt,
    skirtGrip: grip,
  }
}

/** Seepage through the ground; null where permeability or layer are not known. */
function seepageResult({ section, geometry }: SectionState): SectionResult['seepage'] | null {
  const { permeability, layerThickness } = section.ground
  if (permeability === null || layerThickness === null) return null
  if (geometry.base === 0) return { perMetre: null }
  const head = Math.max(0, section.water.depth - section.water.dryDepth)
  const baseWidth = geometry.base
  return { perMetre: groundSeepage({ permeability, head, baseWidth, layerThickness }) }
}

function thrustResult({ horizontal }: SectionState): SectionResult['thrust'] {
  const { still, current, wave, debris, dry, total } = horizontal
  return {
    still: still.force,
    current: current.force,
    wave: wave.force,
    debris: debris.force,
    dry: dry.force,
    total: total.force,
    arm: total.force === 0 ? null : total.moment / total.force,
  }
}

function verticalResult({ vertical }: SectionState): SectionResult['vertical'] {
  return {
    waterOnSkirt: vertical.waterOnSkirt,
    lift: vertical.lift,
    dryLift: vertical.dryLift,
    self: vertical.self,
    uplift: vertical.uplift.force,
    net: vertical.net,
  }
}

/** Gross overturning ratio, as information: it stays near 1.5 under full uplift whatever the skirt. */
function grossRatio({ vertical, horizontal }: SectionState): number | null {
  const against = horizontal.total.moment + vertical.uplift.moment
  return against > 0 ? finiteOrNull((vertical.waterMoment + vertical.selfMoment) / against) : null
}

function resultantOf({ vertical, horizontal, geometry }: SectionState): Resultant {
  const holding = vertical.waterMoment + vertical.selfMoment - vertical.uplift.moment
  return resultant(holding - horizontal.total.moment, vertical.net, geometry.base)
}

/**
 * All checks of one section at its own depth. Cheap: it is called for every frame while the water is
 * dragged, and 200 times for a holds-to level.
 *
 * @param gripShare Share of friction resistance and skirt grip that is there, 0 to 1: less than 1 where
 * skirt is missing at a bend.
 * @remarks Expects a case inside `SECTION_RANGES`.
 */
export function evaluateSection(section: SectionCase, gripShare = 1): SectionEvaluation {
  return evaluateState(sectionState(section), gripShare)
}

/** The same from a state that was found in another way, such as with uplift that grew for hours. */
export function evaluateState(state: SectionState, gripShare = 1): SectionEvaluation {
  const { section } = state
  const pairs = withGripShare(stabilityPairs(state), gripShare)
  const checks = checkResults(state, pairs)
  const seepage = seepageResult(state)
  // Written out field by field: spreading would cost more than the engineering.
  const evaluation: SectionEvaluation = {
    thrust: thrustResult(state),
    vertical: verticalResult(state),
    sliding: checks.sliding,
    overturning: checks.overturning,
    flotation: checks.flotation,
    skirt: checks.skirt,
    fabric: checks.fabric,
    freeboard: checks.freeboard,
    overturningGross: grossRatio(state),
    resultant: resultantOf(state),
    loadedShape: shapeResult(state),
    anchoringMassPerSection:
      (section.barrier.sectionLength * state.vertical.waterOnSkirt) / section.gravity,
    verdict: overallVerdict(checks),
    governs: governing(checks),
    workings: pairs,
  }
  if (checks.ground) evaluation.ground = checks.ground
  if (seepage) evaluation.seepage = seepage
  return evaluation
}
