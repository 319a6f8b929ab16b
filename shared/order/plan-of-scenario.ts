import { deploymentPlan } from '../deployment/deployment-plan'
import type { BandLevels } from '../deployment/groundwork'
import type { MobilisingDepot } from '../deployment/mobilisation'
import { wholeSeries } from '../forecast/whole-series'
import { deploymentSettingsSchema, type DeploymentPlan } from '../schemas/deployment'
import type { Forecast } from '../schemas/forecast'
import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent } from '../schemas/scenario'

interface Planned {
  readonly survey: Survey
  readonly content: ScenarioContent
  readonly depots: readonly MobilisingDepot[]
  readonly forecast: Forecast | null
  /** Stands in for a decision that nobody has entered, where there is no forecast [ms]. */
  readonly now: number
}

/** The plan of a scenario, as its deployment page shows it; without settings the usual ones. */
export function planOfScenario(planned: Planned): DeploymentPlan {
  const { survey, content, depots, forecast, now } = planned
  // Contents that were stored before a field was there lack it.
  const settings = content.deployment ?? deploymentSettingsSchema.parse({})
  const decidedAt = settings.decidedAt ?? forecast?.issuedAt ?? now
  const levels = forecast ? levelsOf(forecast) : {}
  return deploymentPlan({ survey, content, settings: { ...settings, decidedAt }, depots, levels })
}

function levelsOf(forecast: Forecast): BandLevels {
  const expected = wholeSeries(forecast, 'expected')
  const hasBand = forecast.readings.some(({ low, high }) => low !== null || high !== null)
  if (!hasBand) return { expected }
  return { expected, low: wholeSeries(forecast, 'low'), high: wholeSeries(forecast, 'high') }
}
