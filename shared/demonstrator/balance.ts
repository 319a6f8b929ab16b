import { evaluateSection, type SectionEvaluation } from '../checks/evaluate-section'
import { sectionOf, withValues, type DemoSetting, type DemoValues } from './setting'

/** Push of the water against the grip of the barrier, as the engine has both. */
export interface Balance {
  /** Everything that pushes towards the dry side [N/m]. */
  readonly push: number
  /** What the barrier can hold against it [N/m]: the lesser of sliding and skirt pull; never below 0. */
  readonly grip: number
}

/** Push and grip of an evaluated section; where no shape stands there is no grip. */
export function balanceOf({ thrust, workings }: SectionEvaluation): Balance {
  const grip = Math.min(workings.sliding.resistance, workings.skirt.resistance)
  return { push: thrust.total, grip: Math.max(0, grip) }
}

/** The same for a setting with other figures. */
export function balanceAt(setting: DemoSetting, values: Partial<DemoValues> = {}): Balance {
  return balanceOf(evaluateAt(setting, values))
}

/** The engine's answer for a setting with other figures. */
export function evaluateAt(
  setting: DemoSetting,
  values: Partial<DemoValues> = {},
): SectionEvaluation {
  return evaluateSection(sectionOf(withValues(setting, values)))
}

/** Depths that are looked at on the way up, in diameters, and the width of a found edge [m]. */
const STEP = 0.005
const EDGE = 1e-6

/**
 * The lowest value at which something is true that was not true before, by steps and halving.
 *
 * @param reach Greatest value that is looked at; `step` how far apart.
 * @returns null where it is not true anywhere.
 */
export function firstValue(
  isReached: (value: number) => boolean,
  reach: number,
  step: number,
): number | null {
  let below = 0
  for (let index = 1; index * step <= reach + 1e-12; index += 1) {
    let above = index * step
    if (!isReached(above)) {
      below = above
      continue
    }
    while (above - below > EDGE) {
      const middle = (below + above) / 2
      if (isReached(middle)) above = middle
      else below = middle
    }
    return above
  }
  return null
}

/** The lowest depth up to one diameter at which something is true [m]; null: none. */
export function firstDepth(
  setting: DemoSetting,
  isReached: (evaluation: SectionEvaluation) => boolean,
): number | null {
  const { diameter } = setting.tube
  return firstValue((depth) => isReached(evaluateAt(setting, { depth })), diameter, STEP * diameter)
}
