import type { SheetMove } from '../../../shared/access/sheet-moves'
import type { Sheet } from '../../../shared/schemas/sheet'
import type { Db } from '../../db/client'
import { letterheadOf } from '../organisations/letterheads.service'
import { findProject } from '../projects/projects.queries'
import { listMarks } from './checking.queries'
import { dayIn, signatory } from './sheet-content'
import type { SheetRow } from './sheets.queries'

/** Who puts their name to a sheet, and when. */
export interface Signing {
  readonly accountId: string
  readonly at: number
}

/** The content of a sheet with the name that a move puts on it. */
export function contentAfter(db: Db, row: SheetRow, move: SheetMove, by: Signing): Sheet {
  const { content } = row
  const date = dayIn(findProject(db, row.projectId)!.timeZone, by.at)
  const name = () => signatory(db, by.accountId, date)
  const { people } = content
  // As it is today: a draft may be older than the letterhead.
  const letterhead = letterheadOf(db, row.preparedFor)
  switch (move) {
    case 'submit':
      return {
        ...content,
        date,
        letterhead,
        people: { prepared: name(), checked: null, approved: null },
      }
    case 'check':
      return {
        ...content,
        date,
        people: { ...people, checked: name() },
        checking: marksOf(db, row, name().name),
      }
    case 'return':
      return { ...content, people: { ...people, checked: null }, checking: null }
    case 'approve':
      return { ...content, date, people: { ...people, approved: name() } }
    case 'issue-for-information':
      return { ...content, date, letterhead, people: { ...people, prepared: name() } }
    default:
      return content
  }
}

function marksOf(db: Db, { id }: SheetRow, by: string): Sheet['checking'] {
  const marks = listMarks(db, id)
  const ticked = marks.filter(({ isTicked }) => isTicked).map(({ line }) => line)
  const figures = marks.flatMap(({ line, figure, note }) =>
    figure === null ? [] : [{ line, value: figure, note }],
  )
  return {
    by,
    ticked: inOrder(ticked, (line) => line),
    figures: inOrder(figures, ({ line }) => line),
  }
}

/** "3.2" before "3.10". */
function inOrder<Item>(items: readonly Item[], lineOf: (item: Item) => string): Item[] {
  const collator = new Intl.Collator('en', { numeric: true })
  return [...items].sort((a, b) => collator.compare(lineOf(a), lineOf(b)))
}
