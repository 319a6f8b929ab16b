import { z } from 'zod'
import { momentSchema, nameSchema, noteSchema, versionSchema } from './paging'

/** What a depot holds. */
export const STORE_KINDS = ['tube', 'closure', 'blower', 'ballast-bag', 'edge-bag', 'plug'] as const
export type StoreKind = (typeof STORE_KINDS)[number]

const amount = z.number().int().min(0).max(100_000)
const seconds = (meaning: string) =>
  z.number().min(0).max(604_800).meta({ unit: 's', description: meaning })

/** A row of a store: one kind in one size. */
export const storeItemSchema = z.strictObject({
  kind: z.enum(STORE_KINDS),
  barrierId: z
    .string()
    .min(1)
    .max(80)
    .nullable()
    .default(null)
    .meta({ description: 'Tube of the catalogue; null for anything else' }),
  diameter: z
    .number()
    .positive()
    .max(5)
    .nullable()
    .default(null)
    .meta({ unit: 'm', description: 'Pipe that a plug fits' }),
  mass: z
    .number()
    .positive()
    .max(2000)
    .nullable()
    .default(null)
    .meta({ unit: 'kg', description: 'Mass of one bag' }),
  serviceable: amount.meta({ description: 'Pieces that can be used now' }),
  inRepair: amount.default(0).meta({ description: 'Pieces that are there but cannot be used' }),
  note: z.string().trim().max(200).default(''),
})
export type StoreItem = z.output<typeof storeItemSchema>

/** Pairs or larger crews that work from a depot. */
export const crewSchema = z.strictObject({
  crews: z.number().int().min(1).max(100).meta({ description: 'Crews of this kind' }),
  people: z.number().int().min(1).max(50).meta({ description: 'People in each' }),
  delay: seconds('How much later they are there than the first').default(0),
  note: z.string().trim().max(200).default(''),
})
export type Crew = z.output<typeof crewSchema>

/** Fields without defaults: what a change leaves out stays as it is. */
const depotFields = z.strictObject({
  name: nameSchema,
  callOutTime: seconds('From the decision until the crew is at the depot'),
  loadTime: seconds('To load what is needed'),
  driveTime: seconds('To drive to the line'),
  crews: z.array(crewSchema).max(50),
  items: z.array(storeItemSchema).max(200),
  note: noteSchema,
})

/** `POST /api/depots` */
export const newDepotSchema = depotFields.extend({
  callOutTime: depotFields.shape.callOutTime.default(0),
  loadTime: depotFields.shape.loadTime.default(0),
  driveTime: depotFields.shape.driveTime.default(0),
  crews: depotFields.shape.crews.default([]),
  items: depotFields.shape.items.default([]),
  note: noteSchema.default(''),
})
export type NewDepot = z.output<typeof newDepotSchema>

/** `PATCH /api/depots/:depotId`; items and crews replace all that were there. */
export const depotChangeSchema = depotFields.partial().extend({ version: versionSchema })

export const depotSchema = depotFields
  .extend({
    id: z.string(),
    updatedAt: momentSchema,
    updatedBy: z.strictObject({ id: z.string(), name: z.string() }),
    version: versionSchema,
  })
  .meta({ id: 'Depot' })
export type Depot = z.output<typeof depotSchema>

/** `GET /api/depots`, `GET /api/projects/:projectId/store` */
export const storeSchema = z.strictObject({
  organisation: z.strictObject({ id: z.string(), name: z.string() }),
  depots: z.array(depotSchema),
})
export type Store = z.output<typeof storeSchema>
