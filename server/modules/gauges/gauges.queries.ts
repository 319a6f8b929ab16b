import { and, eq } from 'drizzle-orm'
import type { Db } from '../../db/client'
import { gauges } from '../../db/schema'
import { byName, changers, keptSelection, makers } from '../projects/kept.queries'

type NewRow = typeof gauges.$inferInsert

function selectGauges(db: Db) {
  return db
    .select({
      id: gauges.id,
      name: gauges.name,
      zero: gauges.zero,
      correction: gauges.correction,
      note: gauges.note,
      ...keptSelection(gauges),
    })
    .from(gauges)
    .innerJoin(makers, eq(makers.id, gauges.createdBy))
    .innerJoin(changers, eq(changers.id, gauges.updatedBy))
    .$dynamic()
}

export function listGauges(db: Db, projectId: string) {
  return selectGauges(db)
    .where(eq(gauges.projectId, projectId))
    .orderBy(byName(gauges.name), gauges.id)
    .all()
}

export function findGauge(db: Db, projectId: string, gaugeId: string) {
  return selectGauges(db)
    .where(and(eq(gauges.projectId, projectId), eq(gauges.id, gaugeId)))
    .get()
}

export function insertGauge(db: Db, row: NewRow): void {
  db.insert(gauges).values(row).run()
}

export function updateGauge(db: Db, gaugeId: string, row: Partial<NewRow>): void {
  db.update(gauges).set(row).where(eq(gauges.id, gaugeId)).run()
}

export function deleteGauge(db: Db, gaugeId: string): void {
  db.delete(gauges).where(eq(gauges.id, gaugeId)).run()
}
