import type { z } from 'zod'
import type {
  OrderItem,
  ordersQuerySchema,
  ordersSchema,
  orderWithdrawalSchema,
} from '../../../shared/schemas/order-api'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import type { Sending } from '../files/send-file'
import { change, type Doer, noteChange } from '../projects/deed'
import { openProject } from '../projects/open-project'
import { stateWith, type Seen } from './order-state'
import { type OrderPlace, type OrderWork, orderAddress } from './order-work'
import { findOrder, listOrders, listTicks, type OrderRow, updateOrder } from './orders.queries'

/** Orders of a project or of one line, the newest first, with what was ticked off. */
export function readOrders(
  work: OrderWork,
  projectId: string,
  { lineId }: z.output<typeof ordersQuerySchema>,
): z.output<typeof ordersSchema> {
  const found = listOrders(work.db, projectId, lineId)
  const ids = found.map(({ order }) => order.id)
  const seen = { at: work.now(), ticks: listTicks(work.db, ids) }
  return { orders: found.map(({ order, issuer }) => itemOf(work, { order, issuer, seen })) }
}

/** @throws NotFoundError */
export function readOrder(work: OrderWork, { projectId, orderId }: OrderPlace): OrderItem {
  const found = readOrders(work, projectId, { lineId: '' }).orders.find(({ id }) => id === orderId)
  if (!found) throw noOrder(orderId)
  return found
}

interface Found {
  readonly order: OrderRow
  readonly issuer: string
  readonly seen: Seen
}

function itemOf({ db, appUrl }: OrderWork, { order, issuer, seen }: Found): OrderItem {
  const { id, token, content, lineId, scenarioId, scenarioVersion, pages, issuedAt } = order
  const { line, scenario, verdict, waterLevel, leave, meetAt, sections } = content
  return {
    ...stateWith(db, order, seen),
    ...{ id, token, address: orderAddress(appUrl, token) },
    ...{ lineId, line, scenarioId, scenario, scenarioVersion, verdict },
    waterLevel: waterLevel.level,
    leaveLevel: leave.level,
    ...{ meetAt, sections: sections.length, pages, issuedAt },
    issuedBy: { id: order.issuedBy, name: issuer },
  }
}

function noOrder(orderId: string): NotFoundError {
  return new NotFoundError(`order: "${orderId}" does not exist in this project`)
}

/** @throws NotFoundError */
export function orderAt(db: Db, { projectId, orderId }: OrderPlace): OrderRow {
  const row = findOrder(db, projectId, orderId)
  if (!row) throw noOrder(orderId)
  return row
}

/**
 * Takes an order back; its page says so, and why.
 *
 * @throws NotFoundError; ConflictError where it is withdrawn or replaced already.
 */
export function withdrawOrder(
  work: OrderWork,
  actor: Doer,
  place: OrderPlace,
  { reason }: z.output<typeof orderWithdrawalSchema>,
): void {
  change(work, actor, (deed) => {
    const { tx, at, by } = deed
    openProject(tx, place.projectId)
    const row = orderAt(tx, place)
    if (row.withdrawnAt !== null || row.replacedAt !== null) {
      throw new ConflictError(`Order ${row.number} is withdrawn or replaced already.`)
    }
    const withdrawal = { withdrawnAt: at, withdrawnBy: by.accountId, withdrawalReason: reason }
    updateOrder(tx, row.id, withdrawal)
    noteChange(deed, place.projectId, {
      action: 'order.withdrawn',
      ...{ subjectType: 'order', subjectId: row.id },
      subjectName: `${row.number} · ${row.content.line}`,
      detail: { reason },
    })
  })
}

/** The file of an order, byte for byte as it was issued. */
export function pdfOf(row: OrderRow, shown: Sending['shown']): Sending {
  const { fileId, fileSha256, number } = row
  const name = `order-${number}.pdf`
  const common = { mediaType: 'application/pdf', variant: 'original' } as const
  return { id: fileId, name, checksum: fileSha256, shown, ...common }
}
