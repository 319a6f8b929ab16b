import { index, integer, primaryKey, real, sqliteTable, text } from 'drizzle-orm/sqlite-core'
import { MEMBER_ROLES } from '../../../shared/access/roles'
import {
  DEFAULT_ENDS,
  type Background,
  type LineEnds,
  type LineMark,
} from '../../../shared/schemas/mark'
import type { ScenarioContent, ScenarioSummary } from '../../../shared/schemas/scenario'
import { accounts } from './accounts'

const moment = (name: string) => integer(name)

const author = (name: string) =>
  text(name)
    .notNull()
    .references(() => accounts.id)

/** Columns of whatever is made, renamed, archived and restored. */
const keptColumns = () => ({
  createdAt: moment('created_at').notNull(),
  createdBy: author('created_by'),
  updatedAt: moment('updated_at').notNull(),
  updatedBy: author('updated_by'),
  archivedAt: moment('archived_at'),
  /** Counts changes: who saves names the version that the change was made on. */
  version: integer().notNull().default(1),
})

export const projects = sqliteTable('projects', {
  id: text().primaryKey(),
  name: text().notNull(),
  site: text().notNull().default(''),
  client: text().notNull().default(''),
  /** Vertical datum of all levels, such as "Quay datum (QD)". */
  datum: text().notNull(),
  /** IANA time zone in which the project's times are printed. */
  timeZone: text('time_zone').notNull(),
  note: text().notNull().default(''),
  ...keptColumns(),
})

export const projectMembers = sqliteTable(
  'project_members',
  {
    projectId: text('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    accountId: author('account_id'),
    role: text({ enum: MEMBER_ROLES }).notNull(),
    addedAt: moment('added_at').notNull(),
  },
  (table) => [
    primaryKey({ columns: [table.projectId, table.accountId] }),
    index('members_by_account').on(table.accountId),
  ],
)

export const gauges = sqliteTable(
  'gauges',
  {
    id: text().primaryKey(),
    projectId: text('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    /** Level of gauge zero in the datum of the project [m]. */
    zero: real().notNull(),
    /** Added to carry a level at the gauge to the site [m]. */
    correction: real().notNull().default(0),
    note: text().notNull().default(''),
    ...keptColumns(),
  },
  (table) => [index('gauges_by_project').on(table.projectId)],
)

export const lines = sqliteTable(
  'lines',
  {
    id: text().primaryKey(),
    projectId: text('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    note: text().notNull().default(''),
    /** All sizes offered on one line have the same section length [m]. */
    sectionLength: real('section_length').notNull().default(10),
    /** Wells, drains, gates and whatever else stands beside the line. */
    marks: text({ mode: 'json' }).$type<LineMark[]>().notNull().default([]),
    ends: text({ mode: 'json' }).$type<LineEnds>().notNull().default(DEFAULT_ENDS),
    /** Picture under the plan. */
    background: text({ mode: 'json' }).$type<Background>(),
    ...keptColumns(),
  },
  (table) => [index('lines_by_project').on(table.projectId)],
)

export const stations = sqliteTable(
  'stations',
  {
    lineId: text('line_id')
      .notNull()
      .references(() => lines.id, { onDelete: 'cascade' }),
    position: integer().notNull(),
    chainage: real().notNull(),
    x: real(),
    y: real(),
    groundLevel: real('ground_level').notNull(),
    surface: text().notNull(),
    clearWidth: real('clear_width'),
    note: text().notNull().default(''),
  },
  (table) => [primaryKey({ columns: [table.lineId, table.position] })],
)

/** What a scenario assumes, and the figures that the server computed from it. */
const contentColumns = () => ({
  name: text().notNull(),
  note: text().notNull().default(''),
  content: text({ mode: 'json' }).$type<ScenarioContent>().notNull(),
  summary: text({ mode: 'json' }).$type<ScenarioSummary>().notNull(),
})

export const scenarios = sqliteTable(
  'scenarios',
  {
    id: text().primaryKey(),
    lineId: text('line_id')
      .notNull()
      .references(() => lines.id, { onDelete: 'cascade' }),
    ...contentColumns(),
    /** Copies of the summary that lists sort and filter by. */
    waterLevel: real('water_level').notNull(),
    verdict: text().notNull(),
    holdsToLevel: real('holds_to_level'),
    ...keptColumns(),
  },
  (table) => [
    // Holds all that the table of scenarios searches, filters and sorts by, so that a page of it
    // never reads the contents of the others.
    index('scenarios_in_table').on(
      table.lineId,
      table.archivedAt,
      table.updatedAt,
      table.name,
      table.note,
      table.verdict,
      table.waterLevel,
      table.holdsToLevel,
      table.id,
    ),
  ],
)

/** Every saved state of a scenario; the newest equals the scenario. */
export const scenarioVersions = sqliteTable(
  'scenario_versions',
  {
    scenarioId: text('scenario_id')
      .notNull()
      .references(() => scenarios.id, { onDelete: 'cascade' }),
    version: integer().notNull(),
    ...contentColumns(),
    savedAt: moment('saved_at').notNull(),
    savedBy: author('saved_by'),
  },
  (table) => [primaryKey({ columns: [table.scenarioId, table.version] })],
)

export const projectFiles = sqliteTable(
  'project_files',
  {
    id: text().primaryKey(),
    projectId: text('project_id')
      .notNull()
      .references(() => projects.id, { onDelete: 'cascade' }),
    name: text().notNull(),
    caption: text().notNull().default(''),
    mediaType: text('media_type').notNull(),
    size: integer().notNull(),
    sha256: text().notNull(),
    width: integer(),
    height: integer(),
    uploadedAt: moment('uploaded_at').notNull(),
    uploadedBy: author('uploaded_by'),
  },
  (table) => [index('files_by_project').on(table.projectId)],
)
