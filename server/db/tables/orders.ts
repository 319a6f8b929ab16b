import { index, integer, sqliteTable, text, uniqueIndex } from 'drizzle-orm/sqlite-core'
import type { Order } from '../../../shared/schemas/order'
import { accounts } from './accounts'
import { projects } from './projects'

/** One issued order a row; orders are never deleted but with their project. */
export const orders = sqliteTable(
  'orders',
  {
    id: text().primaryKey(),
    projectId: text('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    number: integer().notNull(),
    lineId: text('line_id').notNull(),
    scenarioId: text('scenario_id').notNull(),
    scenarioVersion: integer('scenario_version').notNull(),
    /** What it says, final. */
    content: text({ mode: 'json' }).$type<Order>().notNull(),
    /** Opens the page for phones. */
    token: text().notNull().unique(),
    fileId: text('file_id').notNull().unique(),
    fileSha256: text('file_sha256').notNull(),
    pages: integer().notNull(),
    issuedAt: integer('issued_at').notNull(),
    issuedBy: text('issued_by')
      .notNull()
      .references(() => accounts.id),
    expiresAt: integer('expires_at').notNull(),
    withdrawnAt: integer('withdrawn_at'),
    withdrawnBy: text('withdrawn_by').references(() => accounts.id),
    withdrawalReason: text('withdrawal_reason').notNull().default(''),
    replacedAt: integer('replaced_at'),
    /** The order that came in its place. */
    replacedBy: text('replaced_by'),
  },
  (table) => [
    uniqueIndex('orders_by_number').on(table.projectId, table.number),
    index('orders_by_line').on(table.lineId),
  ],
)

/** What phones ticked off; the same tick arrives as often as it likes and counts once. */
export const orderTicks = sqliteTable(
  'order_ticks',
  {
    /** Order and the id that the phone gave. */
    id: text().primaryKey(),
    orderId: text('order_id')
      .notNull()
      .references(() => orders.id, { onDelete: 'cascade' }),
    item: text().notNull(),
    isDone: integer('is_done', { mode: 'boolean' }).notNull(),
    /** By the clock of the phone. */
    at: integer().notNull(),
    receivedAt: integer('received_at').notNull(),
  },
  (table) => [index('ticks_by_order').on(table.orderId)],
)
