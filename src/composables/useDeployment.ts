import { computed, shallowRef } from 'vue'
import { sandbagWall } from '@shared/deployment/sandbag-wall'
import { compareOrders, gains } from '@shared/deployment/compare-orders'
import { deploymentPlan } from '@shared/deployment/deployment-plan'
import type { BandLevels, DeploymentInput } from '@shared/deployment/groundwork'
import { mobilisation } from '@shared/deployment/mobilisation'
import { lineSections } from '@shared/calc/line/line-sections'
import { wholeSeries } from '@shared/forecast/whole-series'
import { deploymentSettingsSchema, type DeploymentSettings } from '@shared/schemas/deployment'
import type { Depot } from '@shared/schemas/depot'
import type { Forecast } from '@shared/schemas/forecast'
import type { Line } from '@shared/schemas/project'
import type { ScenarioContent } from '@shared/schemas/scenario'
import { ApiError } from '@/api/request'
import { useDeferred } from './useDeferred'
import { useRestingForecast } from './useRestingForecast'

/** Settings of a scenario that nobody has planned yet. */
const BEGINNING: DeploymentSettings = deploymentSettingsSchema.parse({})

const MINUTE = 60_000

export interface DeploymentParts {
  readonly projectId: string
  readonly line: () => Line
  readonly content: () => ScenarioContent
  readonly depots: () => readonly Depot[]
}

function levelsOf(forecast: Forecast | undefined): BandLevels {
  if (!forecast) return {}
  const hasBand = forecast.readings.some(({ low, high }) => low !== null || high !== null)
  const expected = wholeSeries(forecast, 'expected')
  if (!hasBand) return { expected }
  return { expected, low: wholeSeries(forecast, 'low'), high: wholeSeries(forecast, 'high') }
}

function answered(input: DeploymentInput) {
  const { survey, content } = input
  const sections = lineSections(survey.stations, survey.sectionLength, survey.marks)
  return {
    plan: deploymentPlan(input),
    orders: compareOrders(input),
    gains: gains(input),
    sandbags: sandbagWall(sections, content.waterLevel),
  }
}
export type DeploymentAnswer = ReturnType<typeof answered>

/** The deployment plan of a scenario with the forecast that it rests on; it follows what is set. */
export function useDeployment({ projectId, line, content, depots }: DeploymentParts) {
  const resting = computed(() => content().forecast ?? null)
  const { issue: query, state } = useRestingForecast(projectId, resting)
  const forecast = computed(() => (resting.value ? query.data.value : undefined))
  const isLoading = computed(() => resting.value !== null && query.isPending.value)
  const settings = computed(() => content().deployment ?? BEGINNING)
  /** What stands in for a decision that nobody has entered; it does not run on by itself. */
  const now = shallowRef(Math.floor(Date.now() / MINUTE) * MINUTE)
  const decidedAt = computed(
    () => settings.value.decidedAt ?? forecast.value?.issuedAt ?? now.value,
  )
  const problem = computed(() => (query.error.value instanceof ApiError ? query.error.value : null))
  const input = computed((): DeploymentInput => ({
    survey: line(),
    content: content(),
    settings: { ...settings.value, decidedAt: decidedAt.value },
    depots: depots(),
    levels: levelsOf(forecast.value),
  }))
  const { result, isPending } = useDeferred(() => input.value, answered, null)
  const comes = computed(() => mobilisation(depots(), settings.value))
  return {
    settings,
    decidedAt,
    forecast,
    isLoading,
    problem,
    /** Whether a newer issue is there than the one that the scenario rests on. */
    restState: state,
    comes,
    answer: result,
    isPending,
  }
}

export type Deployment = ReturnType<typeof useDeployment>
