import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { SheetActor } from '../../../shared/access/sheet-moves'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { Sheet } from '../../../shared/schemas/sheet'
import type {
  newSheetSchema,
  sheetChangeSchema,
  SheetSettings,
  sheetsPageSchema,
  sheetsQuerySchema,
} from '../../../shared/schemas/sheet-api'
import { resultOf } from '../../../shared/sheet/scenario-sheet'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import { change, type Deed, noteChange } from '../projects/deed'
import { openProject } from '../projects/open-project'
import { deleteMarks } from './checking.queries'
import {
  assertPreparer,
  assertSheetVersion,
  assertStatus,
  EDITABLE_STATUSES,
  openSheet,
  settingsOf,
  sheetSubject,
} from './open-sheet'
import { dayIn, draftContent, sourced } from './sheet-content'
import { nextNumber, nextRevision } from './sheet-numbers'
import { assertDerives } from './composing'
import { printedPhotographs } from './sheet-photographs'
import type { SheetPlace, SheetWork } from './sheet-work'
import {
  countSheets,
  findOwnSheetProject,
  findSettings,
  insertSheet,
  listRevisions,
  listSheets,
  type SheetRow,
  updateSheet,
  writeSettings,
} from './sheets.queries'

type NewSheet = z.output<typeof newSheetSchema>
type Change = z.output<typeof sheetChangeSchema>

export function readSheets(
  db: Db,
  projectId: string,
  query: z.output<typeof sheetsQuerySchema>,
): z.output<typeof sheetsPageSchema> {
  const items = listSheets(db, projectId, query).map(({ content, ...row }) => {
    const { place, groundLevel, result } = content
    const { from, depth } = result.holdsTo
    const holdsToLevel = from === null || groundLevel === null ? null : groundLevel + depth
    return { ...row, place, verdict: result.verdict, holdsToLevel }
  })
  const total = countSheets(db, projectId, query)
  return { items, page: query.page, pageSize: PAGE_SIZE, total }
}

/** @throws NotFoundError for a sheet of a project that the account is no member of. */
export function placeOfSheet(db: Db, accountId: string, sheetId: string) {
  const found = findOwnSheetProject(db, sheetId, accountId)
  if (!found) throw new NotFoundError(`sheet: "${sheetId}" does not exist in your projects`)
  return { projectId: found.projectId, sheetId }
}

export function changeSettings(
  work: SheetWork,
  actor: SignedIn,
  projectId: string,
  settings: SheetSettings,
): SheetSettings {
  return change(work, actor, (deed) => {
    const { name } = openProject(deed.tx, projectId)
    writeSettings(deed.tx, { projectId, ...settings })
    noteChange(deed, projectId, {
      action: 'sheet.settings-changed',
      ...{ subjectType: 'project', subjectId: projectId, subjectName: name },
      detail: { ...settings },
    })
    return settings
  })
}

/**
 * Makes a draft of a scenario; its number is the next of the project.
 *
 * @returns The id of the sheet.
 * @throws NotFoundError; OutOfRangeError; ConflictError where a line of the derivation does not agree.
 */
export async function createSheet(
  work: SheetWork,
  actor: SignedIn,
  projectId: string,
  input: NewSheet,
): Promise<string> {
  const { db, software } = work
  openProject(db, projectId)
  const { part, columns } = sourced(db, projectId, input)
  const author = { accountId: actor.accountId, software, at: work.now() }
  // Its number is taken when nothing can go wrong any more, so that none is left out.
  const numbered = (number: string) => draftContent(db, projectId, input, { part, number, author })
  await assertDerives(numbered('?'))
  return change(work, actor, (deed) => {
    openProject(deed.tx, projectId)
    const content = numbered(takeNumber(deed, projectId))
    return insertDraft(deed, { projectId, actor, content, columns, previousId: null })
  })
}

function takeNumber({ tx }: Deed, projectId: string): string {
  const settings = settingsOf(tx, projectId)
  const last = (findSettings(tx, projectId)?.lastNumber ?? 0) + 1
  writeSettings(tx, { projectId, ...settings, lastNumber: last })
  return nextNumber(settings.numberPattern, last)
}

interface Draft {
  readonly projectId: string
  readonly actor: Pick<SignedIn, 'organisationId'>
  readonly content: Sheet
  readonly columns: Pick<SheetRow, 'lineId' | 'scenarioId' | 'scenarioVersion' | 'place'>
  readonly previousId: string | null
}

function insertDraft(
  deed: Deed,
  { projectId, actor, content, columns, previousId }: Draft,
): string {
  const { tx, at, by } = deed
  const id = randomUUID() as string
  const { number, revision, status, category } = content
  insertSheet(tx, {
    ...{ id, projectId, number, revision, status, category, content, previousId, ...columns },
    ...{ preparedBy: by.accountId, preparedFor: actor.organisationId },
    ...{ createdAt: at, updatedAt: at, updatedBy: by.accountId },
  })
  noteChange(deed, projectId, {
    action: previousId === null ? 'sheet.created' : 'sheet.revised',
    ...{ subjectType: 'sheet', subjectId: id, subjectName: `${number} rev ${revision}` },
    toVersion: 1,
    detail: { category },
  })
  return id
}

/**
 * Changes words of a draft, or takes its figures from a scenario anew; new figures, or the same in other
 * units, take ticks and own figures away, because they were made on the old ones.
 *
 * @throws ForbiddenError for anybody but the preparer; ConflictError past the draft, or on an older version.
 */
export async function changeSheet(
  work: SheetWork,
  actor: SignedIn,
  place: SheetPlace,
  { version, source, title, photographs, ...words }: Change,
): Promise<void> {
  const before = changeable(work.db, actor, place, version)
  const given = { ...words, title, photographs, source }
  const fields = Object.entries(given).flatMap(([name, value]) =>
    value === undefined ? [] : [name],
  )
  const fresh = source ? sourced(work.db, place.projectId, source) : null
  const content: Sheet = {
    ...{ ...before.content, ...words, ...fresh?.part },
    ...(title === undefined ? {} : { place: title }),
    ...(photographs ? { photographs: await printedPhotographs(work, before, photographs) } : {}),
  }
  const isNew = fresh !== null || content.units !== before.content.units
  if (isNew) await assertDerives(content)
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    const row = changeable(tx, actor, place, version)
    if (isNew) deleteMarks(tx, row.id)
    const changed = { updatedAt: at, updatedBy: by.accountId, version: version + 1 }
    const { category } = content
    updateSheet(tx, row.id, { content, category, ...fresh?.columns, ...changed })
    noteChange(deed, place.projectId, {
      ...sheetSubject(row),
      action: 'sheet.changed',
      fromVersion: version,
      toVersion: version + 1,
      detail: { fields },
    })
  })
}

/** The draft that somebody changes, as it was when they opened it. */
function changeable(db: Db, actor: SignedIn, place: SheetPlace, version: number): SheetRow {
  const row = openSheet(db, place)
  assertStatus(row, EDITABLE_STATUSES, 'only drafts and returned sheets change')
  assertPreparer(row, actor)
  assertSheetVersion(row, version)
  return row
}

/**
 * Begins the next revision from a frozen one: a draft with its inputs and words, computed anew.
 *
 * @throws ConflictError while another revision of the number is under way.
 */
export async function reviseSheet(
  work: SheetWork,
  actor: SignedIn & SheetActor,
  row: SheetRow,
  reason: string,
): Promise<string> {
  const { timeZone } = openProject(work.db, row.projectId)
  assertNewest(work.db, row)
  const content: Sheet = {
    ...row.content,
    ...{ revision: nextRevision(row.revision), revisionReason: reason, status: 'draft' },
    result: resultOf(row.content),
    people: { prepared: null, checked: null, approved: null },
    ...{ checking: null, verification: null, software: work.software },
    date: dayIn(timeZone, work.now()),
  }
  await assertDerives(content)
  return change(work, actor, (deed) => {
    openProject(deed.tx, row.projectId)
    assertNewest(deed.tx, row)
    const { lineId, scenarioId, scenarioVersion, place, projectId } = row
    const columns = { lineId, scenarioId, scenarioVersion, place }
    return insertDraft(deed, { projectId, actor, content, columns, previousId: row.id })
  })
}

function assertNewest(db: Db, row: SheetRow): void {
  const newest = listRevisions(db, row.projectId, row.number).at(-1)!
  if (newest.id === row.id) return
  throw new ConflictError(`${row.number}: revision ${newest.revision} is there already`)
}
