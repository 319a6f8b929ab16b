import { stretchesOf } from '../calc/series/time-series'
import { leaveTime } from '../checks/event/leave-time'
import { leaveLevel } from '../checks/leave-level'
import type { LineAnswer } from '../checks/line-check'
import { wholeSeries } from '../forecast/whole-series'
import type { Order } from '../schemas/order'
import type { ScenarioContent } from '../schemas/scenario'
import type { OrderForecast } from './order-input'

type Leave = Omit<Order['leave'], 'stage'>

/**
 * When everybody leaves the line: one level for all of it, below what its weakest section holds. The
 * rise is the one of the scenario or the one of the forecast, whichever asks for the lower level.
 */
export function orderLeave(
  content: ScenarioContent,
  { weakest }: LineAnswer,
  resting: OrderForecast | null,
): Leave {
  const { waterLevel, levelNow, rateOfRise, timeToClear } = content
  if (weakest.holdsToLevel === null) return { state: 'none', level: null, at: null, margin: 0 }
  // Depths count from any one height: only differences matter here.
  const datum = Math.min(weakest.groundLevel, weakest.holdsToLevel)
  const holdsTo = weakest.holdsToLevel - datum
  const asked = leaveLevel({
    ...{ holdsToDepth: holdsTo, holdsFrom: 0, depth: waterLevel - datum },
    ...{ depthNow: levelNow === null ? null : levelNow - datum, rateOfRise, timeToClear },
  })
  const told = forecastLeave(resting, { groundLevel: datum, holdsTo, timeToClear })
  const margin = Math.max(asked.margin, told?.margin ?? 0)
  if (asked.depth === null) return { state: 'none', level: null, at: null, margin }
  const level = weakest.holdsToLevel - margin
  return {
    state: stateAt(level, content, asked.state),
    level,
    at: momentOf(resting, level),
    margin,
  }
}

function forecastLeave(
  resting: OrderForecast | null,
  section: { readonly groundLevel: number; readonly holdsTo: number; readonly timeToClear: number },
) {
  const stretches = resting ? stretchesOf(wholeSeries(resting.forecast, resting.band)) : []
  return stretches.length === 0 ? null : leaveTime({ ...section, stretches, holdsFrom: 0 })
}

function stateAt(
  level: number,
  { waterLevel, levelNow }: ScenarioContent,
  asked: Leave['state'],
): Leave['state'] {
  if (levelNow !== null && levelNow >= level) return 'leave-now'
  return asked === 'leave-at' && waterLevel > level ? 'leave-before-level' : asked
}

/** First moment at which the forecast stands at a level [ms]; null: it does not. */
function momentOf(resting: OrderForecast | null, level: number): number | null {
  if (!resting) return null
  for (const stretch of stretchesOf(wholeSeries(resting.forecast, resting.band))) {
    const hit = stretch.findIndex(({ value }) => value >= level)
    if (hit < 0) continue
    const [a, b] = [stretch[hit - 1], stretch[hit]!]
    if (!a) return b.time * 1000
    const share = (level - a.value) / (b.value - a.value)
    return Math.floor((a.time + share * (b.time - a.time)) * 1000)
  }
  return null
}
