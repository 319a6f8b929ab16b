import { integer, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import type { SourceTag } from '../../shared/catalogue/check-bases'

/**
 * Who wrote a row. `reference` rows follow the data that the program ships; a row that somebody
 * adds or changes becomes `user` and is never touched by the program again.
 */
const ORIGINS = ['reference', 'user'] as const

const SOURCE_TAGS = [
  'seen',
  'memory',
  'derived',
  'practice',
  'judgement',
] as const satisfies readonly SourceTag[]

/** Columns that every table of the catalogue has. */
const catalogueColumns = {
  /** Place in lists. */
  position: integer().notNull(),
  source: text().notNull(),
  /** Counts the changes of the row, so that a frozen calculation can name what it used. */
  revision: integer().notNull().default(1),
  origin: text({ enum: ORIGINS }).notNull().default('user'),
}

export const barriers = sqliteTable('barriers', {
  id: text().primaryKey(),
  diameter: real().notNull(),
  skirtLength: real('skirt_length').notNull(),
  contactWidth: real('contact_width').notNull(),
  mass: real().notNull(),
  airPressure: real('air_pressure').notNull(),
  sectionLength: real('section_length').notNull(),
  fabricStrength: real('fabric_strength').notNull(),
  statedHeight: real('stated_height').notNull(),
  isExample: integer('is_example', { mode: 'boolean' }).notNull(),
  ...catalogueColumns,
})

export const grounds = sqliteTable('grounds', {
  id: text().primaryKey(),
  friction: real().notNull(),
  permeability: real().notNull(),
  layerThickness: real('layer_thickness').notNull(),
  isSuitable: integer('is_suitable', { mode: 'boolean' }).notNull(),
  isUnverified: integer('is_unverified', { mode: 'boolean' }).notNull(),
  tag: text({ enum: SOURCE_TAGS }).notNull(),
  ...catalogueColumns,
})

export const checkBases = sqliteTable('check_bases', {
  id: text().primaryKey(),
  format: text({ enum: ['global', 'partial'] }).notNull(),
  sliding: real().notNull(),
  overturning: real(),
  flotation: real().notNull(),
  fabric: real().notNull(),
  edition: text().notNull(),
  tag: text({ enum: SOURCE_TAGS }).notNull(),
  ...catalogueColumns,
})

/** What the database remembers about itself, such as which demo data it was given. */
export const meta = sqliteTable('meta', {
  key: text().primaryKey(),
  value: text().notNull(),
})

export * from './tables/accounts'
export * from './tables/classes'
export * from './tables/depots'
export * from './tables/forecasts'
export * from './tables/orders'
export * from './tables/projects'
export * from './tables/sheets'
