import { z } from 'zod'
import { deploymentSettingsSchema } from './deployment'
import { eventSettingsSchema } from './event-settings'
import { restingForecastSchema } from './forecast'
import { sectionCaseSchema } from './section-case'
import { CHECK_IDS, VERDICTS } from './section-result'

const parts = sectionCaseSchema.shape
const metres = (meaning: string) => z.number().meta({ unit: 'm', description: meaning })

/** A barrier as a scenario keeps it: what it was computed with, whatever the catalogue says later. */
export const scenarioBarrierSchema = parts.barrier.extend({
  name: z.string().trim().min(1).max(80),
  statedHeight: metres("Height on the maker's label").nullable().default(null),
  catalogueId: z.string().max(80).nullable().default(null),
  catalogueRevision: z.number().int().nullable().default(null),
})
export type ScenarioBarrier = z.output<typeof scenarioBarrierSchema>

/** A run of the line with one size; later entries win where they overlap. */
export const sizeRunSchema = z.strictObject({
  from: metres('Chainage at which the size begins'),
  to: metres('Chainage at which it ends'),
  barrier: scenarioBarrierSchema,
  edgeFactor: z
    .number()
    .nullable()
    .default(null)
    .meta({ description: 'Edge of this run, where it differs from the rest' }),
})
export type SizeRun = z.output<typeof sizeRunSchema>

/** What is assumed of one surface of the line. */
export const groundAssumptionSchema = parts.ground.omit({ fall: true }).extend({
  surface: z.string().trim().min(1).max(40),
})
export type GroundAssumption = z.output<typeof groundAssumptionSchema>

/** Everything that a scenario assumes; depth is always derived: level − ground. */
export const scenarioContentSchema = z.strictObject({
  waterLevel: metres('Level that is checked, in the datum of the line'),
  /** The issue that the level is the crest of; null: the level was entered. */
  forecast: restingForecastSchema.nullable().default(null),
  levelNow: metres('Level at this moment').nullable().default(null),
  levelLow: metres('Low end of the band of the level').nullable().default(null),
  levelHigh: metres('High end of the band of the level').nullable().default(null),
  dryLevel: metres('Level of water standing on the dry side').nullable().default(null),
  place: metres('Chainage that the workbench looks at'),
  sizes: z.array(sizeRunSchema).min(1).max(2000),
  grounds: z.array(groundAssumptionSchema).min(1).max(50),
  fall: parts.ground.shape.fall,
  uplift: parts.uplift,
  water: parts.water.omit({ depth: true, dryDepth: true }).prefault({}),
  debris: parts.debris,
  gravity: parts.gravity,
  requiredFreeboard: parts.requiredFreeboard,
  basis: parts.basis,
  rateOfRise: z.number().nullable().default(null).meta({ unit: 'm/s' }),
  timeToClear: z.number().default(1200).meta({ unit: 's' }),
  /** How it is taken through its forecast; null: nobody has said anything of the night. */
  event: eventSettingsSchema.nullable().default(null),
  /** The deployment plan as it is set; null: nobody has planned yet. */
  deployment: deploymentSettingsSchema.nullable().default(null),
})
export type ScenarioContent = z.output<typeof scenarioContentSchema>

/** What the server computed from a scenario: the line's answer in a few figures. */
export const scenarioSummarySchema = z.strictObject({
  verdict: z.enum(VERDICTS),
  waterLevel: metres('Level that was checked'),
  /** The section that gives way first. */
  weakest: z.strictObject({
    from: metres('Chainage'),
    to: metres('Chainage'),
    place: metres('Chainage of its lowest ground'),
    check: z.enum(CHECK_IDS).nullable(),
    utilisation: z.number().nullable(),
  }),
  holdsToLevel: metres('Level to which the whole line holds; null: nothing holds').nullable(),
  sections: z.number().int().meta({ description: 'Number of sections' }),
  failing: z.number().int().meta({ description: 'Sections that do not hold or are not checked' }),
})
export type ScenarioSummary = z.output<typeof scenarioSummarySchema>
