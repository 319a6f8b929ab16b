import { z } from 'zod'
import { UNIT_SYSTEMS } from '../units'
import { FORECAST_BANDS } from './forecast'
import { END_KINDS, MARK_KINDS } from './mark'
import { momentSchema } from './paging'
import { VERDICTS } from './section-result'

const metres = (description: string) => z.number().meta({ unit: 'm', description })
const seconds = (description: string) => z.number().meta({ unit: 's', description })
const count = (description: string) => z.number().int().meta({ description })

/** A level, and what a gauge reads at it; null where the crew sees no gauge. */
const staged = z.strictObject({
  level: metres('In the datum of the line'),
  stage: metres('On the gauge that the crew sees').nullable(),
})

/** The forecast issue that an order rests on. */
export const orderForecastSchema = z.strictObject({
  gauge: z.string(),
  issuedAt: momentSchema,
  isSketch: z.boolean().meta({ description: 'Drawn from a telephone call' }),
  band: z.enum(FORECAST_BANDS).meta({ description: 'Band that the order was made for' }),
  crest: metres('Level of the crest in that band').nullable(),
  crestAt: momentSchema.nullable(),
  low: metres('Low end of the band at the crest').nullable(),
  high: metres('High end of the band at the crest').nullable(),
  /** What the gauge should read, by the hour, so that a round can compare. */
  hours: z.array(staged.extend({ at: momentSchema })).max(72),
})

/** A way for water that is shut before anything is laid. */
export const orderPlugSchema = z.strictObject({
  kind: z.enum([...MARK_KINDS, ...END_KINDS]),
  isEnd: z.boolean(),
  chainage: metres('Along the line'),
  offset: metres('From the line, positive to the dry side').nullable(),
  diameter: metres('Of the pipe').nullable(),
  shortBy: metres('How much an end is too low'),
  flows: z.boolean().meta({ description: 'The water reaches it at the level of the order' }),
  note: z.string(),
})

/** One section, in the order in which it is laid. */
export const orderSectionSchema = z.strictObject({
  position: count('1 for the first that is laid'),
  from: metres('Chainage'),
  to: metres('Chainage'),
  tube: z.string(),
  diameter: metres('Of the tube'),
  edgeBags: count('Bags on the edge of the skirt'),
  ballast: z.number().nullable().meta({ unit: 'kg', description: 'null: no gust is given' }),
  ballastBags: count('Bags for it').nullable(),
  /** Turn at its start, positive to the left; 0: straight on. */
  turn: z.number().meta({ unit: 'rad' }),
  pair: count('1 for the first pair').nullable(),
  start: momentSchema.nullable(),
  finish: momentSchema.nullable(),
  deadline: momentSchema.nullable().meta({ description: 'The water reaches its lowest ground' }),
  margin: seconds('Deadline less finish; negative: late').nullable(),
  verdict: z.enum(VERDICTS),
})
export type OrderSection = z.output<typeof orderSectionSchema>

/** How hard a size is filled. */
export const orderAirSchema = z.strictObject({
  tube: z.string(),
  diameter: metres('Of the tube'),
  pieces: count('Tubes of this size'),
  fill: z.number().meta({ unit: 'Pa', description: 'Pressure to fill to' }),
  least: z
    .number()
    .nullable()
    .meta({ unit: 'Pa', description: 'Below this it is topped up; null: none is enough' }),
  most: z.number().nullable().meta({
    unit: 'Pa',
    description: 'Above this the fabric is at risk, also in the sun; null: strength not known',
  }),
})

export const LEAVE_STATES = ['leave-at', 'leave-before-level', 'leave-now', 'none'] as const

/** When everybody leaves. */
const orderLeaveSchema = z.strictObject({
  state: z.enum(LEAVE_STATES),
  level: metres('Leave level').nullable(),
  stage: metres('On the gauge that the crew sees').nullable(),
  at: momentSchema.nullable().meta({ description: 'When the forecast reaches it' }),
  margin: metres('What it lies below the level that holds'),
})

/** Everything that a deployment order says, frozen at its issue. SI; levels in the datum of the line. */
export const orderSchema = z
  .strictObject({
    number: count('Of the project, 1 for the first'),
    organisation: z.string(),
    project: z.strictObject({ name: z.string(), site: z.string() }),
    line: z.string(),
    scenario: z.string(),
    datum: z.string().meta({ description: 'As it stands behind a level: QD' }),
    timeZone: z.string(),
    units: z.enum(UNIT_SYSTEMS),
    issuedAt: momentSchema,
    expiresAt: momentSchema,
    meetAt: z.string(),
    contact: z.string(),
    note: z.string(),
    waterLevel: staged,
    forecast: orderForecastSchema.nullable(),
    gauge: z.strictObject({ name: z.string(), zero: metres('In the datum') }).nullable(),
    times: z.strictObject({
      decideBy: momentSchema.nullable().meta({ description: 'Latest decision' }),
      onSite: momentSchema.nullable(),
      startBy: momentSchema
        .nullable()
        .meta({ description: 'Latest start at the line that leaves the wanted margin' }),
      layingFrom: momentSchema.nullable(),
      finish: momentSchema.nullable(),
      firstWater: momentSchema.nullable(),
      wantedMargin: seconds('Margin wanted everywhere').nullable(),
      worstMargin: seconds('Least margin; negative: late').nullable(),
      worstAt: metres('Chainage of the section with it').nullable(),
    }),
    store: z.strictObject({
      depot: z.string().nullable(),
      pairs: count('Pairs that lay').nullable(),
      blowers: count('Blowers').nullable(),
      closures: count('Joint closures'),
      edgeBags: count('Bags for skirt edges'),
      ballastBags: count('Ballast bags').nullable(),
      ballastInStore: count('Of them in store').nullable(),
      gust: z.number().nullable().meta({ unit: 'm/s' }),
    }),
    air: z.array(orderAirSchema),
    plugs: z.array(orderPlugSchema),
    sections: z.array(orderSectionSchema).min(1),
    unlaid: z.array(z.strictObject({ from: metres('Chainage'), to: metres('Chainage') })),
    verdict: z.enum(VERDICTS),
    holdsTo: staged.nullable().meta({ description: 'Level to which the whole line holds' }),
    weakestAt: metres('Chainage of the place that gives way first'),
    leave: orderLeaveSchema,
    rounds: z.strictObject({ every: seconds('Time between two rounds') }),
  })
  .meta({ id: 'OrderContent' })
export type Order = z.output<typeof orderSchema>
