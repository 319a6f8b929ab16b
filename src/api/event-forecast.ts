import type { z } from 'zod'
import type { ForecastListItem, forecastsSchema } from '@shared/schemas/forecast'
import { projectPath } from './projects'
import { getJson } from './request'

/** The newest issue of each gauge of a project. */
export async function fetchNewestForecasts(
  projectId: string,
  signal?: AbortSignal,
): Promise<readonly ForecastListItem[]> {
  const answer = await getJson(`${projectPath(projectId)}/forecasts`, signal)
  return (answer as z.output<typeof forecastsSchema>).forecasts
}
