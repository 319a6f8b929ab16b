import type { z } from 'zod'
import { decideMove, type MoveRow, type SheetMove } from '../../../shared/access/sheet-moves'
import { InvalidInputError } from '../../../shared/errors'
import type { sheetMoveSchema } from '../../../shared/schemas/sheet-api'
import type { Db } from '../../db/client'
import { ConflictError, ForbiddenError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import { change, type Deed, noteChange } from '../projects/deed'
import { insertMove } from './checking.queries'
import { contentAfter } from './content-after'
import { type Frozen, freezeSheet } from './freeze-sheet'
import {
  assertSheetVersion,
  movable,
  nameOf,
  openSheet,
  REFUSAL_WORDS,
  sheetSubject,
} from './open-sheet'
import { type Notice, queueNotice } from './sheet-mails'
import { reviseSheet } from './sheets.service'
import type { SheetPlace, SheetWork } from './sheet-work'
import {
  deleteSheet,
  insertSheetFile,
  listInForce,
  type SheetRow,
  updateSheet,
} from './sheets.queries'

type Wanted = z.output<typeof sheetMoveSchema>

/** What the audit trail calls a move. */
const DEEDS: Readonly<Record<SheetMove, string>> = {
  submit: 'sheet.submitted',
  check: 'sheet.checked',
  return: 'sheet.returned',
  approve: 'sheet.approved',
  'issue-for-information': 'sheet.issued',
  withdraw: 'sheet.withdrawn',
  revise: 'sheet.revised',
  delete: 'sheet.deleted',
  supersede: 'sheet.superseded',
}

const NOTICES: Readonly<Partial<Record<SheetMove, Notice['kind']>>> = {
  submit: 'sheetReview',
  check: 'sheetChecked',
  return: 'sheetReturned',
  approve: 'sheetApproved',
  supersede: 'sheetSuperseded',
}

/**
 * Makes a move of the table.
 *
 * @returns The sheet to look at next: the new draft after `revise`; null after `delete`.
 * @throws ConflictError for a move that does not begin where the sheet stands, or on an older version;
 * ForbiddenError for whoever may not make it; InvalidInputError without the reason that it needs.
 */
export async function makeMove(
  work: SheetWork,
  actor: SignedIn,
  place: SheetPlace,
  wanted: Wanted,
): Promise<string | null> {
  const row = openSheet(work.db, place)
  assertMove(work.db, actor, row, wanted)
  if (wanted.move === 'revise') return reviseSheet(work, actor, row, wanted.reason)
  if (wanted.move === 'delete') {
    deleteDraft(work, actor, place, wanted)
    return null
  }
  const frozen = await frozenFor(work, actor, row, wanted)
  change(work, actor, (deed) => {
    const now = openSheet(deed.tx, place)
    const rule = assertMove(deed.tx, actor, now, wanted)
    applyMove(deed, { work, row: now, rule, reason: wanted.reason, frozen })
  })
  return row.id
}

function assertMove(db: Db, actor: SignedIn, row: SheetRow, wanted: Wanted): MoveRow {
  const { move, version, reason } = wanted
  const decision = decideMove(move, movable(db, row), actor)
  if (decision.outcome === 'conflict') {
    throw new ConflictError(`${nameOf(row)} is ${row.status}: "${move}" does not begin there.`)
  }
  if (decision.outcome === 'forbidden') throw new ForbiddenError(REFUSAL_WORDS[decision.refusal])
  assertSheetVersion(row, version)
  if (decision.row.needsReason && reason === '') throw noReason()
  return decision.row
}

function noReason(): InvalidInputError {
  const allowed = 'a reason in at least one character'
  const message = `reason: nothing is not allowed; it must be ${allowed}`
  return new InvalidInputError([{ path: 'reason', value: '', allowed, unit: '–', message }])
}

function deleteDraft(work: SheetWork, actor: SignedIn, place: SheetPlace, wanted: Wanted): void {
  change(work, actor, (deed) => {
    const row = openSheet(deed.tx, place)
    assertMove(deed.tx, actor, row, wanted)
    deleteSheet(deed.tx, row.id)
    noteChange(deed, row.projectId, {
      ...sheetSubject(row),
      action: DEEDS.delete,
      fromVersion: row.version,
    })
  })
}

/** The final document, where the move issues one. It is set before the transaction begins. */
async function frozenFor(
  work: SheetWork,
  actor: SignedIn,
  row: SheetRow,
  { move }: Wanted,
): Promise<Frozen | null> {
  if (move !== 'approve' && move !== 'issue-for-information') return null
  const status = move === 'approve' ? 'approved' : 'issued-for-information'
  const by = { accountId: actor.accountId, at: work.now() }
  return freezeSheet(work, { ...contentAfter(work.db, row, move, by), status })
}

interface Applied {
  readonly work: SheetWork
  readonly row: SheetRow
  readonly rule: MoveRow
  readonly reason: string
  readonly frozen: Frozen | null
}

function applyMove(deed: Deed, { work, row, rule, reason, frozen }: Applied): void {
  const { tx, at, by } = deed
  const { move } = rule
  const status = rule.to ?? row.status
  const isFrozenAlready = row.issuedAt !== null
  const kept = contentAfter(tx, row, move, { accountId: by.accountId, at })
  const content = isFrozenAlready ? row.content : (frozen?.content ?? { ...kept, status })
  updateSheet(tx, row.id, {
    ...{ status, content, version: row.version + 1, updatedAt: at, updatedBy: by.accountId },
    ...signatures(move, by.accountId, at),
    ...(frozen ? frozenColumns(frozen, at) : {}),
  })
  if (frozen) insertSheetFile(tx, { ...frozen.file, sheetId: row.id, page: 0 })
  noteMove(deed, { work, row, move, from: row.status, to: status, reason })
  if (frozen) supersedeOthers(deed, work, row)
}

function signatures(move: SheetMove, accountId: string, at: number): Partial<SheetRow> {
  if (move === 'submit') return { preparedAt: at, checkedBy: null, checkedAt: null }
  if (move === 'check') return { checkedBy: accountId, checkedAt: at }
  if (move === 'return') return { checkedBy: null, checkedAt: null }
  if (move === 'approve') return { approvedBy: accountId }
  return move === 'issue-for-information' ? { preparedAt: at } : {}
}

function frozenColumns({ code, digest, pages, file }: Frozen, at: number): Partial<SheetRow> {
  const { fileId, sha256: fileSha256 } = file
  return { code, digest, pages, issuedAt: at, fileId, fileSha256 }
}

/** Whatever of the same number was in force is so no longer; nothing else in it changes. */
function supersedeOthers(deed: Deed, work: SheetWork, row: SheetRow): void {
  const { tx, at, by } = deed
  for (const other of listInForce(tx, row)) {
    const changed = { version: other.version + 1, updatedAt: at, updatedBy: by.accountId }
    updateSheet(tx, other.id, { status: 'superseded', ...changed })
    const { status: from } = other
    const reason = `revision ${row.revision}`
    noteMove(deed, { work, row: other, move: 'supersede', from, to: 'superseded', reason })
  }
}

interface Noted {
  readonly work: SheetWork
  readonly row: SheetRow
  readonly move: SheetMove
  readonly from: SheetRow['status']
  readonly to: SheetRow['status']
  readonly reason: string
}

function noteMove(deed: Deed, { work, row, move, from, to, reason }: Noted): void {
  const { tx, at, by } = deed
  insertMove(tx, { sheetId: row.id, move, from, to, reason, at, by: by.accountId })
  noteChange(deed, row.projectId, {
    ...sheetSubject(row),
    action: DEEDS[move],
    fromVersion: row.version,
    toVersion: row.version + 1,
    detail: { from, to, ...(reason === '' ? {} : { reason }) },
  })
  const kind = NOTICES[move]
  if (kind) queueNotice(tx, work, { kind, row, at, by, reason })
}
