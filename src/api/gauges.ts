import type { z } from 'zod'
import type {
  Gauge,
  gaugeChangeSchema,
  gaugesSchema,
  newGaugeSchema,
} from '@shared/schemas/project'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type NewGauge = z.input<typeof newGaugeSchema>
export type GaugeChange = z.input<typeof gaugeChangeSchema>

const path = (projectId: string) => `${projectPath(projectId)}/gauges`
const one = (projectId: string, gaugeId: string) =>
  `${path(projectId)}/${encodeURIComponent(gaugeId)}`

export async function fetchGauges(projectId: string, signal?: AbortSignal): Promise<Gauge[]> {
  const answer = (await getJson(path(projectId), signal)) as z.output<typeof gaugesSchema>
  return answer.gauges
}

export async function createGauge(projectId: string, gauge: NewGauge): Promise<Gauge> {
  return (await sendJson('POST', path(projectId), gauge)) as Gauge
}

export async function changeGauge(
  projectId: string,
  gaugeId: string,
  change: GaugeChange,
): Promise<Gauge> {
  return (await sendJson('PATCH', one(projectId, gaugeId), change)) as Gauge
}

export async function removeGauge(projectId: string, gaugeId: string): Promise<void> {
  await sendJson('DELETE', one(projectId, gaugeId))
}
