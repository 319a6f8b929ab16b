import {
  checkingRefusal,
  type MovableSheet,
  type MoveRefusal,
  type SheetActor,
} from '../../../shared/access/sheet-moves'
import type { SheetSettings } from '../../../shared/schemas/sheet-api'
import type { SheetStatus } from '../../../shared/schemas/sheet-status'
import { draftWords } from '../../../shared/sheet/draft-words'
import type { Db } from '../../db/client'
import { ConflictError, ForbiddenError, NotFoundError } from '../../errors'
import { openProject } from '../projects/open-project'
import type { SheetPlace } from './sheet-work'
import { findSettings, findSheet, type SheetRow } from './sheets.queries'

/** What a project has where nobody chose. */
export const DEFAULT_SETTINGS: SheetSettings = {
  numberPattern: 'S-###',
  separateApprover: 'by-category',
}

/** Why something is not for somebody, in words. */
export const REFUSAL_WORDS: Readonly<Record<MoveRefusal, string>> = {
  'not-preparer': 'Only whoever prepared the sheet does this.',
  'may-not-check': 'This needs the permission to check.',
  'own-sheet': 'Nobody checks or approves their own sheet.',
  'same-organisation': 'A sheet of category 3 is checked by another organisation.',
  'may-not-approve': 'This needs the permission to approve.',
  'own-check': 'Whoever checked this sheet does not approve it as well.',
  'not-lead-or-approver': 'Only a lead of the project or an approver does this.',
  'not-editor': 'Only leads and editors of the project do this.',
  'program-only': 'This happens by itself when the next revision comes.',
}

/** Before a draft is checked anybody may still write to it. */
export const OPEN_STATUSES: readonly SheetStatus[] = ['draft', 'in-checking', 'returned', 'checked']
export const EDITABLE_STATUSES: readonly SheetStatus[] = ['draft', 'returned']
export const IN_FORCE: readonly SheetStatus[] = ['approved', 'issued-for-information']

export function settingsOf(db: Db, projectId: string): SheetSettings {
  const { numberPattern, separateApprover } = findSettings(db, projectId) ?? DEFAULT_SETTINGS
  return { numberPattern, separateApprover }
}

/** @throws NotFoundError */
export function sheetAt(db: Db, { projectId, sheetId }: SheetPlace): SheetRow {
  const row = findSheet(db, projectId, sheetId)
  if (!row) throw new NotFoundError(`sheet: "${sheetId}" does not exist in this project`)
  return row
}

/** @throws NotFoundError, or ConflictError while the project is archived. */
export function openSheet(db: Db, place: SheetPlace): SheetRow {
  openProject(db, place.projectId)
  return sheetAt(db, place)
}

/** What of a row decides who may move it. */
export function movable(db: Db, row: SheetRow): MovableSheet {
  const { separateApprover } = settingsOf(db, row.projectId)
  const { status, category, preparedBy, preparedFor, checkedBy } = row
  return { status, category, preparedBy, preparedFor, checkedBy, separateApprover }
}

export const nameOf = ({ number, revision }: SheetRow) => `${number} rev ${revision}`

export const sheetSubject = (row: SheetRow) => ({
  subjectType: 'sheet',
  subjectId: row.id,
  subjectName: nameOf(row),
})

/** @throws ConflictError where a sheet does not stand in one of the statuses. */
export function assertStatus(row: SheetRow, allowed: readonly SheetStatus[], what: string): void {
  if (allowed.includes(row.status)) return
  throw new ConflictError(`${nameOf(row)} is ${row.status}: ${what}`)
}

export function assertPreparer(row: SheetRow, { accountId }: SheetActor): void {
  if (row.preparedBy !== accountId) throw new ForbiddenError(REFUSAL_WORDS['not-preparer'])
}

/** Only who may check a sheet marks its lines, and only while it is being checked. */
export function assertChecking(db: Db, row: SheetRow, actor: SheetActor): void {
  assertStatus(row, ['in-checking'], 'lines are ticked while a sheet is in checking')
  const refusal = checkingRefusal(movable(db, row), actor)
  if (refusal) throw new ForbiddenError(REFUSAL_WORDS[refusal])
}

export function isEditor({ member }: SheetActor): boolean {
  return member === 'lead' || member === 'editor'
}

/** @throws ConflictError with the words that are there now, where somebody changed the sheet meanwhile. */
export function assertSheetVersion(row: SheetRow, madeOn: number): void {
  if (row.version === madeOn) return
  throw new ConflictError(
    `${nameOf(row)} was changed meanwhile: version ${row.version} is there, ` +
      `yours was made on ${madeOn}. Load it again, then repeat your change.`,
    { version: row.version, ...draftWords(row.content) },
  )
}
