import { z } from 'zod'
import { SEPARATE_APPROVER, SHEET_MOVES } from '../access/sheet-moves'
import { momentSchema, pageOf, listQuerySchema, versionSchema } from './paging'
import { VERDICTS } from './section-result'
import {
  assumptionSchema,
  CHECK_CATEGORIES,
  inputSourcesSchema,
  PAPERS,
  sheetSchema,
} from './sheet'
import { SHEET_STATUSES } from './sheet-status'
import { UNIT_SYSTEMS } from '../units'

const person = z.strictObject({ id: z.string(), name: z.string(), organisation: z.string() })
const reasonSchema = z.string().trim().max(400)
const lineNumber = z.string().max(12)

/** `GET, PUT /api/projects/:projectId/sheet-settings` */
export const sheetSettingsSchema = z.strictObject({
  numberPattern: z
    .string()
    .trim()
    .max(40)
    .regex(/^[^#]*#{1,6}[^#]*$/, 'a text with one run of # for the digits, such as FQ-###')
    .meta({ description: 'A run of # stands for the digits: FQ-###' }),
  separateApprover: z
    .enum(SEPARATE_APPROVER)
    .meta({ description: 'by-category: approver and checker differ in category 2 and 3' }),
})
export type SheetSettings = z.output<typeof sheetSettingsSchema>

/** What somebody writes of a sheet; figures are computed by the server. */
const sheetWords = z.strictObject({
  category: z.literal(CHECK_CATEGORIES),
  purpose: z.string().trim().max(600),
  revisionReason: reasonSchema,
  conditions: z.array(z.string().trim().min(1).max(300)).max(20),
  assumptions: z.array(assumptionSchema).max(40),
  inputSources: inputSourcesSchema,
  paper: z.enum(PAPERS),
})

const scenarioSource = z.strictObject({
  lineId: z.string().max(80),
  scenarioId: z.string().max(80),
  place: z
    .number()
    .optional()
    .meta({ unit: 'm', description: 'Chainage; left out: where the workbench looks' }),
})

/** `POST /api/projects/:projectId/sheets` */
export const newSheetSchema = sheetWords.partial().extend(scenarioSource.shape)

/** A photograph of the project's files, with what it shows. */
const photographSchema = z.strictObject({
  fileId: z.string().min(1).max(80),
  caption: z.string().trim().max(300),
})

/** All that somebody writes of a draft beside its figures. */
export const draftWordsSchema = sheetWords.extend({
  title: z.string().trim().min(1).max(200),
  project: sheetSchema.shape.project,
  units: z.enum(UNIT_SYSTEMS),
  photographs: z.array(photographSchema).max(24),
})
export type DraftWords = z.output<typeof draftWordsSchema>

/** `PATCH …/sheets/:sheetId`; with `source` its figures are taken from a scenario anew. */
export const sheetChangeSchema = draftWordsSchema
  .partial()
  .extend({ version: versionSchema, source: scenarioSource.optional() })

/** `POST …/sheets/:sheetId/moves` */
export const sheetMoveSchema = z.strictObject({
  move: z.enum(SHEET_MOVES),
  version: versionSchema,
  reason: reasonSchema.default(''),
})

export const sheetListItemSchema = z.strictObject({
  id: z.string(),
  number: z.string(),
  revision: z.string(),
  status: z.enum(SHEET_STATUSES),
  category: z.number().int(),
  place: z.string(),
  verdict: z.enum(VERDICTS),
  holdsToLevel: z.number().nullable().meta({ unit: 'm' }),
  preparedBy: z.string(),
  openComments: z.number().int(),
  issuedAt: momentSchema.nullable(),
  updatedAt: momentSchema,
})
export type SheetListItem = z.output<typeof sheetListItemSchema>
/** `GET /api/projects/:projectId/sheets` */
export const sheetsQuerySchema = listQuerySchema
  .omit({ archived: true })
  .extend({ status: z.enum([...SHEET_STATUSES, 'any']).default('any') })
export const sheetsPageSchema = pageOf(sheetListItemSchema)

/** `PUT …/sheets/:sheetId/marks/:line` */
export const sheetMarkChangeSchema = z.strictObject({
  isTicked: z.boolean(),
  figure: z.number().nullable().meta({ description: 'Own figure, in the unit of the line' }),
  note: z.string().trim().max(400).default(''),
})
export const sheetMarkSchema = z.strictObject({
  line: lineNumber,
  isTicked: z.boolean(),
  figure: z.number().nullable(),
  note: z.string(),
  at: momentSchema,
  by: z.string(),
})
export type SheetMark = z.output<typeof sheetMarkSchema>

/** `POST …/comments` */
export const newCommentSchema = z.strictObject({
  line: lineNumber.nullable().default(null),
  text: z.string().trim().min(1).max(2000),
})
/** `PATCH …/comments/:commentId` */
export const commentChangeSchema = z.strictObject({
  answer: z.string().trim().min(1).max(2000).optional(),
  isResolved: z.boolean().optional(),
})
export const sheetCommentSchema = z.strictObject({
  id: z.string(),
  line: lineNumber.nullable(),
  text: z.string(),
  at: momentSchema,
  by: z.strictObject({ id: z.string(), name: z.string() }),
  answer: z.string(),
  answeredAt: momentSchema.nullable(),
  answeredBy: z.string().nullable(),
  resolvedAt: momentSchema.nullable(),
  resolvedBy: z.string().nullable(),
})
export type SheetComment = z.output<typeof sheetCommentSchema>

/** `POST …/issues`: to whom a sheet was given. */
export const newIssueSchema = z.strictObject({
  recipient: z.string().trim().min(1).max(200),
  note: z.string().trim().max(400).default(''),
})
const issueSchema = newIssueSchema.extend({ at: momentSchema, by: z.string(), note: z.string() })

export const differenceSchema = z.strictObject({
  path: z.string(),
  before: z.union([z.string(), z.number(), z.boolean(), z.null()]),
  after: z.union([z.string(), z.number(), z.boolean(), z.null()]),
})

const signed = z.strictObject({ person, at: momentSchema }).nullable()

/** `GET …/sheets/:sheetId`: the sheet, what was done with it, and what whoever asks may do. */
export const sheetRecordSchema = z
  .strictObject({
    id: z.string(),
    projectId: z.string(),
    number: z.string(),
    revision: z.string(),
    status: z.enum(SHEET_STATUSES),
    version: versionSchema,
    content: sheetSchema,
    source: z.strictObject({
      lineId: z.string(),
      scenarioId: z.string(),
      scenarioVersion: z.number().int(),
      place: z.number(),
    }),
    preparedBy: person,
    preparedAt: momentSchema.nullable(),
    checked: signed,
    approved: signed,
    issuedAt: momentSchema.nullable(),
    code: z.string().nullable(),
    digest: z.string(),
    fileSha256: z.string(),
    pages: z.number().int(),
    revisions: z.array(
      z.strictObject({ id: z.string(), revision: z.string(), status: z.enum(SHEET_STATUSES) }),
    ),
    previousId: z.string().nullable(),
    marks: z.array(sheetMarkSchema),
    comments: z.array(sheetCommentSchema),
    issues: z.array(issueSchema),
    history: z.array(
      z.strictObject({
        move: z.string(),
        from: z.enum(SHEET_STATUSES),
        to: z.enum(SHEET_STATUSES),
        reason: z.string(),
        at: momentSchema,
        by: z.string(),
      }),
    ),
    may: z.strictObject({
      moves: z.array(z.strictObject({ move: z.enum(SHEET_MOVES), needsReason: z.boolean() })),
      edit: z.boolean(),
      mark: z.boolean(),
      comment: z.boolean(),
      answer: z.boolean(),
      issue: z.boolean(),
      copy: z.boolean(),
    }),
    /** What this version of the program computes differently; nothing in the sheet changes. */
    drift: z.strictObject({ software: z.string(), differences: z.array(differenceSchema) }),
    createdAt: momentSchema,
    updatedAt: momentSchema,
  })
  .meta({ id: 'SheetRecord' })
export type SheetRecord = z.output<typeof sheetRecordSchema>

/** `GET …/sheets/:sheetId/changes`: what is new against the revision before. */
export const sheetChangesSchema = z.strictObject({
  against: z.string().nullable().meta({ description: 'Revision before; null: this is the first' }),
  differences: z.array(differenceSchema),
})

/** `GET /api/sheets/:sheetId`: in which project a sheet is. */
export const sheetPlaceSchema = z.strictObject({ projectId: z.string(), sheetId: z.string() })

/** `POST …/sheets/:sheetId/scenarios`: the inputs as a scenario of their own. */
export const sheetCopySchema = z.strictObject({ name: z.string().trim().min(1).max(120) })
