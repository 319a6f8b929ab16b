import { z } from 'zod'

/** `demonstration` shows a banner and may hold demo data; `production` never does. */
export const MODES = ['demonstration', 'production'] as const
export type Mode = (typeof MODES)[number]

/** Answer of `GET /api/health` while the server can do its work. */
export const healthSchema = z
  .strictObject({
    status: z.literal('ok'),
    version: z.string().meta({ description: 'Version of the program' }),
    mode: z.enum(MODES).meta({ description: 'In demonstration mode the page says so' }),
    database: z.literal('reachable'),
  })
  .meta({ id: 'Health', description: 'The server runs and reaches its database' })
export type Health = z.infer<typeof healthSchema>
