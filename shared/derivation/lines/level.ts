import { leaveLevel, LEAST_LEAVE_MARGIN, type LeaveInput } from '../../checks/leave-level'
import { LARGEST_HOLDING, SMALLEST_HOLDING } from '../holds-to-proof'
import type { LineContext } from './context'

/** What the leave level rests on. */
export type LeaveTerms = Pick<LeaveInput, 'rateOfRise' | 'timeToClear'>

/** Level to which the section holds, and the level before which everybody leaves. */
export function writeLevel(
  context: LineContext,
  terms: LeaveTerms,
  groundLevel: number | null,
): void {
  const { book, result, section } = context
  const { from, depth, check } = result.holdsTo
  if (from === null) return
  const common = { kind: 'length', source: 'scan' } as const
  if (from > 0) {
    book.line('level', {
      ...common,
      id: 'holdsFrom',
      symbol: 'h_min',
      formula: SMALLEST_HOLDING,
      value: from,
      isSubstituted: true,
    })
  }
  book.line('level', {
    ...common,
    id: 'holdsTo',
    symbol: 'h_max',
    formula: LARGEST_HOLDING,
    value: depth,
    isSubstituted: true,
    hasNote: true,
    check,
    rounding: 'down',
  })
  if (groundLevel !== null) writeAsLevel(context, { id: 'holdsToLevel', of: 'h_max', as: 'Z_max' })
  const leave = leaveLevel({
    holdsToDepth: depth,
    holdsFrom: from,
    depth: section.water.depth,
    ...terms,
  })
  if (leave.depth === null) return
  writeLeave(context, terms, leave.depth)
  if (groundLevel !== null) writeAsLevel(context, { id: 'leaveLevel', of: 'h_l', as: 'Z_l' })
}

function writeLeave({ book }: LineContext, terms: LeaveTerms, leave: number): void {
  book.given('d_l', LEAST_LEAVE_MARGIN, 'length')
  const rises = terms.rateOfRise !== null && terms.rateOfRise > 0
  if (rises) {
    book.given('c_r', terms.rateOfRise ?? 0, 'rate')
    book.given('t_c', terms.timeToClear, 'minutes')
  }
  book.line('level', {
    id: 'leaveDepth',
    symbol: 'h_l',
    formula: rises ? 'h_max - max(c_r * t_c, d_l)' : 'h_max - d_l',
    value: leave,
    kind: 'length',
    source: 'leave',
    hasNote: true,
    rounding: 'down',
  })
}

interface AsLevel {
  readonly id: 'holdsToLevel' | 'leaveLevel'
  readonly of: 'h_max' | 'h_l'
  readonly as: 'Z_max' | 'Z_l'
}

function writeAsLevel({ book }: LineContext, { id, of, as }: AsLevel): void {
  book.line('level', {
    id,
    symbol: as,
    formula: `Z_g + ${of}`,
    value: book.valueOf('Z_g') + book.valueOf(of),
    kind: 'length',
    source: 'leave',
    rounding: 'down',
  })
}
