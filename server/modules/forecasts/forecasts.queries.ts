import { and, desc, eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { accounts, forecasts, gauges } from '../../db/schema'

type NewRow = typeof forecasts.$inferInsert

const listed = {
  id: forecasts.id,
  gaugeId: forecasts.gaugeId,
  origin: forecasts.origin,
  issuedAt: forecasts.issuedAt,
  note: forecasts.note,
  shift: forecasts.shift,
  crest: forecasts.crest,
  createdAt: forecasts.createdAt,
  createdBy: { id: accounts.id, name: accounts.name },
}
const counts = { readingCount: forecasts.readingCount, observedCount: forecasts.observedCount }

/** The newest issue first; of two of one moment the one that was entered later. */
const NEWEST_FIRST = [desc(forecasts.issuedAt), desc(forecasts.createdAt), desc(forecasts.id)]

export function listForecasts(db: Db, gaugeId: string) {
  return db
    .select({ ...listed, ...counts })
    .from(forecasts)
    .innerJoin(accounts, eq(accounts.id, forecasts.createdBy))
    .where(eq(forecasts.gaugeId, gaugeId))
    .orderBy(...NEWEST_FIRST)
    .all()
}

export function listForecastsOfProject(db: Db, projectId: string) {
  return db
    .select({ ...listed, ...counts })
    .from(forecasts)
    .innerJoin(gauges, eq(gauges.id, forecasts.gaugeId))
    .innerJoin(accounts, eq(accounts.id, forecasts.createdBy))
    .where(eq(gauges.projectId, projectId))
    .orderBy(...NEWEST_FIRST)
    .all()
}

export function findForecast(db: Db, gaugeId: string, forecastId: string) {
  const { call, gauge, readings, observed } = forecasts
  return db
    .select({ ...listed, call, gauge, readings, observed })
    .from(forecasts)
    .innerJoin(accounts, eq(accounts.id, forecasts.createdBy))
    .where(and(eq(forecasts.gaugeId, gaugeId), eq(forecasts.id, forecastId)))
    .get()
}

/** Observed levels of the newest issue of a gauge; none where there is no issue. */
export function findNewestObserved(db: Db, gaugeId: string) {
  return (
    db
      .select({ observed: forecasts.observed })
      .from(forecasts)
      .where(eq(forecasts.gaugeId, gaugeId))
      .orderBy(...NEWEST_FIRST)
      .get()?.observed ?? []
  )
}

export function insertForecast(db: Db, row: NewRow): void {
  db.insert(forecasts).values(row).run()
}

export function updateForecast(db: Db, forecastId: string, row: Partial<NewRow>): void {
  db.update(forecasts).set(row).where(eq(forecasts.id, forecastId)).run()
}

export function deleteForecast(db: Db, forecastId: string): void {
  db.delete(forecasts).where(eq(forecasts.id, forecastId)).run()
}
