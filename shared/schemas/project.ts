import { z } from 'zod'
import { MEMBER_ROLES } from '../access/roles'
import { VERDICTS } from './section-result'
import { timeZoneSchema } from './account'
import { restingForecastSchema } from './forecast'
import { stationsSchema, stationSchema } from './line'
import { backgroundSchema, DEFAULT_ENDS, lineEndsSchema, marksSchema } from './mark'
import {
  listQuerySchema,
  momentSchema,
  nameSchema,
  noteSchema,
  pageOf,
  versionSchema,
} from './paging'
import { scenarioContentSchema, scenarioSummarySchema } from './scenario'

const personRef = z.strictObject({ id: z.string(), name: z.string() })

/** When and by whom something was made and last changed, and whether it is put away. */
const kept = {
  createdAt: momentSchema,
  createdBy: personRef,
  updatedAt: momentSchema,
  updatedBy: personRef,
  archivedAt: momentSchema.nullable(),
  version: versionSchema,
}

/** Fields without defaults: what a change leaves out stays as it is. */
const projectFields = z.strictObject({
  name: nameSchema,
  site: z.string().trim().max(200),
  client: z.string().trim().max(200),
  datum: z.string().trim().min(1).max(60),
  timeZone: timeZoneSchema,
  note: noteSchema,
})

/** `POST /api/projects` */
export const newProjectSchema = projectFields.extend({
  site: projectFields.shape.site.default(''),
  client: projectFields.shape.client.default(''),
  timeZone: timeZoneSchema.default('UTC'),
  note: noteSchema.default(''),
})

/** `PATCH /api/projects/:projectId` */
export const projectChangeSchema = projectFields.partial().extend({ version: versionSchema })

export const projectSchema = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    site: z.string(),
    client: z.string(),
    datum: z.string(),
    timeZone: z.string(),
    note: z.string(),
    myRole: z.enum(MEMBER_ROLES).meta({ description: 'Role that counts for whoever asks' }),
    lines: z.number().int(),
    scenarios: z.number().int(),
    ...kept,
  })
  .meta({ id: 'Project' })
export type Project = z.output<typeof projectSchema>

/** `GET /api/projects` */
export const projectsQuerySchema = listQuerySchema.extend({
  sort: z.enum(['name', 'updated', 'created']).default('updated'),
})
export const projectsPageSchema = pageOf(projectSchema)

/** `GET, POST /api/projects/:projectId/members`, `PATCH, DELETE …/members/:accountId` */
export const memberSchema = z.strictObject({
  accountId: z.string(),
  name: z.string(),
  organisation: z.string(),
  role: z.enum(MEMBER_ROLES),
  accountRole: z.string(),
  mayCheck: z.boolean(),
  mayApprove: z.boolean(),
  isActive: z.boolean(),
  addedAt: momentSchema,
})
export const membersSchema = z.strictObject({ members: z.array(memberSchema) })
export const newMemberSchema = z.strictObject({
  email: z.string().trim().toLowerCase().min(1).max(254),
  role: z.enum(MEMBER_ROLES),
})
export const memberChangeSchema = z.strictObject({ role: z.enum(MEMBER_ROLES) })

/** `GET, POST /api/projects/:projectId/gauges`, `PATCH, DELETE …/gauges/:gaugeId` */
const gaugeFields = z.strictObject({
  name: nameSchema,
  zero: z.number().min(-500).max(9000).meta({ unit: 'm' }),
  correction: z.number().min(-100).max(100).meta({ unit: 'm' }),
  note: noteSchema,
})
export const newGaugeSchema = gaugeFields.extend({
  correction: gaugeFields.shape.correction.default(0),
  note: noteSchema.default(''),
})
export const gaugeChangeSchema = gaugeFields.partial().extend({ version: versionSchema })
export const gaugeSchema = z.strictObject({
  id: z.string(),
  name: z.string(),
  zero: z.number(),
  correction: z.number(),
  note: z.string(),
  ...kept,
})
export type Gauge = z.output<typeof gaugeSchema>
export const gaugesSchema = z.strictObject({ gauges: z.array(gaugeSchema) })

/** `GET, POST /api/projects/:projectId/lines` */
const lineFields = z.strictObject({
  name: nameSchema,
  note: noteSchema,
  sectionLength: z.number().min(1).max(100).meta({ unit: 'm' }),
  stations: stationsSchema,
  marks: marksSchema,
  ends: lineEndsSchema,
  background: backgroundSchema.nullable(),
})
export const newLineSchema = lineFields.extend({
  note: noteSchema.default(''),
  sectionLength: lineFields.shape.sectionLength.default(10),
  marks: marksSchema.default([]),
  ends: lineEndsSchema.default(DEFAULT_ENDS),
  background: lineFields.shape.background.default(null),
})
/** `PATCH …/lines/:lineId`; stations replace all that were there. */
export const lineChangeSchema = lineFields.partial().extend({ version: versionSchema })
export const lineSchema = z
  .strictObject({
    id: z.string(),
    name: z.string(),
    note: z.string(),
    sectionLength: z.number(),
    stations: z.array(stationSchema),
    marks: marksSchema,
    ends: lineEndsSchema,
    background: backgroundSchema.nullable(),
    scenarios: z.number().int(),
    warnings: z
      .array(z.strictObject({ path: z.string(), message: z.string() }))
      .meta({ description: 'What looks like a slip in the survey, and may be right' }),
    ...kept,
  })
  .meta({ id: 'Line' })
export type Line = z.output<typeof lineSchema>
export const lineListItemSchema = lineSchema
  .omit({ stations: true, marks: true, ends: true, background: true, warnings: true })
  .extend({
    stationCount: z.number().int(),
    length: z.number().meta({ unit: 'm' }),
  })
export const linesQuerySchema = listQuerySchema.extend({
  sort: z.enum(['name', 'updated', 'created']).default('name'),
})
export const linesPageSchema = pageOf(lineListItemSchema)

/** `POST …/lines/:lineId/scenarios` */
export const newScenarioSchema = z.strictObject({
  name: nameSchema,
  note: noteSchema.default(''),
  content: scenarioContentSchema,
})
/** `PUT …/scenarios/:scenarioId`: the whole state, made on `version`. */
export const scenarioSaveSchema = newScenarioSchema.extend({ version: versionSchema })
export const scenarioSchema = z
  .strictObject({
    id: z.string(),
    lineId: z.string(),
    name: z.string(),
    note: z.string(),
    content: scenarioContentSchema,
    summary: scenarioSummarySchema,
    ...kept,
  })
  .meta({ id: 'Scenario' })
export type Scenario = z.output<typeof scenarioSchema>

/** Row of "all scenarios of a line in one table". */
export const scenarioListItemSchema = scenarioSchema.omit({ content: true }).extend({
  basis: z.string(),
  upliftModel: z.string(),
  forecast: restingForecastSchema.nullable(),
  /** The edges along the line: 0 sealed, 1 open; a run may have its own. */
  edges: z.strictObject({ least: z.number(), most: z.number() }),
})
export type ScenarioListItem = z.output<typeof scenarioListItemSchema>
/** `GET …/scenarios` and `GET …/scenarios.csv` */
export const scenariosQuerySchema = listQuerySchema.extend({
  sort: z.enum(['name', 'updated', 'level', 'holdsTo', 'verdict']).default('updated'),
  verdict: z.enum([...VERDICTS, 'any']).default('any'),
})
export const scenariosPageSchema = pageOf(scenarioListItemSchema)

/** Answer to a save on an older version (409): what is there now, beside what was sent. */
export const scenarioConflictSchema = z.strictObject({
  code: z.literal('conflict'),
  message: z.string(),
  fields: z.array(z.never()),
  current: scenarioSchema,
})

/** `GET …/scenarios/:scenarioId/versions`, `GET …/versions/:version`, `POST …/versions/:version/restoration` */
export const scenarioVersionSchema = z.strictObject({
  version: versionSchema,
  name: z.string(),
  savedAt: momentSchema,
  savedBy: personRef,
  summary: scenarioSummarySchema,
})
export const scenarioVersionsSchema = z.strictObject({ versions: z.array(scenarioVersionSchema) })
export const scenarioVersionContentSchema = scenarioVersionSchema.extend({
  note: z.string(),
  content: scenarioContentSchema,
})

/** `POST …/duplicates` of a project, line or scenario. */
export const duplicateSchema = z.strictObject({ name: nameSchema })

/** `GET, POST /api/projects/:projectId/files`, `PATCH, DELETE …/files/:fileId`, `GET …/files/:fileId/content` */
export const projectFileSchema = z.strictObject({
  id: z.string(),
  name: z.string(),
  caption: z.string(),
  mediaType: z.string(),
  size: z.number().int().meta({ unit: 'byte' }),
  width: z.number().int().nullable(),
  height: z.number().int().nullable(),
  uploadedAt: momentSchema,
  uploadedBy: personRef,
})
export type ProjectFile = z.output<typeof projectFileSchema>
export const projectFilesSchema = z.strictObject({ files: z.array(projectFileSchema) })
/** `POST …/files`, as multipart: one file, and its caption. */
export const fileUploadSchema = z.strictObject({
  file: z.string().meta({ format: 'binary', description: 'JPEG, PNG, WebP, PDF, CSV or text' }),
  caption: z.string().trim().max(300).default(''),
})
export const fileChangeSchema = z.strictObject({
  name: nameSchema.optional(),
  caption: z.string().trim().max(300).optional(),
})

/** `GET /api/desk`: my projects, sheets that wait for me, what changed. */
export const deskSchema = z.strictObject({
  projects: z.array(projectSchema),
  /** The longest waiting first. */
  waiting: z.array(
    z.strictObject({
      id: z.string(),
      number: z.string(),
      revision: z.string(),
      place: z.string(),
      what: z
        .enum(['check', 'approve', 'submit'])
        .meta({ description: 'What I can do; submit: it was returned to me' }),
      since: momentSchema,
      project: z.strictObject({ id: z.string(), name: z.string() }),
    }),
  ),
  changes: z.array(
    z.strictObject({
      at: momentSchema,
      actorName: z.string(),
      action: z.string(),
      subjectType: z.string(),
      subjectName: z.string(),
      project: z.strictObject({ id: z.string(), name: z.string() }),
      lineId: z.string().nullable(),
      scenarioId: z.string().nullable(),
    }),
  ),
})
