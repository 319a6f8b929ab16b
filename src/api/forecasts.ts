import type { z } from 'zod'
import type {
  Forecast,
  ForecastListItem,
  forecastsSchema,
  newForecastSchema,
  newObservedSchema,
} from '@shared/schemas/forecast'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type NewForecast = z.input<typeof newForecastSchema>
export type NewObserved = z.input<typeof newObservedSchema>

export interface GaugeRef {
  readonly projectId: string
  readonly gaugeId: string
}

const path = ({ projectId, gaugeId }: GaugeRef) =>
  `${projectPath(projectId)}/gauges/${encodeURIComponent(gaugeId)}/forecasts`
const one = (gauge: GaugeRef, forecastId: string) =>
  `${path(gauge)}/${encodeURIComponent(forecastId)}`

/** All issues of a gauge, the newest first. */
export async function fetchForecasts(
  gauge: GaugeRef,
  signal?: AbortSignal,
): Promise<readonly ForecastListItem[]> {
  return ((await getJson(path(gauge), signal)) as z.output<typeof forecastsSchema>).forecasts
}

export async function fetchForecast(
  gauge: GaugeRef,
  forecastId: string,
  signal?: AbortSignal,
): Promise<Forecast> {
  return (await getJson(one(gauge, forecastId), signal)) as Forecast
}

export async function createForecast(gauge: GaugeRef, forecast: NewForecast): Promise<Forecast> {
  return (await sendJson('POST', path(gauge), forecast)) as Forecast
}

export async function addObserved(
  gauge: GaugeRef,
  forecastId: string,
  observed: NewObserved,
): Promise<Forecast> {
  return (await sendJson('POST', `${one(gauge, forecastId)}/observed`, observed)) as Forecast
}

export async function removeForecast(gauge: GaugeRef, forecastId: string): Promise<void> {
  await sendJson('DELETE', one(gauge, forecastId))
}
