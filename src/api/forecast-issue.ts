import type { Forecast, RestingForecast } from '@shared/schemas/forecast'
import { projectPath } from './projects'
import { getJson } from './request'

/** The forecast issue that a scenario rests on, with its readings. */
export async function fetchForecastIssue(
  projectId: string,
  { gaugeId, forecastId }: Pick<RestingForecast, 'gaugeId' | 'forecastId'>,
  signal?: AbortSignal,
): Promise<Forecast> {
  const gauge = `${projectPath(projectId)}/gauges/${encodeURIComponent(gaugeId)}`
  return (await getJson(`${gauge}/forecasts/${encodeURIComponent(forecastId)}`, signal)) as Forecast
}
