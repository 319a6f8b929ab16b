import { createHash, randomBytes, randomUUID } from 'node:crypto'
import { rangeFault, OutOfRangeError } from '../../../shared/errors'
import { buildOrder } from '../../../shared/order/build-order'
import { TOKEN_LENGTH, tokenFrom } from '../../../shared/order/order-token'
import type { Order } from '../../../shared/schemas/order'
import { LONGEST_ORDER, type NewOrder } from '../../../shared/schemas/order-api'
import { ConflictError } from '../../errors'
import { change, type Doer, noteChange } from '../projects/deed'
import { frozenOrder } from '../sheets/composing'
import { orderSource } from './order-source'
import { type OrderWork, orderAddress } from './order-work'
import { insertOrder, lastOrderNumber, replaceOrders } from './orders.queries'

/** An order as it is kept; its bytes are safe on the disk before its row says so. */
interface Frozen {
  readonly order: Order
  readonly token: string
  readonly fileId: string
  readonly fileSha256: string
  readonly pages: number
}

/**
 * Issues an order of a scenario: computed here, frozen with its file, and in place of whatever stands
 * on the line.
 *
 * @returns The id of the order.
 * @throws NotFoundError; OutOfRangeError for an expiry that has passed or is too far, or where nothing is
 * laid; ConflictError where the scenario was changed, or another order came between.
 */
export async function issueOrder(
  work: OrderWork,
  actor: Doer,
  projectId: string,
  wanted: NewOrder,
): Promise<string> {
  const at = work.now()
  assertExpiry(wanted.expiresAt, at)
  const who = { projectId, accountId: actor.accountId, at }
  const { input, scenarioVersion } = orderSource(work.db, who, wanted)
  const frozen = await freezeOrder(work, buildOrder(input))
  return change(work, actor, ({ tx, by }) => {
    // What the order was made from must still be there, and its number free.
    orderSource(tx, who, wanted)
    assertNumber(lastOrderNumber(tx, projectId), frozen.order)
    const id: string = randomUUID()
    const { order, ...file } = frozen
    const { lineId, scenarioId, expiresAt } = wanted
    replaceOrders(tx, lineId, { id, at })
    insertOrder(tx, {
      ...{ id, projectId, number: order.number, lineId, scenarioId, scenarioVersion },
      ...{ content: order, ...file, issuedAt: at, issuedBy: by.accountId, expiresAt },
    })
    noteChange({ tx, by, at }, projectId, {
      action: 'order.issued',
      ...{ subjectType: 'order', subjectId: id, subjectName: `${order.number} · ${order.line}` },
      detail: { scenarioId, scenarioVersion },
    })
    return id
  })
}

function assertExpiry(expiresAt: number, at: number): void {
  const allowed = { min: at, minExcluded: true, max: at + LONGEST_ORDER, unit: 'ms' }
  if (expiresAt > allowed.min && expiresAt <= allowed.max) return
  throw new OutOfRangeError([rangeFault('expiresAt', expiresAt, allowed)])
}

function assertNumber(last: number, { number }: Order): void {
  if (last + 1 === number) return
  throw new ConflictError(`Order ${last} was issued meanwhile. Look at it, then issue yours.`)
}

async function freezeOrder({ store, appUrl }: OrderWork, order: Order): Promise<Frozen> {
  const token = tokenFrom(randomBytes(TOKEN_LENGTH))
  const { pdf, pages } = await frozenOrder({ order, token, address: orderAddress(appUrl, token) })
  const fileId: string = randomUUID()
  await store.write(fileId, 'original', pdf)
  return { order, token, fileId, fileSha256: createHash('sha256').update(pdf).digest('hex'), pages }
}
