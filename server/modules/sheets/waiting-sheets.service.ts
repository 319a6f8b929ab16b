import { decideMove, type SheetMove } from '../../../shared/access/sheet-moves'
import type { SheetStatus } from '../../../shared/schemas/sheet-status'
import type { Db } from '../../db/client'
import type { SignedIn } from '../../http/operation'
import { movable } from './open-sheet'
import { listOnTheirWay } from './sheets.queries'

/** The move that takes a sheet on from where it stands. */
const NEXT = {
  'in-checking': 'check',
  checked: 'approve',
  returned: 'submit',
} as const satisfies Partial<Record<SheetStatus, SheetMove>>

type Waiting = keyof typeof NEXT

/** Sheets that somebody can take on: to check, to approve, or returned to them. */
export function waitingSheets(db: Db, actor: SignedIn) {
  const statuses = Object.keys(NEXT) as Waiting[]
  return listOnTheirWay(db, actor.accountId, statuses).flatMap(({ sheet, project }) => {
    const what = NEXT[sheet.status as Waiting]
    if (decideMove(what, movable(db, sheet), actor).outcome !== 'allowed') return []
    const { id, number, revision, updatedAt: since, content } = sheet
    return [{ id, number, revision, place: content.place, what, since, project }]
  })
}
