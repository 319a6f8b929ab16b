import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import { checkingRefusal } from '../../../shared/access/sheet-moves'
import type {
  commentChangeSchema,
  newCommentSchema,
  newIssueSchema,
  sheetMarkChangeSchema,
} from '../../../shared/schemas/sheet-api'
import type { Scenario } from '../../../shared/schemas/project'
import { ForbiddenError, NotFoundError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import { openLine } from '../lines/open-line'
import { change, type Deed, noteChange } from '../projects/deed'
import { scenarioAt } from '../scenarios/open-scenario'
import { makeScenario } from '../scenarios/scenario-rows'
import {
  deleteMark,
  findComment,
  insertComment,
  insertIssue,
  updateComment,
  writeMark,
} from './checking.queries'
import {
  assertChecking,
  assertSheetVersion,
  assertStatus,
  IN_FORCE,
  isEditor,
  movable,
  OPEN_STATUSES,
  openSheet,
  sheetSubject,
} from './open-sheet'
import { linesOf } from './composing'
import type { SheetPlace, SheetWork } from './sheet-work'
import type { SheetRow } from './sheets.queries'

/**
 * Ticks a line, or puts an own figure beside it; neither takes the mark away.
 *
 * @throws NotFoundError for a line that the sheet does not have.
 */
export async function markLine(
  work: SheetWork,
  actor: SignedIn,
  { line, ...place }: SheetPlace & { readonly line: string },
  { isTicked, figure, note }: z.output<typeof sheetMarkChangeSchema>,
): Promise<void> {
  const before = openSheet(work.db, place)
  assertChecking(work.db, before, actor)
  await assertLine(before, line)
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    const row = openSheet(tx, place)
    assertChecking(tx, row, actor)
    assertSheetVersion(row, before.version)
    if (!isTicked && figure === null) deleteMark(tx, row.id, line)
    else writeMark(tx, { sheetId: row.id, line, isTicked, figure, note, at, by: by.accountId })
    noteOn(deed, row, 'sheet.marked', { line })
  })
}

async function assertLine({ content }: SheetRow, line: string): Promise<void> {
  const lines = await linesOf(content)
  if (!lines.has(line)) throw new NotFoundError(`line: "${line}" does not exist in this sheet`)
}

function noteOn(deed: Deed, row: SheetRow, action: string, detail: Record<string, unknown>): void {
  noteChange(deed, row.projectId, { ...sheetSubject(row), action, detail })
}

/** Who takes part in the talk about a sheet: those who check or approve, and those who write. */
export function mayComment(actor: SignedIn): boolean {
  return actor.mayCheck || actor.mayApprove || isEditor(actor)
}

function assertCommenting(row: SheetRow, actor: SignedIn): void {
  assertStatus(row, OPEN_STATUSES, 'comments are made before a sheet is issued')
  if (!mayComment(actor)) throw new ForbiddenError('Readers do not comment.')
}

/** @throws ForbiddenError for readers; ConflictError once the sheet is frozen. */
export async function addComment(
  work: SheetWork,
  actor: SignedIn,
  place: SheetPlace,
  { line, text }: z.output<typeof newCommentSchema>,
): Promise<void> {
  const before = openSheet(work.db, place)
  assertCommenting(before, actor)
  if (line !== null) await assertLine(before, line)
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    const row = openSheet(tx, place)
    assertCommenting(row, actor)
    assertSheetVersion(row, before.version)
    const id = randomUUID() as string
    insertComment(tx, { id, sheetId: row.id, line, text, at, by: by.accountId })
    noteOn(deed, row, 'sheet.commented', { line })
  })
}

/**
 * Answers a comment, or closes or opens it again. Whoever writes in the project answers; whoever made
 * the comment, or may check the sheet, says when it is resolved.
 */
export function changeComment(
  work: SheetWork,
  actor: SignedIn,
  { commentId, ...place }: SheetPlace & { readonly commentId: string },
  { answer, isResolved }: z.output<typeof commentChangeSchema>,
): void {
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    const row = openSheet(tx, place)
    const comment = findComment(tx, row.id, commentId)
    if (!comment) throw new NotFoundError(`comment: "${commentId}" does not exist on this sheet`)
    assertStatus(row, OPEN_STATUSES, 'comments are closed before a sheet is issued')
    if (answer !== undefined) {
      if (!isEditor(actor)) throw new ForbiddenError('Only leads and editors answer comments.')
      updateComment(tx, commentId, { answer, answeredAt: at, answeredBy: by.accountId })
      noteOn(deed, row, 'sheet.answered', { line: comment.line })
    }
    if (isResolved === undefined) return
    const mayResolve =
      comment.by === by.accountId || checkingRefusal(movable(tx, row), actor) === null
    if (!mayResolve) throw new ForbiddenError('Whoever made a comment, or checks, resolves it.')
    const resolved = isResolved ? { resolvedAt: at, resolvedBy: by.accountId } : null
    updateComment(tx, commentId, resolved ?? { resolvedAt: null, resolvedBy: null })
    noteOn(deed, row, 'sheet.resolved', { line: comment.line, isResolved })
  })
}

/** Notes to whom a sheet in force was given. */
export function addIssue(
  work: SheetWork,
  actor: SignedIn,
  place: SheetPlace,
  { recipient, note }: z.output<typeof newIssueSchema>,
): void {
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    const row = openSheet(tx, place)
    assertStatus(row, IN_FORCE, 'only a sheet in force is given to others')
    if (!isEditor(actor) && !actor.mayApprove) {
      throw new ForbiddenError('Leads, editors and approvers keep the issue list.')
    }
    const id = randomUUID() as string
    insertIssue(tx, { id, sheetId: row.id, recipient, note, at, by: by.accountId })
    noteOn(deed, row, 'sheet.listed', { recipient })
  })
}

/** Who may put the inputs of a sheet into a scenario of their own. */
export function mayCopy(actor: SignedIn): boolean {
  return isEditor(actor) || actor.mayCheck
}

/** The inputs of a sheet as a scenario on its line, so that whoever checks can try what they like. */
export function openCopy(
  work: SheetWork,
  actor: SignedIn,
  place: SheetPlace,
  name: string,
): Scenario {
  return change(work, actor, (deed) => {
    const { tx } = deed
    const row = openSheet(tx, place)
    if (!mayCopy(actor)) throw new ForbiddenError('Readers do not open copies.')
    const at = { projectId: row.projectId, lineId: row.lineId }
    const line = openLine(tx, at)
    const { content } = row.content.line!
    const copied = { ...content, place: row.place }
    const note = `${row.number} rev ${row.revision}`
    const scenarioId = makeScenario(deed, line, { name, note, content: copied })
    noteOn(deed, row, 'sheet.copied', { lineId: row.lineId })
    return scenarioAt(tx, { ...at, scenarioId })
  })
}
