import type { UnitSystem } from '../units'
import type { CourseScene, Topic } from './course'
import { gripFigures, groundsFigures, leaveFigures, pondFigures } from './figures-of-levels'
import { creepFigures, floatsFigures, pushFigures, unrollFigures } from './figures-of-weights'
import { nightFigures, punctureFigures, windFigures } from './figures-of-troubles'
import type { SceneFigures, Shown } from './messages'
import type { DemoSetting } from './setting'

export type { SceneFigures } from './messages'

const FIGURES: Readonly<Record<Topic, (shown: Shown) => SceneFigures>> = {
  push: pushFigures,
  floats: floatsFigures,
  unroll: unrollFigures,
  grip: gripFigures,
  creep: creepFigures,
  grounds: groundsFigures,
  night: nightFigures,
  puncture: punctureFigures,
  wind: windFigures,
  pond: pondFigures,
  leave: leaveFigures,
}

/** Figures of a scene for what is on show now; all of them from the engine. */
export function sceneFigures(
  scene: CourseScene,
  setting: DemoSetting,
  units: UnitSystem,
): SceneFigures {
  return FIGURES[scene.topic]({ setting, start: scene.start, units })
}
