import { index, integer, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import {
  FORECAST_ORIGINS,
  type Forecast,
  type ForecastCall,
  type ForecastCrest,
  type ForecastReading,
  type ObservedReading,
  type ObservedShift,
} from '../../../shared/schemas/forecast'
import { accounts } from './accounts'
import { gauges } from './projects'

/** Forecast issues of gauges. Levels are in the datum of the line, moments in ms since 1970. */
export const forecasts = sqliteTable(
  'forecasts',
  {
    id: text().primaryKey(),
    gaugeId: text('gauge_id')
      .notNull()
      .references(() => gauges.id, { onDelete: 'cascade' }),
    origin: text({ enum: FORECAST_ORIGINS }).notNull(),
    issuedAt: integer('issued_at').notNull(),
    note: text().notNull().default(''),
    /** What a sketch was drawn from. */
    call: text({ mode: 'json' }).$type<ForecastCall>(),
    /** Zero and correction that carried the levels to the line; the gauge may have others since. */
    gauge: text({ mode: 'json' }).$type<Forecast['gauge']>().notNull(),
    readings: text({ mode: 'json' }).$type<ForecastReading[]>().notNull(),
    observed: text({ mode: 'json' }).$type<ObservedReading[]>().notNull(),
    /** Computed from the readings whenever they change, for lists. */
    shift: text({ mode: 'json' }).$type<ObservedShift>(),
    crest: text({ mode: 'json' }).$type<ForecastCrest>(),
    readingCount: integer('reading_count').notNull(),
    observedCount: integer('observed_count').notNull(),
    createdAt: integer('created_at').notNull(),
    createdBy: text('created_by')
      .notNull()
      .references(() => accounts.id),
  },
  (table) => [index('forecasts_by_gauge').on(table.gaugeId, table.issuedAt)],
)
