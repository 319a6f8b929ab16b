import { orderStatus } from '../../../shared/order/order-status'
import type { OrderState, Tick } from '../../../shared/schemas/order-api'
import type { Db } from '../../db/client'
import { findOrderById, listTicks, type OrderRow, type TickRow } from './orders.queries'

/** Where an order stands, and what was ticked off. */
export function orderStateOf(db: Db, row: OrderRow, at: number): OrderState {
  return stateWith(db, row, { at, ticks: listTicks(db, [row.id]) })
}

export interface Seen {
  readonly at: number
  /** Of this order or of more; in the order in which they were made. */
  readonly ticks: readonly TickRow[]
}

export function stateWith(db: Db, row: OrderRow, { at, ticks }: Seen): OrderState {
  const { number, expiresAt, withdrawnAt, withdrawalReason, replacedAt, replacedBy } = row
  const successor = replacedBy === null ? undefined : findOrderById(db, replacedBy)
  return {
    number,
    status: orderStatus(row, at),
    expiresAt,
    withdrawnAt,
    reason: withdrawalReason,
    replacedBy:
      successor && replacedAt !== null
        ? { number: successor.number, at: replacedAt, token: successor.token }
        : null,
    ticks: lastTicks(ticks.filter(({ orderId }) => orderId === row.id)),
  }
}

/** What was last said of each item; of two ticks of one moment the later arrival counts. */
function lastTicks(ticks: readonly TickRow[]): Tick[] {
  const last = new Map<string, Tick>()
  for (const { item, isDone, at, receivedAt } of ticks) {
    last.set(item, { item, isDone, at, receivedAt })
  }
  return [...last.values()]
}
