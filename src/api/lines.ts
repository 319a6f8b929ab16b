import type { z } from 'zod'
import type {
  Line,
  lineChangeSchema,
  lineListItemSchema,
  linesPageSchema,
  newLineSchema,
} from '@shared/schemas/project'
import { queryOf, type ListQuery } from './list-query'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type LineListItem = z.output<typeof lineListItemSchema>
export type LinesPage = z.output<typeof linesPageSchema>
export type NewLine = z.input<typeof newLineSchema>
export type LineChange = z.input<typeof lineChangeSchema>

/** Where a line is: its project and itself. */
export interface LineRef {
  readonly projectId: string
  readonly lineId: string
}

const path = (projectId: string) => `${projectPath(projectId)}/lines`

/** Address of a line at the API. */
export function linePath({ projectId, lineId }: LineRef): string {
  return `${path(projectId)}/${encodeURIComponent(lineId)}`
}

/** Address of the survey as a file for a spreadsheet. */
export function surveyCsv(line: LineRef): string {
  return `${linePath(line)}/stations.csv`
}

/** Address of the line as GeoJSON. */
export function lineGeoJson(line: LineRef): string {
  return `${linePath(line)}/line.geojson`
}

export async function fetchLines(
  projectId: string,
  query: ListQuery,
  signal?: AbortSignal,
): Promise<LinesPage> {
  return (await getJson(path(projectId) + queryOf(query), signal)) as LinesPage
}

export async function fetchLine(line: LineRef, signal?: AbortSignal): Promise<Line> {
  return (await getJson(linePath(line), signal)) as Line
}

export async function createLine(projectId: string, line: NewLine): Promise<Line> {
  return (await sendJson('POST', path(projectId), line)) as Line
}

export async function changeLine(line: LineRef, change: LineChange): Promise<Line> {
  return (await sendJson('PATCH', linePath(line), change)) as Line
}

export async function duplicateLine(line: LineRef, name: string): Promise<Line> {
  return (await sendJson('POST', `${linePath(line)}/duplicates`, { name })) as Line
}

export async function archiveLine(line: LineRef): Promise<Line> {
  return (await sendJson('POST', `${linePath(line)}/archive`)) as Line
}

export async function restoreLine(line: LineRef): Promise<Line> {
  return (await sendJson('POST', `${linePath(line)}/restoration`)) as Line
}
