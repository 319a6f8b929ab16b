import { z } from 'zod'
import { momentSchema, noteSchema } from './paging'

/** Where a forecast issue comes from. A `call` is a sketch from a few figures, and marked as such. */
export const FORECAST_ORIGINS = ['call', 'typed', 'csv', 'waterml'] as const
export type ForecastOrigin = (typeof FORECAST_ORIGINS)[number]

/**
 * What a sent figure is: `stage` above gauge zero, `gaugeLevel` in the datum at the gauge, or
 * `siteLevel` in the datum at the line. Kept are site levels: gauge zero + stage + correction.
 */
export const LEVEL_REFERENCES = ['stage', 'gaugeLevel', 'siteLevel'] as const
export type LevelReference = (typeof LEVEL_REFERENCES)[number]

export const FORECAST_BANDS = ['low', 'expected', 'high'] as const
export type ForecastBand = (typeof FORECAST_BANDS)[number]

/** Most readings of one issue, forecast or observed: seven weeks by the quarter of an hour. */
export const MOST_FORECAST_READINGS = 5000

const level = z.number().meta({ unit: 'm' })

/** Forecast levels of one moment; null: nothing is known, and nothing is computed across it. */
export const forecastReadingSchema = z.strictObject({
  time: momentSchema,
  expected: level.nullable(),
  low: level.nullable().default(null),
  high: level.nullable().default(null),
})
export type ForecastReading = z.output<typeof forecastReadingSchema>

export const observedReadingSchema = z.strictObject({
  time: momentSchema,
  level: level.nullable().meta({ description: 'null: a gap' }),
})
export type ObservedReading = z.output<typeof observedReadingSchema>

/** What is said on the telephone. Levels are as `reference` says, except the lowest ground. */
export const forecastCallSchema = z.strictObject({
  levelNow: level,
  at: momentSchema.meta({ description: 'Moment of the level now' }),
  crest: level,
  margin: level.nullable().default(null).meta({ description: '± on every level; null: no band' }),
  crestAt: momentSchema,
  hoursAbove: z
    .number()
    .nullable()
    .default(null)
    .meta({ unit: 'h', description: 'Hours above the lowest ground; null: a plain mirror' }),
  lowestGround: level
    .nullable()
    .default(null)
    .meta({ description: 'Lowest ground of the line, in its datum' }),
})
export type ForecastCall = z.output<typeof forecastCallSchema>

/**
 * `POST /api/projects/:projectId/gauges/:gaugeId/forecasts`: a call, from which the server draws the
 * sketch, or readings from any other origin.
 */
export const newForecastSchema = z.strictObject({
  origin: z.enum(FORECAST_ORIGINS),
  issuedAt: momentSchema,
  reference: z.enum(LEVEL_REFERENCES).default('siteLevel'),
  call: forecastCallSchema.nullable().default(null),
  readings: z.array(forecastReadingSchema).max(MOST_FORECAST_READINGS).default([]),
  observed: z.array(observedReadingSchema).max(MOST_FORECAST_READINGS).default([]),
  note: noteSchema.default(''),
})
export type NewForecast = z.output<typeof newForecastSchema>

/** Highest level that is still to come, after the newest observed level has shifted it. */
export const forecastCrestSchema = z.strictObject({
  time: momentSchema,
  expected: level,
  low: level.nullable(),
  high: level.nullable(),
  isReached: z
    .boolean()
    .meta({ description: 'false: the forecast ends while it still rises, before its crest' }),
})
export type ForecastCrest = z.output<typeof forecastCrestSchema>

/** Newest observed level less what was forecast for its moment; added to every later hour. */
export const observedShiftSchema = z.strictObject({ at: momentSchema, shift: level })
export type ObservedShift = z.output<typeof observedShiftSchema>

/** A forecast issue of a gauge. All levels are in the datum of the line, as they were issued. */
export const forecastSchema = z
  .strictObject({
    id: z.string(),
    gaugeId: z.string(),
    origin: z.enum(FORECAST_ORIGINS),
    issuedAt: momentSchema,
    note: z.string(),
    call: forecastCallSchema
      .nullable()
      .meta({ description: 'What a sketch was drawn from, in the datum of the line' }),
    gauge: z
      .strictObject({ name: z.string(), zero: level, correction: level })
      .meta({ description: 'The gauge as it was when the levels were carried to the line' }),
    readings: z.array(forecastReadingSchema),
    observed: z.array(observedReadingSchema),
    shift: observedShiftSchema.nullable(),
    crest: forecastCrestSchema.nullable(),
    createdAt: momentSchema,
    createdBy: z.strictObject({ id: z.string(), name: z.string() }),
  })
  .meta({ id: 'Forecast' })
export type Forecast = z.output<typeof forecastSchema>

/** Row of `GET …/forecasts`, the newest issue first. */
export const forecastListItemSchema = forecastSchema
  .omit({ readings: true, observed: true, call: true, gauge: true })
  .extend({ readingCount: z.number().int(), observedCount: z.number().int() })
export type ForecastListItem = z.output<typeof forecastListItemSchema>
/** `GET …/gauges/:gaugeId/forecasts`, and `GET /api/projects/:projectId/forecasts` */
export const forecastsSchema = z.strictObject({ forecasts: z.array(forecastListItemSchema) })

/** `POST …/forecasts/:forecastId/observed`; a moment that is there already gets the new level. */
export const newObservedSchema = z.strictObject({
  reference: z.enum(LEVEL_REFERENCES).default('siteLevel'),
  observed: z.array(observedReadingSchema).min(1).max(MOST_FORECAST_READINGS),
})
export type NewObserved = z.output<typeof newObservedSchema>

/** The forecast issue that a scenario rests on; its level is the crest of the band. */
export const restingForecastSchema = z.strictObject({
  gaugeId: z.string().max(80),
  forecastId: z.string().max(80),
  issuedAt: momentSchema,
  band: z.enum(FORECAST_BANDS).default('expected'),
  shiftedAt: momentSchema
    .nullable()
    .default(null)
    .meta({ description: 'Moment of the observed level that had shifted the crest' }),
})
export type RestingForecast = z.output<typeof restingForecastSchema>
