import { z } from 'zod'
import { fieldRange, type NumericPath } from './section-ranges'

/** How sure a source is. */
const tagSchema = z.enum(['seen', 'memory', 'derived', 'practice', 'judgement'])

const provenance = {
  source: z.string().meta({ description: 'Where the figures come from' }),
  revision: z.int().min(1).meta({ description: 'Counts the changes of this entry' }),
}

/** A quantity of the catalogue: the unit and the meaning of the same field of a case. */
function quantity(path: NumericPath) {
  const { unit, meaning } = fieldRange(path)
  return z.number().meta({ unit, description: meaning })
}

/** A barrier of the catalogue. */
export const catalogueBarrierSchema = z
  .strictObject({
    id: z.string(),
    diameter: quantity('barrier.diameter'),
    skirtLength: quantity('barrier.skirtLength'),
    contactWidth: quantity('barrier.contactWidth'),
    mass: quantity('barrier.mass'),
    airPressure: quantity('barrier.airPressure'),
    sectionLength: quantity('barrier.sectionLength'),
    fabricStrength: quantity('barrier.fabricStrength'),
    statedHeight: z
      .number()
      .meta({ unit: 'm', description: 'Height on the label; not what the barrier defends' }),
    isExample: z.boolean().meta({ description: 'Invented: enter the figures of your own' }),
    ...provenance,
  })
  .meta({ id: 'CatalogueBarrier' })

/** A ground of the catalogue. */
export const catalogueGroundSchema = z
  .strictObject({
    id: z.string(),
    friction: quantity('ground.friction'),
    permeability: quantity('ground.permeability'),
    layerThickness: quantity('ground.layerThickness'),
    isSuitable: z.boolean().meta({ description: 'False: nothing may be set up on it' }),
    isUnverified: z.boolean().meta({ description: 'No drag test stands behind the friction' }),
    tag: tagSchema,
    ...provenance,
  })
  .meta({ id: 'CatalogueGround' })

/** A check basis of the catalogue. */
export const catalogueBasisSchema = z
  .strictObject({
    id: z.string(),
    format: z.enum(['global', 'partial']),
    sliding: z.number(),
    overturning: z.number().nullable().meta({ description: 'null: the basis has no such check' }),
    flotation: z.number(),
    fabric: z.number(),
    edition: z.string(),
    tag: tagSchema,
    ...provenance,
  })
  .meta({ id: 'CatalogueBasis', description: 'Required factors' })

/** Answer of `GET /api/catalogue`. */
export const catalogueSchema = z
  .strictObject({
    barriers: z.array(catalogueBarrierSchema),
    grounds: z.array(catalogueGroundSchema),
    bases: z.array(catalogueBasisSchema),
  })
  .meta({ id: 'Catalogue', description: 'Barriers by diameter, grounds, check bases; SI units' })
export type Catalogue = z.infer<typeof catalogueSchema>
