import type { z } from 'zod'
import type { Scenario } from '@shared/schemas/project'
import type {
  commentChangeSchema,
  newCommentSchema,
  newSheetSchema,
  sheetChangeSchema,
  sheetChangesSchema,
  sheetMarkChangeSchema,
  sheetMoveSchema,
  SheetRecord,
  SheetSettings,
  sheetsPageSchema,
} from '@shared/schemas/sheet-api'
import { queryOf, type ListQuery } from './list-query'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type SheetsPage = z.output<typeof sheetsPageSchema>
export type SheetChanges = z.output<typeof sheetChangesSchema>
export type NewSheet = z.input<typeof newSheetSchema>
export type MarkChange = z.input<typeof sheetMarkChangeSchema>

/** Where a sheet is. */
export interface SheetRef {
  readonly projectId: string
  readonly sheetId: string
}

const path = (projectId: string) => `${projectPath(projectId)}/sheets`
const one = ({ projectId, sheetId }: SheetRef) =>
  `${path(projectId)}/${encodeURIComponent(sheetId)}`

export async function fetchSheets(
  projectId: string,
  query: ListQuery,
  signal?: AbortSignal,
): Promise<SheetsPage> {
  return (await getJson(path(projectId) + queryOf(query), signal)) as SheetsPage
}

/** The project of a sheet: its address names only the sheet. */
export async function fetchSheetRef(sheetId: string, signal?: AbortSignal): Promise<SheetRef> {
  return (await getJson(`/api/sheets/${encodeURIComponent(sheetId)}`, signal)) as SheetRef
}

export async function fetchSheet(sheet: SheetRef, signal?: AbortSignal): Promise<SheetRecord> {
  return (await getJson(one(sheet), signal)) as SheetRecord
}

export async function createSheet(projectId: string, sheet: NewSheet): Promise<SheetRecord> {
  return (await sendJson('POST', path(projectId), sheet)) as SheetRecord
}

/** Changes words of a draft, or takes its figures from its scenario anew. */
export async function changeSheet(
  sheet: SheetRef,
  change: z.input<typeof sheetChangeSchema>,
): Promise<SheetRecord> {
  return (await sendJson('PATCH', one(sheet), change)) as SheetRecord
}

const settingsPath = (projectId: string) => `${projectPath(projectId)}/sheet-settings`

export async function fetchSheetSettings(
  projectId: string,
  signal?: AbortSignal,
): Promise<SheetSettings> {
  return (await getJson(settingsPath(projectId), signal)) as SheetSettings
}

export async function changeSheetSettings(
  projectId: string,
  settings: SheetSettings,
): Promise<SheetSettings> {
  return (await sendJson('PUT', settingsPath(projectId), settings)) as SheetSettings
}

/** The sheet to look at next; null after a draft was deleted. */
export async function moveSheet(
  sheet: SheetRef,
  move: z.input<typeof sheetMoveSchema>,
): Promise<string | null> {
  const answer = (await sendJson('POST', `${one(sheet)}/moves`, move)) as { sheetId: string | null }
  return answer.sheetId
}

export async function markLine(
  sheet: SheetRef,
  line: string,
  mark: MarkChange,
): Promise<SheetRecord> {
  const at = `${one(sheet)}/marks/${encodeURIComponent(line)}`
  return (await sendJson('PUT', at, mark)) as SheetRecord
}

export async function addComment(
  sheet: SheetRef,
  comment: z.input<typeof newCommentSchema>,
): Promise<SheetRecord> {
  return (await sendJson('POST', `${one(sheet)}/comments`, comment)) as SheetRecord
}

export async function changeComment(
  sheet: SheetRef,
  commentId: string,
  change: z.input<typeof commentChangeSchema>,
): Promise<SheetRecord> {
  const at = `${one(sheet)}/comments/${encodeURIComponent(commentId)}`
  return (await sendJson('PATCH', at, change)) as SheetRecord
}

export async function addIssue(sheet: SheetRef, recipient: string): Promise<SheetRecord> {
  return (await sendJson('POST', `${one(sheet)}/issues`, { recipient })) as SheetRecord
}

export async function copySheetInputs(sheet: SheetRef, name: string): Promise<Scenario> {
  return (await sendJson('POST', `${one(sheet)}/scenarios`, { name })) as Scenario
}

export async function fetchSheetChanges(
  sheet: SheetRef,
  signal?: AbortSignal,
): Promise<SheetChanges> {
  return (await getJson(`${one(sheet)}/changes`, signal)) as SheetChanges
}

/** Address of a sheet as a file; the browser downloads it itself. */
export function sheetFile(sheet: SheetRef, form: 'pdf' | 'marked' | 'json' | 'csv'): string {
  return form === 'marked' ? `${one(sheet)}/sheet.pdf?marked=yes` : `${one(sheet)}/sheet.${form}`
}
