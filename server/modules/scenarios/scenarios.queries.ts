import { and, asc, count, desc, eq, isNotNull, isNull, sql } from 'drizzle-orm'
import type { z } from 'zod'
import type { RestingForecast } from '../../../shared/schemas/forecast'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { scenariosQuerySchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { scenarios } from '../../db/schema'
import {
  byName,
  changers,
  containsText,
  keptSelection,
  makers,
  offsetOf,
  ordered,
} from '../projects/kept.queries'

export type ScenariosQuery = z.output<typeof scenariosQuerySchema>
type NewRow = typeof scenarios.$inferInsert

/** The worse, the higher. */
const severity = sql`case ${scenarios.verdict}
  when 'fails' then 3 when 'notChecked' then 2 when 'narrow' then 1 else 0 end`

const SORTS = {
  name: byName(scenarios.name),
  updated: scenarios.updatedAt,
  level: scenarios.waterLevel,
  // Where nothing holds there is no level: it sorts below every other.
  holdsTo: scenarios.holdsToLevel,
  verdict: severity,
}

const common = {
  id: scenarios.id,
  lineId: scenarios.lineId,
  name: scenarios.name,
  note: scenarios.note,
  summary: scenarios.summary,
  ...keptSelection(scenarios),
}

/** The least or the most open edge of the runs; a run without its own has that of the line. */
function edge(which: 'min' | 'max') {
  const { content } = scenarios
  return sql<number>`(select ${sql.raw(which)}(coalesce(
    json_extract(run.value, '$.edgeFactor'), json_extract(${content}, '$.uplift.edgeFactor')))
    from json_each(${content}, '$.sizes') run)`
}

const listSelection = {
  ...common,
  basis: sql<string>`json_extract(${scenarios.content}, '$.basis')`,
  edges: { least: edge('min'), most: edge('max') },
  upliftModel: sql<string>`json_extract(${scenarios.content}, '$.uplift.model')`,
  forecast: sql<RestingForecast | null>`json_extract(${scenarios.content}, '$.forecast')`.mapWith(
    (text: string) => JSON.parse(text) as RestingForecast,
  ),
}

/** Only columns of the index `scenarios_in_table`: then no content is read to find a page. */
function matching(lineId: string, { search, archived, verdict }: ScenariosQuery) {
  return and(
    eq(scenarios.lineId, lineId),
    archived === 'yes' ? isNotNull(scenarios.archivedAt) : isNull(scenarios.archivedAt),
    verdict === 'any' ? undefined : eq(scenarios.verdict, verdict),
    containsText([scenarios.name, scenarios.note], search),
  )
}

function selectPage(db: Db, lineId: string, query: ScenariosQuery, rows: Window) {
  const order = ordered(SORTS[query.sort], query.order)
  const page = db
    .select({ id: scenarios.id })
    .from(scenarios)
    .where(matching(lineId, query))
    .orderBy(order, scenarios.id)
    .limit(rows.limit)
    .offset(rows.offset)
    .as('page')
  return db
    .select(listSelection)
    .from(page)
    .innerJoin(scenarios, eq(scenarios.id, page.id))
    .innerJoin(makers, eq(makers.id, scenarios.createdBy))
    .innerJoin(changers, eq(changers.id, scenarios.updatedBy))
    .orderBy(order, scenarios.id)
}

interface Window {
  readonly limit: number
  readonly offset: number
}

export function listScenarios(db: Db, lineId: string, query: ScenariosQuery) {
  const rows = { limit: PAGE_SIZE, offset: offsetOf(query.page) }
  return selectPage(db, lineId, query, rows).all()
}

/** Every row that the search and the filter leave, whatever the page. */
export function listAllScenarios(db: Db, lineId: string, query: ScenariosQuery) {
  return selectPage(db, lineId, query, { limit: -1, offset: 0 }).all()
}

export function countScenarios(db: Db, lineId: string, query: ScenariosQuery): number {
  return db.select({ total: count() }).from(scenarios).where(matching(lineId, query)).get()!.total
}

export function findScenario(db: Db, lineId: string, scenarioId: string) {
  return db
    .select({ ...common, content: scenarios.content })
    .from(scenarios)
    .innerJoin(makers, eq(makers.id, scenarios.createdBy))
    .innerJoin(changers, eq(changers.id, scenarios.updatedBy))
    .where(and(eq(scenarios.lineId, lineId), eq(scenarios.id, scenarioId)))
    .get()
}

/** All of a line, archived ones too. */
export function listScenarioIds(db: Db, lineId: string): readonly string[] {
  return db
    .select({ id: scenarios.id })
    .from(scenarios)
    .where(eq(scenarios.lineId, lineId))
    .orderBy(desc(scenarios.updatedAt), scenarios.id)
    .all()
    .map(({ id }) => id)
}

/** Those in use, oldest first, for a copy of their line. */
export function listScenarioContents(db: Db, lineId: string) {
  const { name, note, content } = scenarios
  return db
    .select({ name, note, content })
    .from(scenarios)
    .where(and(eq(scenarios.lineId, lineId), isNull(scenarios.archivedAt)))
    .orderBy(asc(scenarios.createdAt), asc(scenarios.id))
    .all()
}

export function insertScenario(db: Db, row: NewRow): void {
  db.insert(scenarios).values(row).run()
}

export function updateScenario(db: Db, scenarioId: string, row: Partial<NewRow>): void {
  db.update(scenarios).set(row).where(eq(scenarios.id, scenarioId)).run()
}
