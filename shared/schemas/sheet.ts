import { z } from 'zod'
import { UNIT_SYSTEMS } from '../units'
import { stationsSchema } from './line'
import { marksSchema } from './mark'
import { scenarioContentSchema } from './scenario'
import { sectionCaseSchema } from './section-case'
import { sectionResultSchema } from './section-result'
import { CHECK_CATEGORIES } from './sheet-categories'
import { SHEET_STATUSES } from './sheet-status'

export { CHECK_CATEGORIES } from './sheet-categories'
export { SHEET_STATUSES, type SheetStatus } from './sheet-status'

export const PAPERS = ['a4', 'us-letter'] as const
export type Paper = (typeof PAPERS)[number]

const words = (max: number) => z.string().trim().max(max)
/** A day, `YYYY-MM-DD`. */
const daySchema = z.iso.date()

/** A picture inside a document; the bytes as base64. */
export const pictureSchema = z.strictObject({
  mediaType: z.enum(['image/png', 'image/jpeg']),
  base64: z.base64().min(4).max(8_000_000),
})

/** Somebody who put their name to a sheet. */
export const signatorySchema = z.strictObject({
  name: words(120).min(1),
  organisation: words(160).default(''),
  registration: words(80).default(''),
  date: daySchema,
})

export const letterheadSchema = z.strictObject({
  name: words(160).default(''),
  address: words(400).default(''),
  disclaimer: words(2000).default(''),
  logo: pictureSchema.nullable().default(null),
})

export type Letterhead = z.output<typeof letterheadSchema>

/** A thing that the answer rests on, and whether somebody still has to confirm it. */
export const assumptionSchema = z.strictObject({
  text: words(400).min(1),
  isToBeConfirmed: z.boolean().default(false),
})

/** Where an input comes from, by its path in the case: `ground.friction`. */
export const inputSourcesSchema = z.record(z.string().max(80), words(200))

/** What a checker worked out beside a line of the sheet, in the unit that the line is printed in. */
export const checkFigureSchema = z.strictObject({
  line: words(12).min(1),
  value: z.number(),
  note: words(400).default(''),
})

/** What was done when the sheet was checked; printed as an appendix. */
export const checkingSchema = z.strictObject({
  by: words(120).min(1),
  ticked: z.array(words(12).min(1)).max(400),
  figures: z.array(checkFigureSchema).max(400),
})
export type Checking = z.output<typeof checkingSchema>

/** The line that a section belongs to, for the chapters of the line. */
export const sheetLineSchema = z.strictObject({
  name: words(120).min(1),
  stations: stationsSchema,
  sectionLength: z.number().min(1).max(100).meta({ unit: 'm' }),
  marks: marksSchema.default([]),
  content: scenarioContentSchema,
})
export type SheetLine = z.output<typeof sheetLineSchema>

/**
 * Everything that one revision of a calculation sheet holds: frozen inputs and results, words,
 * people. From it, and from nothing else, page and PDF are composed.
 */
export const sheetSchema = z
  .strictObject({
    format: z.literal('toehold-sheet-1').default('toehold-sheet-1'),
    project: z.strictObject({
      name: words(200).min(1),
      client: words(200).default(''),
      site: words(200).default(''),
      documents: z
        .array(z.strictObject({ label: words(80).min(1), number: words(80).min(1) }))
        .max(8)
        .default([]),
    }),
    number: words(60).min(1),
    revision: words(20).default('A'),
    revisionReason: words(400).default(''),
    status: z.enum(SHEET_STATUSES).default('draft'),
    category: z.literal(CHECK_CATEGORIES).default(1),
    purpose: words(600).default(''),
    place: words(200).default(''),
    datum: words(60).default(''),
    groundLevel: z.number().nullable().default(null).meta({ unit: 'm' }),
    barrier: words(120).default(''),
    surface: words(80).default(''),
    /** The forecast issue that the level rests on, in words. */
    restsOn: words(300).default(''),
    case: sectionCaseSchema,
    result: sectionResultSchema,
    gripShare: z
      .number()
      .min(0)
      .max(1)
      .default(1)
      .meta({ description: 'Share of the friction that bends leave' }),
    /** Bends beside the section, from which that share follows; null: none. */
    bends: z
      .strictObject({
        turnAtStart: z.number().meta({ unit: 'rad' }),
        turnAtEnd: z.number().meta({ unit: 'rad' }),
        sectionLength: z.number().positive().meta({ unit: 'm' }),
      })
      .nullable()
      .default(null),
    leave: z
      .strictObject({
        rateOfRise: z.number().min(0).nullable().default(null).meta({ unit: 'm/s' }),
        timeToClear: z.number().min(0).default(1200).meta({ unit: 's' }),
      })
      .prefault({}),
    conditions: z.array(words(300).min(1)).max(20).default([]),
    assumptions: z.array(assumptionSchema).max(40).default([]),
    inputSources: inputSourcesSchema.default({}),
    people: z
      .strictObject({
        prepared: signatorySchema.nullable().default(null),
        checked: signatorySchema.nullable().default(null),
        approved: signatorySchema.nullable().default(null),
      })
      .prefault({}),
    line: sheetLineSchema.nullable().default(null),
    checking: checkingSchema.nullable().default(null),
    photographs: z
      .array(
        z.strictObject({
          caption: words(300),
          picture: pictureSchema,
          /** File of the project that it was taken from; empty: from elsewhere. */
          fileId: words(80).default(''),
        }),
      )
      .max(24)
      .default([]),
    letterhead: letterheadSchema.prefault({}),
    verification: z
      .strictObject({
        code: words(40).min(4),
        address: words(200).min(1),
        /** SHA-256 over the canonical JSON of the sheet without this part; hexadecimal. */
        digest: words(64).default(''),
      })
      .nullable()
      .default(null),
    /** Day that the document bears; also the date inside the PDF, so that equal sheets are equal files. */
    date: daySchema,
    software: words(60).default(''),
    units: z.enum(UNIT_SYSTEMS).default('metric'),
    paper: z.enum(PAPERS).default('a4'),
  })
  .meta({ id: 'Sheet', description: 'One revision of a calculation sheet' })

/** A sheet as it is sent: what has a default may be left out. */
export type SheetInput = z.input<typeof sheetSchema>
export type Sheet = z.output<typeof sheetSchema>
export type Signatory = z.output<typeof signatorySchema>
