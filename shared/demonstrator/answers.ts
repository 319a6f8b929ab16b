import { puncture } from '../calc/air/puncture'
import { windOnEmptyBarrier, type WindDemand } from '../calc/wind/wind-on-empty-barrier'
import { checkBasis } from '../catalogue/check-bases'
import { holdingProfile, holdsToAt } from '../checks/holds-to'
import { leaveLevel, type LeaveLevel } from '../checks/leave-level'
import { pondLimit } from '../checks/pond-limit'
import { EDGE_FACTORS } from '../checks/what-decides'
import type { HoldsTo } from '../schemas/section-result'
import { balanceAt, balanceOf, evaluateAt, firstDepth, firstValue } from './balance'
import type { CourseScene, Topic } from './course'
import { valuesAt, scriptDuration } from './motion'
import { sectionOf, type DemoSetting } from './setting'

/** What a scene asks for, in the setting in which the script ends. */
type Answer = (setting: DemoSetting, start: DemoSetting) => number | null

const ANSWERS: Readonly<Record<Topic, Answer>> = {
  push: (setting) => balanceAt(setting).push / sectionOf(setting).gravity,
  floats: (setting) => lostDepth(setting),
  unroll: (setting) => evaluateAt(setting).anchoringMassPerSection / setting.tube.sectionLength,
  grip: (setting) => crossingDepth(setting),
  creep: (setting) => gripLost(setting),
  grounds: (setting) => wholeMillimetres(holdsToOf(setting).depth),
  night: (setting, start) => crestSunk(setting, start),
  puncture: (setting) => throughOneSection(setting).steady,
  wind: (setting) => slidingGust(setting),
  pond: (setting) => wholeMillimetres(pondLimit(sectionOf(setting))?.dryDepth ?? null),
  leave: (setting) => wholeMillimetres(leaveOf(setting).depth),
}

/** Limits are rounded down to 1 mm, so that the water stops where the figure says, on the safe side. */
function wholeMillimetres(depth: number | null): number | null {
  return depth === null ? null : Math.floor(depth * 1000 + 1e-9) / 1000
}

/**
 * The answer of a scene for the setting as it stands now, SI units; null where there is none.
 *
 * @param setting What is on show; legs of the script are played to their end first, so that the
 * answer is that of the end and does not move while the water rises.
 */
export function sceneAnswer(scene: CourseScene, setting: DemoSetting): number | null {
  const fixed = scene.legs.filter(({ to }) => to !== 'answer')
  const values = valuesAt(setting.values, fixed, null, scriptDuration(fixed))
  return ANSWERS[scene.topic]({ ...setting, values }, scene.start)
}

/** Depth at which a tube slides or floats away, whichever comes first [m]; physical, no margin. */
export function lostDepth(setting: DemoSetting): number | null {
  return firstDepth(
    setting,
    ({ workings, vertical }) =>
      vertical.net <= 0 || workings.sliding.demand >= workings.sliding.resistance,
  )
}

/** Depth at which the tube no longer rests on the ground [m]: nothing is left of its weight. */
export function floatingDepth(setting: DemoSetting): number | null {
  return firstDepth(setting, ({ vertical }) => vertical.net <= 0)
}

/** Depth at which the push becomes as great as the grip [m]. */
export function crossingDepth(setting: DemoSetting): number | null {
  return firstDepth(setting, (evaluation) => {
    const { push, grip } = balanceOf(evaluation)
    return push >= grip
  })
}

/** Share of the grip that water under the skirt takes at this depth [–]: as it is against sealed. */
export function gripLost(setting: DemoSetting): number | null {
  const sealed = balanceAt(setting, { edgeFactor: EDGE_FACTORS.sealed }).grip
  return sealed > 0 ? 1 - balanceAt(setting).grip / sealed : null
}

/** What the section holds to, with every check and its margin. */
export function holdsToOf(setting: DemoSetting): HoldsTo {
  const section = sectionOf(setting)
  return holdsToAt(holdingProfile(section), section.water.depth)
}

/** The level at which everybody leaves. */
export function leaveOf(setting: DemoSetting): LeaveLevel {
  const { depth, from } = holdsToOf(setting)
  const { rateOfRise, clearingTime, depth: now } = setting.values
  return leaveLevel({
    holdsToDepth: depth,
    holdsFrom: from,
    depth: now,
    rateOfRise,
    timeToClear: clearingTime,
  })
}

/** How far the crest sank since the tube was filled at the temperature of the start [m]. */
export function crestSunk(setting: DemoSetting, { values }: DemoSetting): number | null {
  const { temperature } = values
  const before = evaluateAt(setting, { temperature }).loadedShape
  const now = evaluateAt(setting).loadedShape
  return before.solved && now.solved ? before.crest - now.crest : null
}

/** Water through one section that has gone soft, with the others beside it isolated [m³/s]. */
export function throughOneSection(setting: DemoSetting): { steady: number; firstRush: number } {
  const { tube, values } = setting
  const section = { depth: values.depth, length: tube.sectionLength }
  return puncture([section], 0, 'isolated', sectionOf(setting).gravity)
}

/** Wind on the empty tube, with the sliding factor that the basis asks for. */
export function windOn(setting: DemoSetting, gust: number): WindDemand {
  const { gravity, basis } = sectionOf(setting)
  return windOnEmptyBarrier({
    diameter: setting.tube.diameter,
    mass: setting.tube.mass,
    friction: setting.ground.friction,
    gravity,
    gust,
    required: checkBasis(basis).sliding,
  })
}

/** Gusts that are looked at [m/s]. */
const GREATEST_GUST = 60

/** Gust that moves the empty tube [m/s]: the force of the wind is its whole friction resistance. */
export function slidingGust(setting: DemoSetting): number | null {
  return firstValue(
    (gust) => {
      const { force, resistance } = windOn(setting, gust)
      return force >= resistance
    },
    GREATEST_GUST,
    1,
  )
}
