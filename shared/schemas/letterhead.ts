import { z } from 'zod'
import { versionSchema } from './paging'
import { letterheadSchema, pictureSchema } from './sheet'

/** Largest logo as it is sent, as base64: a picture of about 150 kB. */
export const LARGEST_LOGO = 200_000

/** `GET, PUT /api/admin/organisations/:organisationId/letterhead` */
export const letterheadRecordSchema = z
  .strictObject({
    name: letterheadSchema.shape.name.meta({
      description: 'Empty: the name of the organisation',
    }),
    address: letterheadSchema.shape.address,
    disclaimer: letterheadSchema.shape.disclaimer,
    logo: pictureSchema
      .extend({ base64: z.base64().min(4).max(LARGEST_LOGO) })
      .nullable()
      .default(null)
      .meta({ description: 'PNG or JPEG, up to 150 kB' }),
    version: versionSchema,
  })
  .meta({ id: 'Letterhead' })
export type LetterheadRecord = z.output<typeof letterheadRecordSchema>
