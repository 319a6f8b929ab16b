import type { SheetStatus } from '../schemas/sheet-status'

/** What somebody can do with a sheet on its way, or what the program does by itself. */
export const SHEET_MOVES = [
  'submit',
  'check',
  'return',
  'approve',
  'issue-for-information',
  'withdraw',
  'revise',
  'delete',
  'supersede',
] as const
export type SheetMove = (typeof SHEET_MOVES)[number]

/** Who may make a move. `program`: nobody; it happens when the next revision comes. */
export type Mover = 'preparer' | 'checker' | 'approver' | 'lead-or-approver' | 'editor' | 'program'

export interface MoveRow {
  readonly move: SheetMove
  readonly from: readonly SheetStatus[]
  /** Null: the sheet itself does not change, or is gone. */
  readonly to: SheetStatus | null
  readonly by: Mover
  readonly needsReason: boolean
}

const of = (from: readonly SheetStatus[], to: SheetStatus | null) => ({ from, to })

function row(
  move: SheetMove,
  way: ReturnType<typeof of>,
  by: Mover,
  reason: 'with reason' | '' = '',
): MoveRow {
  return { move, ...way, by, needsReason: reason !== '' }
}

/** Given out, and still in force. */
const GIVEN = ['approved', 'issued-for-information'] as const satisfies readonly SheetStatus[]

/** The whole way of a sheet. What is not in this table does not exist. */
export const MOVE_TABLE: readonly MoveRow[] = [
  row('submit', of(['draft', 'returned'], 'in-checking'), 'preparer'),
  row('check', of(['in-checking'], 'checked'), 'checker'),
  row('return', of(['in-checking'], 'returned'), 'checker', 'with reason'),
  row('approve', of(['checked'], 'approved'), 'approver'),
  row('return', of(['checked'], 'returned'), 'approver', 'with reason'),
  row('issue-for-information', of(['draft'], 'issued-for-information'), 'preparer'),
  row('withdraw', of([...GIVEN, 'checked'], 'withdrawn'), 'lead-or-approver', 'with reason'),
  row('revise', of([...GIVEN, 'withdrawn'], null), 'editor', 'with reason'),
  row('delete', of(['draft'], null), 'preparer'),
  row('supersede', of(GIVEN, 'superseded'), 'program'),
]

/** When a project asks for an approver who is not the checker. */
export const SEPARATE_APPROVER = ['by-category', 'always', 'never'] as const
export type SeparateApprover = (typeof SEPARATE_APPROVER)[number]

/** What of a sheet decides who may move it. */
export interface MovableSheet {
  readonly status: SheetStatus
  readonly category: number
  readonly preparedBy: string
  /** Organisation of the preparer when the sheet was made. */
  readonly preparedFor: string
  readonly checkedBy: string | null
  readonly separateApprover: SeparateApprover
}

/** A member, as far as moves are concerned. */
export interface SheetActor {
  readonly accountId: string
  readonly organisationId: string
  readonly mayCheck: boolean
  readonly mayApprove: boolean
  readonly member: 'lead' | 'editor' | 'reader' | null
}

/** Why a move is not for somebody. */
export const MOVE_REFUSALS = [
  'not-preparer',
  'may-not-check',
  'own-sheet',
  'same-organisation',
  'may-not-approve',
  'own-check',
  'not-lead-or-approver',
  'not-editor',
  'program-only',
] as const
export type MoveRefusal = (typeof MOVE_REFUSALS)[number]

/** Whether approver and checker of a sheet are two people. BS 5975-1 practice from category 2 on. */
export function needsSeparateApprover({ category, separateApprover }: MovableSheet): boolean {
  if (separateApprover === 'by-category') return category >= 2
  return separateApprover === 'always'
}

/** Why somebody may not check a sheet; null: they may. */
export function checkingRefusal(sheet: MovableSheet, actor: SheetActor): MoveRefusal | null {
  if (!actor.mayCheck) return 'may-not-check'
  if (actor.accountId === sheet.preparedBy) return 'own-sheet'
  const isSame = actor.organisationId === sheet.preparedFor
  return sheet.category === 3 && isSame ? 'same-organisation' : null
}

function approvalRefusal(sheet: MovableSheet, actor: SheetActor): MoveRefusal | null {
  if (!actor.mayApprove) return 'may-not-approve'
  if (actor.accountId === sheet.preparedBy) return 'own-sheet'
  const isOwnCheck = actor.accountId === sheet.checkedBy
  return isOwnCheck && needsSeparateApprover(sheet) ? 'own-check' : null
}

/** Whoever may never approve their own sheet may still take it back as lead. */
const REFUSALS: Readonly<
  Record<Mover, (sheet: MovableSheet, actor: SheetActor) => MoveRefusal | null>
> = {
  preparer: (sheet, { accountId }) => (accountId === sheet.preparedBy ? null : 'not-preparer'),
  checker: checkingRefusal,
  approver: approvalRefusal,
  'lead-or-approver': (_sheet, { member, mayApprove }) =>
    member === 'lead' || mayApprove ? null : 'not-lead-or-approver',
  editor: (_sheet, { member }) => (member === 'lead' || member === 'editor' ? null : 'not-editor'),
  program: () => 'program-only',
}

export type MoveDecision =
  | { readonly outcome: 'allowed'; readonly row: MoveRow }
  | { readonly outcome: 'conflict' }
  | { readonly outcome: 'forbidden'; readonly refusal: MoveRefusal }

/**
 * Decides on one move: a move that does not begin where the sheet stands is a conflict, whoever asks;
 * one that does is allowed or forbidden by who asks. A move of the program is a conflict for everybody.
 */
export function decideMove(move: SheetMove, sheet: MovableSheet, actor: SheetActor): MoveDecision {
  const found = MOVE_TABLE.find((one) => one.move === move && one.from.includes(sheet.status))
  if (!found || found.by === 'program') return { outcome: 'conflict' }
  const refusal = REFUSALS[found.by](sheet, actor)
  return refusal === null ? { outcome: 'allowed', row: found } : { outcome: 'forbidden', refusal }
}

/** The moves that somebody may make now, each with whether it asks for a reason. */
export function movesOf(
  sheet: MovableSheet,
  actor: SheetActor,
): readonly { readonly move: SheetMove; readonly needsReason: boolean }[] {
  return SHEET_MOVES.flatMap((move) => {
    const decision = decideMove(move, sheet, actor)
    if (decision.outcome !== 'allowed') return []
    return [{ move, needsReason: decision.row.needsReason }]
  })
}
