import { OutOfRangeError, type Fault } from '../../../shared/errors'
import { MOST_TICKS, type NewTick, type OrderState } from '../../../shared/schemas/order-api'
import { write } from '../../db/write'
import { ConflictError } from '../../errors'
import { orderStateOf } from './order-state'
import type { OrderWork } from './order-work'
import { countTicks, insertTick, type OrderRow } from './orders.queries'

/**
 * Takes ticks of a phone in. A tick that is there already counts once, however often it is sent; ticks
 * of an order that has run out or was replaced are taken as well, for they tell what was done.
 *
 * @throws OutOfRangeError for an item that the order does not have; ConflictError for more ticks than
 * an order keeps.
 */
export function takeTicks(work: OrderWork, row: OrderRow, ticks: readonly NewTick[]): OrderState {
  const faults = ticks.flatMap((tick, i) => faultOf(row, tick, i))
  if (faults.length > 0) throw new OutOfRangeError(faults)
  return write(work.db, (tx) => {
    const at = work.now()
    if (countTicks(tx, row.id) + ticks.length > MOST_TICKS) {
      throw new ConflictError(`Order ${row.number} keeps ${MOST_TICKS} ticks at most.`)
    }
    for (const tick of ticks) {
      insertTick(tx, { ...tick, id: `${row.id}:${tick.id}`, orderId: row.id, receivedAt: at })
    }
    return orderStateOf(tx, row, at)
  })
}

function faultOf({ content }: OrderRow, { item }: NewTick, index: number): Fault[] {
  const [kind, place] = item.split('-')
  const last = kind === 'plug' ? content.plugs.length : content.sections.length
  if (Number(place) <= last) return []
  const path = `ticks[${index}].item`
  const allowed = `something of the order, up to ${kind}-${last}`
  const message = `${path}: "${item}" is not allowed; it must be ${allowed}`
  return [{ path, value: item, allowed, unit: '–', message }]
}
