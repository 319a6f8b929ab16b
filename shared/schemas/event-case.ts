import { z } from 'zod'
import { CHECK_IDS, VERDICTS } from './check-ids'
import { sectionCaseSchema } from './section-case'

const parts = sectionCaseSchema.shape
const metres = (description: string) => z.number().meta({ unit: 'm', description })
const momentSchema = z
  .string()
  .max(40)
  .meta({ description: 'ISO 8601 with its offset from UTC: 2031-03-03T22:00:00+01:00' })

/** A series of levels as it is sent. */
const levelSeriesSchema = z.strictObject({
  unit: z.enum(['m', 'ft']).default('m').meta({ description: 'Unit of its levels' }),
  datum: z.string().trim().max(60).optional(),
  issued: momentSchema.optional().meta({ description: 'When the forecast was issued' }),
  readings: z.array(
    z.strictObject({
      time: momentSchema,
      level: z.number().nullable().meta({ description: 'null: a gap' }),
    }),
  ),
})

const airSchema = z.strictObject({
  filledAt: z.number().meta({ unit: '°C', description: 'Air temperature when filled' }),
  readings: z.array(
    z.strictObject({ time: momentSchema, temperature: z.number().meta({ unit: '°C' }) }),
  ),
  leak: z
    .strictObject({
      volume: z.number().meta({ unit: 'm³', description: 'Volume of air that is joined' }),
      coefficient: z.number().meta({ unit: 'm³/(s √Pa)', description: 'C of Q = C √p' }),
      compressor: z
        .strictObject({
          flow: z.number().meta({ unit: 'm³/s' }),
          startPressure: z.number().meta({ unit: 'Pa' }),
        })
        .optional(),
    })
    .optional(),
})

/** One section through a time series of levels. */
export const eventCaseSchema = z
  .strictObject({
    command: z.literal('event').optional().meta({ description: 'Must match the batch command' }),
    section: sectionCaseSchema
      .omit({ command: true })
      .extend({
        water: parts.water.omit({ depth: true, dryDepth: true }).prefault({}),
        uplift: parts.uplift.unwrap().omit({ time: true }).prefault({}),
      })
      .meta({ description: 'As for `section`; depths and time follow from the series' }),
    groundLevel: metres('Lowest ground of the section, in the datum of the levels'),
    water: levelSeriesSchema.meta({ description: 'Level on the wet side' }),
    pond: levelSeriesSchema.optional().meta({ description: 'Level on the dry side' }),
    air: airSchema.optional(),
    step: z.number().default(900).meta({ unit: 's', description: 'Longest step' }),
    timeToClear: z.number().default(1200).meta({ unit: 's' }),
    groundBefore: z
      .enum(['soaked', 'dry'])
      .default('soaked')
      .meta({ description: 'What the ground has seen where the series begins in water' }),
  })
  .meta({ id: 'EventCase', description: 'One section through an event, SI units' })
export type EventCase = z.output<typeof eventCaseSchema>

const time = z.string().meta({ description: 'ISO 8601, UTC' })
const nullable = z.number().nullable()
const checkId = z.enum(CHECK_IDS)
const atMoment = z.strictObject({ time, value: z.number() })
const failure = z.strictObject({
  from: time,
  to: time.nullable().meta({ description: 'null: it still fails at the end of the series' }),
  level: metres('Water level when it begins'),
  check: checkId,
})

export const eventResultSchema = z
  .strictObject({
    verdict: z.enum(VERDICTS),
    worst: z.strictObject({ time, check: checkId, utilisation: nullable }),
    firstFailure: failure.nullable(),
    failures: z.array(failure),
    leastSliding: atMoment.nullable(),
    leastFreeboard: atMoment.nullable(),
    highestLevel: atMoment,
    lowestAirPressure: atMoment,
    holdsToLevel: nullable.meta({ unit: 'm' }),
    holdsToCheck: checkId,
    leave: z.strictObject({
      state: z.enum(['leave-at', 'leave-before-level', 'leave-now', 'none']),
      level: nullable.meta({ unit: 'm' }),
      margin: metres('Below the level that holds'),
      time: time.nullable(),
    }),
    pondLimit: z
      .strictObject({ dryDepth: nullable, check: checkId, level: nullable })
      .nullable()
      .meta({ description: 'Pond at which it fails while the water stands highest' }),
    gaps: z.array(z.strictObject({ from: time, to: time })),
    moments: z.array(
      z.strictObject({
        time,
        depth: z.number(),
        dryDepth: z.number(),
        airPressure: z.number(),
        uplift: z.number(),
        verdict: z.enum(VERDICTS),
        governs: checkId,
        utilisation: nullable,
        sliding: nullable,
        skirt: nullable,
        freeboard: nullable,
      }),
    ),
  })
  .meta({ id: 'EventResult' })
export type EventResult = z.output<typeof eventResultSchema>
