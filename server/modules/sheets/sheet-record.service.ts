import { checkingRefusal, movesOf } from '../../../shared/access/sheet-moves'
import type { SheetRecord, sheetChangesSchema } from '../../../shared/schemas/sheet-api'
import { resultOf } from '../../../shared/sheet/scenario-sheet'
import { resultDifferences, sheetChanges } from '../../../shared/sheet/sheet-changes'
import type { z } from 'zod'
import type { Db } from '../../db/client'
import type { SignedIn } from '../../http/operation'
import { findShownAccount } from '../accounts/accounts.queries'
import { findProject } from '../projects/projects.queries'
import { mayComment, mayCopy } from './checking.service'
import { listComments, listIssues, listMarks, listMoves } from './checking.queries'
import {
  EDITABLE_STATUSES,
  IN_FORCE,
  isEditor,
  movable,
  OPEN_STATUSES,
  sheetAt,
} from './open-sheet'
import type { SheetPlace, SheetWork } from './sheet-work'
import { findSheet, listRevisions, type SheetRow } from './sheets.queries'

/** The sheet, what was done with it, and what whoever asks may do. */
export function readSheet(work: SheetWork, actor: SignedIn, place: SheetPlace): SheetRecord {
  const { db } = work
  const row = sheetAt(db, place)
  const { id, projectId, number, revision, status, version, content, previousId } = row
  const { lineId, scenarioId, scenarioVersion, preparedAt, issuedAt } = row
  const { code, digest, fileSha256, pages, createdAt, updatedAt } = row
  return {
    ...{ id, projectId, number, revision, status, version, content, previousId },
    source: { lineId, scenarioId, scenarioVersion, place: row.place },
    preparedBy: personOf(db, row.preparedBy),
    preparedAt,
    checked: signedBy(db, row.checkedBy, row.checkedAt),
    approved: signedBy(db, row.approvedBy, issuedAt),
    ...{ issuedAt, code, digest, fileSha256, pages, createdAt, updatedAt },
    revisions: listRevisions(db, projectId, number).map((other) => ({
      ...{ id: other.id, revision: other.revision, status: other.status },
    })),
    marks: listMarks(db, id),
    comments: listComments(db, id),
    issues: listIssues(db, id),
    history: listMoves(db, id),
    may: rightsOf(db, row, actor),
    drift: driftOf(work, row),
  }
}

function personOf(db: Db, accountId: string) {
  const { id, name, organisation } = findShownAccount(db, accountId)!
  return { id, name, organisation: organisation.name }
}

function signedBy(db: Db, accountId: string | null, at: number | null) {
  return accountId === null || at === null ? null : { person: personOf(db, accountId), at }
}

/** In an archived project nothing changes. */
function rightsOf(db: Db, row: SheetRow, actor: SignedIn): SheetRecord['may'] {
  const sheet = movable(db, row)
  const isActive = findProject(db, row.projectId)!.archivedAt === null
  const isOpen = isActive && OPEN_STATUSES.includes(row.status)
  const isPreparer = row.preparedBy === actor.accountId
  const mayCheck = checkingRefusal(sheet, actor) === null
  return {
    moves: isActive ? [...movesOf(sheet, actor)] : [],
    edit: isActive && isPreparer && EDITABLE_STATUSES.includes(row.status),
    mark: isActive && row.status === 'in-checking' && mayCheck,
    comment: isOpen && mayComment(actor),
    answer: isOpen && isEditor(actor),
    issue: isActive && IN_FORCE.includes(row.status) && (isEditor(actor) || actor.mayApprove),
    copy: isActive && mayCopy(actor),
  }
}

/** What the engine of today says of the inputs of a sheet. */
function driftOf({ software }: SheetWork, { content }: SheetRow): SheetRecord['drift'] {
  const now = resultOf(content)
  return { software, differences: [...resultDifferences(content.result, now)] }
}

/** What is new against the revision that this one began from. */
export function readChanges(db: Db, place: SheetPlace): z.output<typeof sheetChangesSchema> {
  const row = sheetAt(db, place)
  const before = row.previousId ? findSheet(db, row.projectId, row.previousId) : undefined
  if (!before) return { against: null, differences: [] }
  return {
    against: before.revision,
    differences: [...sheetChanges(before.content, row.content)],
  }
}
