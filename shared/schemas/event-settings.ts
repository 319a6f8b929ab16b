import { z } from 'zod'
import { momentSchema } from './paging'

/** Most temperatures of one night. */
export const MOST_TEMPERATURES = 200

/** Air temperature at a moment; straight between two, and before the first and after the last, that one. */
export const airTemperatureSchema = z.strictObject({
  time: momentSchema,
  temperature: z.number().meta({ unit: '°C' }),
})
export type AirTemperature = z.output<typeof airTemperatureSchema>

/** How a scenario is taken through the forecast that it rests on. */
export const eventSettingsSchema = z
  .strictObject({
    asAt: momentSchema
      .nullable()
      .default(null)
      .meta({ description: 'Moment that counts as now; null: the clock' }),
    groundBefore: z
      .enum(['soaked', 'dry'])
      .default('soaked')
      .meta({ description: 'What the ground has seen where the series begins in water' }),
    filledAt: z.number().nullable().default(null).meta({
      unit: '°C',
      description: 'Air temperature when filled; null: the first of the night',
    }),
    air: z
      .array(airTemperatureSchema)
      .max(MOST_TEMPERATURES)
      .default([])
      .meta({ description: 'Air through the night; empty: the pressure of each size stays' }),
  })
  .meta({ id: 'EventSettings', description: 'How a scenario is taken through its forecast' })
export type EventSettings = z.output<typeof eventSettingsSchema>
