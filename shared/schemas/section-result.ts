import { z } from 'zod'
import { CHECK_IDS, type CheckId, type Verdict, VERDICTS } from './check-ids'

export { CHECK_IDS, type CheckId, type Verdict, VERDICTS }

const nullableNumber = z.number().nullable()

/** A demand compared with a resistance. `utilisation: null` with `fails`: nothing resists. */
export const checkResultSchema = z.strictObject({
  factor: nullableNumber,
  required: nullableNumber,
  utilisation: nullableNumber,
  verdict: z.enum(VERDICTS),
})
export type CheckResult = z.infer<typeof checkResultSchema>

/** Freeboard is a height, not a ratio: `available` stands where the other checks have a factor. */
export const freeboardResultSchema = checkResultSchema
  .omit({ factor: true })
  .extend({ available: nullableNumber.meta({ unit: 'm' }) })
export type FreeboardResult = z.infer<typeof freeboardResultSchema>

/** The tube as it stands under load, or why it does not. */
export const loadedShapeResultSchema = z.union([
  z.strictObject({
    solved: z.literal(true),
    crest: z.number().meta({ unit: 'm' }),
    contact: z.number().meta({ unit: 'm' }),
    skinTension: z.number().meta({ unit: 'N/m' }),
    skirtTension: z.number().meta({ unit: 'N/m' }),
    weldHeight: z.number().meta({ unit: 'm' }),
    freeSkirt: z.number().meta({ unit: 'm' }),
    skirtGrip: z.number().meta({ unit: 'N/m' }),
  }),
  z.strictObject({
    solved: z.literal(false),
    reason: z.enum(['overtopped', 'gives-way', 'no-skirt']),
  }),
])
export type LoadedShapeResult = z.infer<typeof loadedShapeResultSchema>

/** The holding interval of water depths around the case, or the lowest one. */
export const holdsToSchema = z.strictObject({
  from: nullableNumber.meta({ unit: 'm' }),
  depth: z.number().meta({ unit: 'm' }),
  check: z.enum(CHECK_IDS),
})
export type HoldsTo = z.infer<typeof holdsToSchema>

/** Answer of one cross-section, per metre run, SI units. */
export const sectionResultSchema = z
  .strictObject({
    thrust: z.strictObject({
      still: z.number(),
      current: z.number(),
      wave: z.number(),
      debris: z.number(),
      dry: z.number().meta({ description: 'Thrust of the dry side water, positive, subtracted' }),
      total: z.number(),
      arm: nullableNumber.meta({ unit: 'm', description: 'Height of the total above the ground' }),
    }),
    vertical: z.strictObject({
      waterOnSkirt: z.number(),
      lift: z.number(),
      dryLift: z.number(),
      self: z.number(),
      uplift: z.number(),
      net: z.number(),
    }),
    sliding: checkResultSchema,
    overturning: checkResultSchema,
    flotation: checkResultSchema,
    skirt: checkResultSchema,
    fabric: checkResultSchema,
    freeboard: freeboardResultSchema,
    ground: checkResultSchema.optional(),
    overturningGross: nullableNumber,
    resultant: z.strictObject({ x: nullableNumber, share: nullableNumber }),
    loadedShape: loadedShapeResultSchema,
    anchoringMassPerSection: z.number().meta({ unit: 'kg' }),
    justEnough: z.strictObject({
      skirtLength: nullableNumber.meta({ unit: 'm' }),
      friction: nullableNumber,
      edgeFactor: nullableNumber,
    }),
    seepage: z.strictObject({ perMetre: nullableNumber.meta({ unit: 'm²/s' }) }).optional(),
    verdict: z.enum(VERDICTS),
    governs: z.enum(CHECK_IDS),
    holdsTo: holdsToSchema,
  })
  .meta({ id: 'SectionResult', description: 'Forces in N/m, moments in N, lengths in m' })
export type SectionResult = z.infer<typeof sectionResultSchema>
