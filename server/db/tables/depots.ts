import { index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { STORE_KINDS, type Crew } from '../../../shared/schemas/depot'
import { accounts, organisations } from './accounts'

const author = (name: string) =>
  text(name)
    .notNull()
    .references(() => accounts.id)

/** Where an organisation keeps what it lays, and how long it takes from there. Times in seconds. */
export const depots = sqliteTable(
  'depots',
  {
    id: text().primaryKey(),
    organisationId: text('organisation_id')
      .notNull()
      .references(() => organisations.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    callOutTime: real('call_out_time').notNull(),
    loadTime: real('load_time').notNull(),
    driveTime: real('drive_time').notNull(),
    crews: text({ mode: 'json' }).$type<Crew[]>().notNull(),
    note: text().notNull().default(''),
    createdAt: integer('created_at').notNull(),
    createdBy: author('created_by'),
    updatedAt: integer('updated_at').notNull(),
    updatedBy: author('updated_by'),
    /** Counts changes: who saves names the version that the change was made on. */
    version: integer().notNull().default(1),
  },
  (table) => [index('depots_by_organisation').on(table.organisationId)],
)

/** What a depot holds, a row for each kind and size. */
export const storeItems = sqliteTable(
  'store_items',
  {
    depotId: text('depot_id')
      .notNull()
      .references(() => depots.id, { onDelete: 'cascade' }),
    position: integer().notNull(),
    kind: text({ enum: STORE_KINDS }).notNull(),
    barrierId: text('barrier_id'),
    diameter: real(),
    mass: real(),
    serviceable: integer().notNull(),
    inRepair: integer('in_repair').notNull().default(0),
    note: text().notNull().default(''),
  },
  (table) => [primaryKey({ columns: [table.depotId, table.position] })],
)
