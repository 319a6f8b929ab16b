import { evaluateSection, type SectionEvaluation } from '../checks/evaluate-section'
import { compare } from '../checks/compare'
import type { Verdict } from '../schemas/section-result'
import { windOn } from './answers'
import { sectionOf, type DemoSetting } from './setting'
import { checkBasis } from '../catalogue/check-bases'

/** What a scene shows of the engine: an evaluation, and the verdict that may stand beside it. */
export interface DemoEvaluation {
  readonly evaluation: SectionEvaluation
  readonly verdict: Verdict
}

const WORSE: readonly Verdict[] = ['notChecked', 'holds', 'narrow', 'fails']

/**
 * The engine's answer and the verdict that is shown. A tube without its skirt is never said to hold, not
 * even on dry ground, and an empty tube not in a gust against which it has not enough grip.
 */
export function demoEvaluation(setting: DemoSetting): DemoEvaluation {
  const evaluation = evaluateSection(sectionOf(setting))
  if (setting.values.skirtLength === 0) return { evaluation, verdict: 'fails' }
  const wind = windVerdict(setting)
  const isWorse = WORSE.indexOf(wind) > WORSE.indexOf(evaluation.verdict)
  return { evaluation, verdict: isWorse ? wind : evaluation.verdict }
}

/** Wind acts on the empty tube; once water stands on the skirt, the other checks speak. */
function windVerdict(setting: DemoSetting): Verdict {
  const { gust, depth } = setting.values
  if (gust === 0 || depth > 0) return 'notChecked'
  const { force, resistance } = windOn(setting, gust)
  const { sliding } = checkBasis(sectionOf(setting).basis)
  return compare({ demand: force, resistance }, sliding).verdict
}
