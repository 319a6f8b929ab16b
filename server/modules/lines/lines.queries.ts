import { and, asc, count, eq, isNotNull, isNull, sql } from 'drizzle-orm'
import type { z } from 'zod'
import type { Station } from '../../../shared/schemas/line'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { linesQuerySchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { lines, scenarios, stations } from '../../db/schema'
import {
  byName,
  changers,
  containsText,
  keptSelection,
  makers,
  offsetOf,
  ordered,
} from '../projects/kept.queries'

type LinesQuery = z.output<typeof linesQuerySchema>
type NewRow = typeof lines.$inferInsert

const SORTS = { name: byName(lines.name), updated: lines.updatedAt, created: lines.createdAt }

const ofLine = sql`from ${stations} where ${stations.lineId} = ${lines.id}`

const selection = {
  id: lines.id,
  name: lines.name,
  note: lines.note,
  sectionLength: lines.sectionLength,
  scenarios: sql<number>`(select count(*) from ${scenarios}
    where ${scenarios.lineId} = ${lines.id} and ${scenarios.archivedAt} is null)`,
  ...keptSelection(lines),
}

const oneSelection = {
  ...selection,
  marks: lines.marks,
  ends: lines.ends,
  background: lines.background,
}

const listSelection = {
  ...selection,
  stationCount: sql<number>`(select count(*) ${ofLine})`,
  length: sql<number>`(select max(${stations.chainage}) - min(${stations.chainage}) ${ofLine})`,
}

function matching(projectId: string, { search, archived }: LinesQuery) {
  return and(
    eq(lines.projectId, projectId),
    archived === 'yes' ? isNotNull(lines.archivedAt) : isNull(lines.archivedAt),
    containsText([lines.name, lines.note], search),
  )
}

export function listLines(db: Db, projectId: string, query: LinesQuery) {
  return db
    .select(listSelection)
    .from(lines)
    .innerJoin(makers, eq(makers.id, lines.createdBy))
    .innerJoin(changers, eq(changers.id, lines.updatedBy))
    .where(matching(projectId, query))
    .orderBy(ordered(SORTS[query.sort], query.order), lines.id)
    .limit(PAGE_SIZE)
    .offset(offsetOf(query.page))
    .all()
}

export function countLines(db: Db, projectId: string, query: LinesQuery): number {
  return db.select({ total: count() }).from(lines).where(matching(projectId, query)).get()!.total
}

export function findLine(db: Db, projectId: string, lineId: string) {
  return db
    .select(oneSelection)
    .from(lines)
    .innerJoin(makers, eq(makers.id, lines.createdBy))
    .innerJoin(changers, eq(changers.id, lines.updatedBy))
    .where(and(eq(lines.projectId, projectId), eq(lines.id, lineId)))
    .get()
}

/** Lines that are in use, for a copy of the project. */
export function listLineIds(db: Db, projectId: string): readonly { id: string; name: string }[] {
  return db
    .select({ id: lines.id, name: lines.name })
    .from(lines)
    .where(and(eq(lines.projectId, projectId), isNull(lines.archivedAt)))
    .orderBy(asc(lines.createdAt), asc(lines.id))
    .all()
}

export function listStations(db: Db, lineId: string): Station[] {
  const { chainage, x, y, groundLevel, surface, clearWidth, note } = stations
  return db
    .select({ chainage, x, y, groundLevel, surface, clearWidth, note })
    .from(stations)
    .where(eq(stations.lineId, lineId))
    .orderBy(asc(stations.position))
    .all()
}

export function insertLine(db: Db, row: NewRow): void {
  db.insert(lines).values(row).run()
}

export function updateLine(db: Db, lineId: string, row: Partial<NewRow>): void {
  db.update(lines).set(row).where(eq(lines.id, lineId)).run()
}

/** One statement for all rows: building one of 5000 rows takes longer than running it. */
export function replaceStations(db: Db, lineId: string, survey: readonly Station[]): void {
  db.delete(stations).where(eq(stations.lineId, lineId)).run()
  const { placeholder } = sql
  const insert = db
    .insert(stations)
    .values({
      lineId,
      position: placeholder('position'),
      chainage: placeholder('chainage'),
      x: placeholder('x'),
      y: placeholder('y'),
      groundLevel: placeholder('groundLevel'),
      surface: placeholder('surface'),
      clearWidth: placeholder('clearWidth'),
      note: placeholder('note'),
    })
    .prepare()
  survey.forEach((station, position) => insert.run({ ...station, position }))
}
