import {
  index,
  integer,
  primaryKey,
  real,
  sqliteTable,
  text,
  uniqueIndex,
} from 'drizzle-orm/sqlite-core'
import { SEPARATE_APPROVER } from '../../../shared/access/sheet-moves'
import type { Letterhead, Sheet } from '../../../shared/schemas/sheet'
import { SHEET_STATUSES } from '../../../shared/schemas/sheet-status'
import { accounts, organisations } from './accounts'
import { projects } from './projects'

const moment = (name: string) => integer(name)

const author = (name: string) =>
  text(name)
    .notNull()
    .references(() => accounts.id)

const inProject = () =>
  text('project_id')
    .notNull()
    .references(() => projects.id, { onDelete: 'cascade' })

const ofSheet = () =>
  text('sheet_id')
    .notNull()
    .references(() => sheets.id, { onDelete: 'cascade' })

/** How a project numbers its sheets and who may approve them. */
export const sheetSettings = sqliteTable('sheet_settings', {
  projectId: text('project_id')
    .primaryKey()
    .references(() => projects.id, { onDelete: 'cascade' }),
  /** A run of # stands for the digits: "FQ-###". */
  numberPattern: text('number_pattern').notNull(),
  separateApprover: text('separate_approver', { enum: SEPARATE_APPROVER }).notNull(),
  /** Last number given; a number is never given twice, even after a draft was deleted. */
  lastNumber: integer('last_number').notNull().default(0),
})

/** One revision of a sheet a row. */
export const sheets = sqliteTable(
  'sheets',
  {
    id: text().primaryKey(),
    projectId: inProject(),
    number: text().notNull(),
    revision: text().notNull(),
    status: text({ enum: SHEET_STATUSES }).notNull(),
    category: integer().notNull(),
    /** Frozen inputs and results, words, people; final from the moment of issue on. */
    content: text({ mode: 'json' }).$type<Sheet>().notNull(),
    lineId: text('line_id').notNull(),
    scenarioId: text('scenario_id').notNull(),
    scenarioVersion: integer('scenario_version').notNull(),
    /** Chainage of the cross-section [m]. */
    place: real().notNull(),
    /** The revision that this one began from. */
    previousId: text('previous_id'),
    preparedBy: author('prepared_by'),
    preparedFor: text('prepared_for')
      .notNull()
      .references(() => organisations.id),
    preparedAt: moment('prepared_at'),
    checkedBy: text('checked_by').references(() => accounts.id),
    checkedAt: moment('checked_at'),
    approvedBy: text('approved_by').references(() => accounts.id),
    /** When it was approved, or issued for information. */
    issuedAt: moment('issued_at'),
    code: text().unique(),
    digest: text().notNull().default(''),
    fileId: text('file_id'),
    fileSha256: text('file_sha256').notNull().default(''),
    pages: integer().notNull().default(0),
    createdAt: moment('created_at').notNull(),
    updatedAt: moment('updated_at').notNull(),
    updatedBy: author('updated_by'),
    version: integer().notNull().default(1),
  },
  (table) => [
    uniqueIndex('sheets_by_number').on(table.projectId, table.number, table.revision),
    index('sheets_by_file').on(table.fileSha256),
  ],
)

/** Files that were frozen with a sheet; page 0 is the whole document. */
export const sheetFiles = sqliteTable(
  'sheet_files',
  {
    sheetId: ofSheet(),
    page: integer().notNull(),
    fileId: text('file_id').notNull().unique(),
    size: integer().notNull(),
    sha256: text().notNull(),
  },
  (table) => [primaryKey({ columns: [table.sheetId, table.page] })],
)

/** What a checker did with a line: a tick, an own figure, or both. */
export const sheetMarks = sqliteTable(
  'sheet_marks',
  {
    sheetId: ofSheet(),
    /** Number of the line: "3.2". */
    line: text().notNull(),
    isTicked: integer('is_ticked', { mode: 'boolean' }).notNull(),
    /** In the unit in which the line is printed. */
    figure: real(),
    note: text().notNull().default(''),
    at: moment('at').notNull(),
    by: author('by'),
  },
  (table) => [primaryKey({ columns: [table.sheetId, table.line] })],
)

export const sheetComments = sqliteTable(
  'sheet_comments',
  {
    id: text().primaryKey(),
    sheetId: ofSheet(),
    /** Null: about the sheet as a whole. */
    line: text(),
    text: text().notNull(),
    at: moment('at').notNull(),
    by: author('by'),
    answer: text().notNull().default(''),
    answeredAt: moment('answered_at'),
    answeredBy: text('answered_by').references(() => accounts.id),
    resolvedAt: moment('resolved_at'),
    resolvedBy: text('resolved_by').references(() => accounts.id),
  },
  (table) => [index('comments_by_sheet').on(table.sheetId)],
)

/** To whom a sheet was given, and when. */
export const sheetIssues = sqliteTable(
  'sheet_issues',
  {
    id: text().primaryKey(),
    sheetId: ofSheet(),
    recipient: text().notNull(),
    note: text().notNull().default(''),
    at: moment('at').notNull(),
    by: author('by'),
  },
  (table) => [index('issues_by_sheet').on(table.sheetId)],
)

/** Every step on the way of a sheet, with its reason. */
export const sheetMoves = sqliteTable(
  'sheet_moves',
  {
    id: integer().primaryKey({ autoIncrement: true }),
    sheetId: ofSheet(),
    move: text().notNull(),
    from: text({ enum: SHEET_STATUSES }).notNull(),
    to: text({ enum: SHEET_STATUSES }).notNull(),
    reason: text().notNull().default(''),
    at: moment('at').notNull(),
    by: author('by'),
  },
  (table) => [index('moves_by_sheet').on(table.sheetId)],
)

/** What the sheets of an organisation bear at their head; a row comes with the first change. */
export const letterheads = sqliteTable('letterheads', {
  organisationId: text('organisation_id')
    .primaryKey()
    .references(() => organisations.id),
  /** Empty: the name of the organisation. */
  name: text().notNull(),
  address: text().notNull(),
  disclaimer: text().notNull(),
  logo: text({ mode: 'json' }).$type<Letterhead['logo']>(),
  version: integer().notNull(),
  updatedAt: moment('updated_at').notNull(),
  updatedBy: author('updated_by'),
})
