import { groundSeepage } from '../calc/ground/ground-seepage'
import { resultant } from '../calc/section/resultant'
import type { SectionCase } from '../schemas/section-case'
import {
  CHECK_IDS,
  type CheckId,
  type CheckResult,
  type LoadedShapeResult,
  type SectionResult,
  type Verdict,
} from '../schemas/section-result'
import { compare, isWorse, notCovered, type DemandAndResistance } from './compare'
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

type StabilityResults = Pick<
  SectionResult,
  'sliding' | 'overturning' | 'flotation' | 'skirt' | 'fabric'
>

function stabilityResults(state: SectionState, pairs: StabilityPairs): StabilityResults {
  const { basis, isReversed, section } = state
  const against = (pair: DemandAndResistance, required: number | null): CheckResult =>
    isReversed ? notCovered(required) : compare(pair, required)
  return {
    sliding: against(pairs.sliding, basis.sliding),
    overturning: against(pairs.overturning, basis.overturning),
    flotation: compare(pairs.flotation, basis.flotation),
    skirt: against(pairs.skirt, basis.sliding),
    fabric:
      section.barrier.fabricStrength === null
        ? { factor: null, required: null, utilisation: null, verdict: 'notChecked' }
        : compare(pairs.fabric, basis.fabric),
  }
}

const UNSUITABLE: CheckResult = {
  factor: null,
  required: null,
  utilisation: null,
  verdict: 'fails',
}

type Checked = Pick<SectionResult, CheckId>

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
  return shape.solved ? { ...shape, skirtGrip: grip } : shape
}

function seepageResult({ section, geometry }: SectionState): Pick<SectionResult, 'seepage'> {
  const { permeability, layerThickness } = section.ground
  if (permeability === null || layerThickness === null) return {}
  if (geometry.base === 0) return { seepage: { perMetre: null } }
  const head = Math.max(0, section.water.depth - section.water.dryDepth)
  const perMetre = groundSeepage({
    permeability,
    head,
    baseWidth: geometry.base,
    layerThickness,
  })
  return { seepage: { perMetre } }
}

function loadResults(state: SectionState) {
  const { horizontal, vertical } = state
  const { still, current, wave, debris, dry, total } = horizontal
  return {
    thrust: {
      still: still.force,
      current: current.force,
      wave: wave.force,
      debris: debris.force,
      dry: dry.force,
      total: total.force,
      arm: total.force === 0 ? null : total.moment / total.force,
    },
    vertical: {
      waterOnSkirt: vertical.waterOnSkirt,
      lift: vertical.lift,
      dryLift: vertical.dryLift,
      self: vertical.self,
      uplift: vertical.uplift.force,
      net: vertical.net,
    },
  }
}

function momentResults({ vertical, horizontal, geometry }: SectionState) {
  const { waterMoment, selfMoment, uplift, net } = vertical
  const { moment } = horizontal.total
  const against = moment + uplift.moment
  return {
    overturningGross: against > 0 ? (waterMoment + selfMoment) / against : null,
    resultant: resultant(waterMoment + selfMoment - uplift.moment - moment, net, geometry.base),
  }
}

/**
 * All checks of one section at its own depth. Cheap: it is called for every frame while the water is
 * dragged, and 200 times for a holds-to level.
 *
 * @remarks Expects a case inside `SECTION_RANGES`.
 */
export function evaluateSection(section: SectionCase): SectionEvaluation {
  const state = sectionState(section)
  const pairs = stabilityPairs(state)
  const checks: Checked = {
    ...stabilityResults(state, pairs),
    freeboard: freeboardCheck(state),
    ...(section.ground.suitable ? {} : { ground: UNSUITABLE }),
  }
  return {
    ...loadResults(state),
    ...checks,
    ...momentResults(state),
    loadedShape: shapeResult(state),
    anchoringMassPerSection:
      (section.barrier.sectionLength * state.vertical.waterOnSkirt) / section.gravity,
    ...seepageResult(state),
    verdict: overallVerdict(checks),
    governs: governing(checks),
    workings: pairs,
  }
}
