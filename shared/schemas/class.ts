import { z } from 'zod'
import { UNIT_SYSTEMS } from '../units'
import { momentSchema } from './paging'

/** A class lasts for so long [ms]: four hours. Then it is over, and its guesses are deleted. */
export const CLASS_LASTS = 4 * 3_600_000

/** Most phones that one class takes. */
export const MOST_PARTICIPANTS = 500

/** Kinds of quantity that a room can guess, each with the SI unit that its figures travel in. */
export const GUESS_UNITS = {
  length: 'm',
  smallLength: 'm',
  mass: 'kg',
  massPerLength: 'kg/m',
  force: 'N',
  forcePerLength: 'N/m',
  pressure: 'Pa',
  speed: 'm/s',
  temperature: '°C',
  flow: 'm³/s',
  flowRate: 'm³/s',
  largeFlow: 'm³/s',
  flowPerLength: 'm²/s',
  overtopping: 'm²/s',
  rate: 'm/s',
  minutes: 's',
  hours: 's',
  seconds: 's',
  percent: '–',
  ratio: '–',
  count: '–',
} as const
export type GuessKind = keyof typeof GUESS_UNITS
const GUESS_KINDS = Object.keys(GUESS_UNITS) as [GuessKind, ...GuessKind[]]

const figure = z.number().min(-1e9).max(1e9)

/** What the room guesses: SI figures from least to most. */
export const guessScaleSchema = z
  .strictObject({
    kind: z.enum(GUESS_KINDS).meta({ description: 'Decides the unit of every figure' }),
    min: figure,
    max: figure,
    step: z.number().positive().max(1e9),
    decimals: z.number().int().min(0).max(6).optional(),
  })
  .refine(({ min, max }) => max > min, { path: ['max'], message: 'more than min' })
  .refine(({ min, max, step }) => !(max > min) || step <= max - min, {
    path: ['step'],
    message: 'max − min or less',
  })
  .meta({ id: 'GuessScale' })
export type GuessScale = z.output<typeof guessScaleSchema>

/** While the room is asked, and once it sees the answer. */
export const CLASS_PHASES = ['question', 'shown'] as const
export type ClassPhase = (typeof CLASS_PHASES)[number]

/** `PUT /api/classes/:code/scene`: where the trainer is. */
export const classSceneSchema = z
  .strictObject({
    course: z.string().min(1).max(80),
    scene: z.string().min(1).max(80).meta({ description: 'Its name in the course' }),
    phase: z.enum(CLASS_PHASES),
    title: z.string().trim().max(120),
    question: z.string().trim().min(1).max(400).meta({ description: 'As it stands on the stage' }),
    units: z.enum(UNIT_SYSTEMS).meta({ description: 'Units of the stage; phones show the same' }),
    guess: guessScaleSchema,
    answer: figure.nullable().meta({ description: 'Null where there is none, or not yet' }),
  })
  .meta({ id: 'ClassScene' })
export type ClassScene = z.output<typeof classSceneSchema>

/** A phone, by a number that it drew itself. */
export const participantSchema = z.string().regex(/^[\w-]{16,64}$/, '16 to 64 letters and digits')

/** `PUT /api/classes/:code/guess`: the latest counts until the answer is shown. */
export const classGuessSchema = z.strictObject({
  participant: participantSchema,
  scene: z.string().min(1).max(80).meta({ description: 'The scene that the phone shows' }),
  value: z.number().meta({ description: 'SI figure within the scale of the scene' }),
  unit: z.string().max(10).meta({ description: 'SI unit of the figure, as the scale has it' }),
})
export type ClassGuess = z.output<typeof classGuessSchema>

/** Guesses of one value. */
export const dotSchema = z.strictObject({ value: z.number(), count: z.number().int().min(1) })
export type Dot = z.output<typeof dotSchema>

/** What is known of the room. */
export const roomSchema = z.strictObject({
  participants: z.number().int().meta({ description: 'Phones that follow now' }),
  guesses: z.number().int().meta({ description: 'Guesses in this scene' }),
  dots: z
    .array(dotSchema)
    .meta({ description: 'Guesses by value; phones see them once the answer is shown' }),
})
export type Room = z.output<typeof roomSchema>

export const CLASS_STATUSES = ['open', 'closed', 'over'] as const
export type ClassStatus = (typeof CLASS_STATUSES)[number]

/** `GET /api/classes/:code`, and every event of `GET /api/classes/:code/events`. */
export const classStateSchema = z
  .strictObject({
    code: z.string(),
    status: z.enum(CLASS_STATUSES),
    expiresAt: momentSchema,
    step: z.number().int().meta({ description: 'Counts what the trainer told' }),
    scene: classSceneSchema.nullable(),
    room: roomSchema,
  })
  .meta({ id: 'ClassState' })
export type ClassState = z.output<typeof classStateSchema>

/** What a trainer has of a class of their own. */
export const classItemSchema = z
  .strictObject({
    code: z.string(),
    address: z.string().meta({ description: 'Of the page for phones' }),
    openedAt: momentSchema,
    expiresAt: momentSchema,
  })
  .meta({ id: 'Class' })
export type ClassItem = z.output<typeof classItemSchema>

/** `GET /api/classes`: classes of the trainer that are open, the newest first. */
export const classesSchema = z.strictObject({ classes: z.array(classItemSchema) })

/** What may stand behind the address of the events: a phone says which one it is. */
export const classEventsQuerySchema = z.object({
  participant: participantSchema.optional().meta({ description: 'Left out by the stage' }),
})
