import { z } from 'zod'
import { BASIS_IDS } from '../catalogue/check-bases'
import { fieldRange, type NumericPath } from './section-ranges'

/** How the water pressure under the skirt is modelled. */
export const UPLIFT_MODELS = ['none', 'linear', 'deep', 'developing'] as const
export type UpliftModel = (typeof UPLIFT_MODELS)[number]

/** A required number; its range travels as metadata and is enforced by `sectionFaults`. */
function required(path: NumericPath) {
  return z.number().meta(describe(path))
}

/** A number with a default from the table of ranges. */
function optional(path: NumericPath) {
  return z
    .number()
    .default(fieldRange(path).default as number)
    .meta(describe(path))
}

/** A number that may be absent. */
function absent(path: NumericPath) {
  return z.number().nullable().default(null).meta(describe(path))
}

/** A number that most cases do not have: left out, it stays left out. */
function seldom(path: NumericPath) {
  return z
    .number()
    .nullish()
    .meta({ ...describe(path), default: null })
}

function describe(path: NumericPath) {
  const { min, max, minExcluded, unit, meaning } = fieldRange(path)
  const upper = typeof max === 'number' ? max : `${max.times} × ${max.of}`
  return {
    description: meaning,
    unit,
    ...(minExcluded ? { exclusiveMinimum: min } : { minimum: min }),
    ...(typeof upper === 'string' ? { maximumRule: upper } : {}),
    ...(typeof upper === 'number' && Number.isFinite(upper) ? { maximum: upper } : {}),
  }
}

/** One cross-section as form, API and batch command send it: SI units, shape only. */
export const sectionCaseSchema = z
  .strictObject({
    command: z.literal('section').optional().meta({ description: 'Must match the batch command' }),
    barrier: z.strictObject({
      diameter: required('barrier.diameter'),
      skirtLength: required('barrier.skirtLength'),
      contactWidth: optional('barrier.contactWidth'),
      mass: required('barrier.mass'),
      airPressure: required('barrier.airPressure'),
      sectionLength: optional('barrier.sectionLength'),
      fabricStrength: absent('barrier.fabricStrength'),
    }),
    ground: z.strictObject({
      friction: required('ground.friction'),
      fall: optional('ground.fall'),
      suitable: z.boolean().default(true).meta({ description: 'False: loose gravel, bare mud' }),
      permeability: absent('ground.permeability'),
      layerThickness: absent('ground.layerThickness'),
      undrainedStrength: seldom('ground.undrainedStrength'),
    }),
    uplift: z
      .strictObject({
        model: z
          .enum(UPLIFT_MODELS)
          .default('linear')
          .meta({ description: 'Water under the skirt' }),
        edgeFactor: optional('uplift.edgeFactor'),
        weighedEdgeFactor: z
          .number()
          .optional()
          .meta({
            ...describe('uplift.weighedEdgeFactor'),
            default: fieldRange('uplift.weighedEdgeFactor').default,
          }),
        diffusivity: absent('uplift.diffusivity'),
        time: absent('uplift.time'),
      })
      .prefault({}),
    water: z.strictObject({
      depth: required('water.depth'),
      dryDepth: optional('water.dryDepth'),
      density: optional('water.density'),
      currentSpeed: optional('water.currentSpeed'),
      dragCoefficient: optional('water.dragCoefficient'),
      waveHeight: optional('water.waveHeight'),
      wavePeriod: absent('water.wavePeriod'),
    }),
    debris: z
      .strictObject({ force: optional('debris.force'), draught: optional('debris.draught') })
      .prefault({}),
    gravity: optional('gravity'),
    requiredFreeboard: optional('requiredFreeboard'),
    basis: z.enum(BASIS_IDS).default('global-1.5').meta({ description: 'Check basis' }),
  })
  .meta({ id: 'SectionCase', description: 'One cross-section per metre run, SI units' })

/** A case as it is sent: what has a default may be left out. */
export type SectionCaseInput = z.input<typeof sectionCaseSchema>

/** A case with every default filled in. */
export type SectionCase = Omit<z.output<typeof sectionCaseSchema>, 'command'>
