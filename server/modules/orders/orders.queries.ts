import { and, asc, count, desc, eq, gt, inArray, isNull, max } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, orders, orderTicks } from '../../db/schema'

export type OrderRow = typeof orders.$inferSelect
type NewOrderRow = typeof orders.$inferInsert
export type TickRow = typeof orderTicks.$inferSelect

/** Orders of a project, the newest first, with whoever issued them. */
export function listOrders(db: Db, projectId: string, lineId: string) {
  const ofLine = lineId === '' ? undefined : eq(orders.lineId, lineId)
  return db
    .select({ order: orders, issuer: accounts.name })
    .from(orders)
    .innerJoin(accounts, eq(accounts.id, orders.issuedBy))
    .where(and(eq(orders.projectId, projectId), ofLine))
    .orderBy(desc(orders.number))
    .all()
}

export function findOrder(db: Db, projectId: string, orderId: string): OrderRow | undefined {
  const here = and(eq(orders.projectId, projectId), eq(orders.id, orderId))
  return db.select().from(orders).where(here).get()
}

export function findOrderById(db: Db, orderId: string): OrderRow | undefined {
  return db.select().from(orders).where(eq(orders.id, orderId)).get()
}

export function findOrderByToken(db: Db, token: string): OrderRow | undefined {
  return db.select().from(orders).where(eq(orders.token, token)).get()
}

/** Last number given in a project; 0 before the first. */
export function lastOrderNumber(db: Db, projectId: string): number {
  const { last } = db
    .select({ last: max(orders.number) })
    .from(orders)
    .where(eq(orders.projectId, projectId))
    .get()!
  return last ?? 0
}

/** Neither withdrawn nor replaced. */
const standing = and(isNull(orders.withdrawnAt), isNull(orders.replacedAt))

/** Marks what stands on a line as replaced. */
export function replaceOrders(db: Db, lineId: string, by: { id: string; at: number }): void {
  db.update(orders)
    .set({ replacedAt: by.at, replacedBy: by.id })
    .where(and(eq(orders.lineId, lineId), standing))
    .run()
}

/** Orders of a project by which somebody may be working at a moment. */
export function countInForce(db: Db, projectId: string, at: number): number {
  const here = and(eq(orders.projectId, projectId), standing, gt(orders.expiresAt, at))
  return db.select({ total: count() }).from(orders).where(here).get()!.total
}

export function insertOrder(db: Db, row: NewOrderRow): void {
  db.insert(orders).values(row).run()
}

export function updateOrder(db: Db, id: string, row: Partial<NewOrderRow>): void {
  db.update(orders).set(row).where(eq(orders.id, id)).run()
}

/** Those of the ids under which an order has a file. */
export function listKnownOrderFileIds(db: Db, ids: readonly string[]): readonly string[] {
  const { fileId } = orders
  return db
    .select({ fileId })
    .from(orders)
    .where(inArray(fileId, [...ids]))
    .all()
    .map((row) => row.fileId)
}

/** Ticks of orders, in the order in which they were made. */
export function listTicks(db: Db, orderIds: readonly string[]): readonly TickRow[] {
  const { orderId, at, receivedAt } = orderTicks
  return db
    .select()
    .from(orderTicks)
    .where(inArray(orderId, [...orderIds]))
    .orderBy(asc(at), asc(receivedAt))
    .all()
}

export function countTicks(db: Db, orderId: string): number {
  const here = eq(orderTicks.orderId, orderId)
  return db.select({ total: count() }).from(orderTicks).where(here).get()!.total
}

/** A tick that is there already stays as it is. */
export function insertTick(db: Db, row: TickRow): void {
  db.insert(orderTicks).values(row).onConflictDoNothing().run()
}
