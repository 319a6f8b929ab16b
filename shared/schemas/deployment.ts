import { z } from 'zod'
import { LAYING_STEPS } from '../catalogue/laying-times'
import { FORECAST_BANDS } from './forecast'
import { momentSchema } from './paging'

const metres = (description: string) => z.number().meta({ unit: 'm', description })
const seconds = (description: string) => z.number().meta({ unit: 's', description })
const count = (description: string) => z.number().int().meta({ description })

/**
 * In which order sections are laid. `best` is the joined order with the largest worst margin that was
 * found: what is laid is one run at every moment.
 */
export const LAYING_ORDERS = ['from-start', 'from-end', 'outward', 'lowest-first', 'best'] as const
export type LayingOrder = (typeof LAYING_ORDERS)[number]

const timesOf = (description: string) =>
  z.strictObject(
    Object.fromEntries(LAYING_STEPS.map((step) => [step, seconds(description)])) as Record<
      (typeof LAYING_STEPS)[number],
      ReturnType<typeof seconds>
    >,
  )

/** How a pair of people lays one size. */
export const sizeTimesSchema = z.strictObject({
  diameter: metres('Size that the times are for'),
  times: timesOf('Time of one pair for one section'),
})
export type SizeTimes = z.output<typeof sizeTimesSchema>

/** The deployment plan as a person sets it; kept in the scenario. Everything else follows from it. */
export const deploymentSettingsSchema = z
  .strictObject({
    decidedAt: momentSchema
      .nullable()
      .default(null)
      .meta({ description: 'When the decision falls; null: not yet said' }),
    pairs: count('Pairs of people that lay').default(2),
    blowers: count('Blowers that fill').default(1),
    order: z.enum(LAYING_ORDERS).default('from-start'),
    outwardFrom: metres('Chainage that laying goes outward from; null: the lowest ground')
      .nullable()
      .default(null),
    judgedBy: z
      .enum(FORECAST_BANDS)
      .default('expected')
      .meta({ description: 'Band whose hours are the deadlines' }),
    wantedMargin: seconds('Margin that should be left everywhere').default(1800),
    sizeTimes: z.array(sizeTimesSchema).max(20).default([]),
    clearingTime: seconds('Plug, walk and clear the line before the first section').default(1200),
    edgeBagTime: seconds('Time of a pair for one bag on the edge of the skirt').default(30),
    callOutTime: seconds('In place of that of the depot').nullable().default(null),
    loadTime: seconds('In place of that of the depot').nullable().default(null),
    driveTime: seconds('In place of that of the depot').nullable().default(null),
    gust: z
      .number()
      .nullable()
      .default(null)
      .meta({ unit: 'm/s', description: 'Peak gust before the water; null: not known' }),
  })
  .meta({ id: 'DeploymentSettings' })
export type DeploymentSettings = z.output<typeof deploymentSettingsSchema>

/** Steps of the plan: those of every section, and bags on the edge where it is weighed or sealed. */
export const PLAN_STEPS = [...LAYING_STEPS, 'edge'] as const
export type PlanStep = (typeof PLAN_STEPS)[number]

const planStepSchema = z.strictObject({
  step: z.enum(PLAN_STEPS),
  from: momentSchema,
  to: momentSchema,
  waited: seconds('Wait for a blower before it; nothing but filling waits'),
})

/** One figure for each band; null where the water does not come within the forecast. */
const byBand = <Value extends z.ZodType>(value: Value) =>
  z.strictObject({ low: value.nullable(), expected: value.nullable(), high: value.nullable() })

const windBallastSchema = z.strictObject({
  perMetre: z.number().meta({ unit: 'kg/m' }),
  mass: z.number().meta({ unit: 'kg', description: 'Of the whole section' }),
  bags: count('Ballast bags')
    .nullable()
    .meta({ description: 'null: no bag in store says its mass' }),
})

/** One section in the order in which it is laid. */
export const plannedLayingSchema = z.strictObject({
  position: count('1 for the first that is laid'),
  from: metres('Chainage'),
  to: metres('Chainage'),
  barrier: z.strictObject({
    name: z.string(),
    diameter: metres('Of the tube'),
    catalogueId: z.string().nullable(),
  }),
  edgeFactor: z.number().nullable(),
  edgeBags: count('Bags on the edge of the skirt'),
  lowestGround: metres('Level'),
  lowestAt: metres('Chainage of the lowest ground'),
  pair: count('1 for the first pair'),
  blower: count('1 for the first blower'),
  start: momentSchema,
  finish: momentSchema,
  steps: z.array(planStepSchema),
  deadline: byBand(momentSchema).meta({ description: 'The water reaches its lowest ground' }),
  margin: byBand(z.number()).meta({
    unit: 's',
    description: 'Deadline less finish; negative: late',
  }),
  ballast: windBallastSchema.nullable().meta({ description: 'null: no gust is given' }),
})
export type PlannedLaying = z.output<typeof plannedLayingSchema>

const comerSchema = z.strictObject({
  number: count('1 for the first'),
  onSite: momentSchema,
  depot: z.string().nullable().meta({ description: 'null: no depot has it' }),
})

const worstMarginSchema = z.strictObject({
  margin: seconds('Negative: late'),
  position: count('In the order of laying'),
  from: metres('Chainage'),
  to: metres('Chainage'),
  lowestAt: metres('Chainage of its lowest ground'),
})
export type WorstMargin = z.output<typeof worstMarginSchema>

/** The computed plan: who lays which section when, and how much time that leaves. */
export const deploymentPlanSchema = z
  .strictObject({
    decidedAt: momentSchema,
    mobilisation: z.strictObject({
      depot: z.string().nullable(),
      callOutTime: seconds('From the decision until the crew is at the depot'),
      loadTime: seconds('To load'),
      driveTime: seconds('To drive to the line'),
    }),
    onSite: momentSchema.meta({ description: 'The first pair is at the line' }),
    layingFrom: momentSchema.meta({ description: 'Plugged and cleared; the first section begins' }),
    finish: momentSchema,
    pairs: z.array(comerSchema),
    blowers: z.array(comerSchema),
    order: z.enum(LAYING_ORDERS),
    outwardFrom: metres('Chainage at which an outward order begins').nullable(),
    sections: z.array(plannedLayingSchema).meta({ description: 'In the order of laying' }),
    unlaid: z
      .array(z.strictObject({ from: metres('Chainage'), to: metres('Chainage') }))
      .meta({ description: 'Sections without a size: nobody lays them' }),
    judgedBy: z.enum(FORECAST_BANDS),
    worst: byBand(worstMarginSchema),
    wantedMargin: seconds('Margin that should be left everywhere'),
    decideBy: byBand(momentSchema).meta({
      description: 'Latest decision that leaves the wanted margin everywhere, T0',
    }),
    layFrom: byBand(momentSchema).meta({
      description: 'Latest arrival at the line that leaves the wanted margin everywhere, T1',
    }),
    ballast: z
      .strictObject({
        gust: z.number().meta({ unit: 'm/s' }),
        requiredFactor: z.number(),
        bagMass: z.number().nullable().meta({ unit: 'kg' }),
        bags: count('Bags for all sections').nullable(),
        inStore: count('Serviceable in all depots'),
      })
      .nullable(),
    crewTime: seconds('Of all pairs together, without waiting and without clearing'),
    waiting: seconds('Of all pairs together for a blower'),
  })
  .meta({ id: 'DeploymentPlan' })
export type DeploymentPlan = z.output<typeof deploymentPlanSchema>
