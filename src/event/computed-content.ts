import type { ScenarioContent } from '@shared/schemas/scenario'

/** What the event is computed from: levels, place, plan and clock change nothing in it. */
export function computedContent(content: ScenarioContent): ScenarioContent {
  return {
    ...content,
    ...{ waterLevel: 0, place: 0, levelNow: null, levelLow: null, levelHigh: null },
    ...{ rateOfRise: null, forecast: null, event: null, deployment: null },
  }
}
