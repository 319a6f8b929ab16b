import { z } from 'zod'

/** Every way in which a request can end without its answer. */
export const PROBLEM_CODES = [
  'invalid-json',
  'invalid-input',
  'bad-request',
  'sign-in-required',
  'forbidden',
  'not-found',
  'method-not-allowed',
  'conflict',
  'too-large',
  'unsupported-media-type',
  'out-of-range',
  'too-many-requests',
  'internal',
  'unavailable',
] as const
export type ProblemCode = (typeof PROBLEM_CODES)[number]

/** One refused field as it travels; the same as `Fault`, its value made fit for JSON. */
export const problemFieldSchema = z.strictObject({
  path: z.string().meta({ description: 'Path of the field; in a list "[1].water.depth"' }),
  value: z.unknown().meta({ description: 'The value as it arrived; Infinity and NaN as texts' }),
  allowed: z.string().meta({ description: 'What is allowed, in words' }),
  unit: z.string().meta({ description: 'SI unit; "–" or empty for what has none' }),
  message: z.string().meta({ description: 'One sentence with field, value and what is allowed' }),
})

/** The one shape of every error that the API answers. */
export const problemSchema = z
  .strictObject({
    code: z.enum(PROBLEM_CODES),
    message: z.string(),
    fields: z.array(problemFieldSchema).meta({ description: 'Empty unless fields were refused' }),
    current: z
      .looseObject({})
      .optional()
      .meta({ description: 'What is there now, where a save was made on an older version' }),
  })
  .meta({ id: 'Problem', description: 'Why a request was refused or could not be answered' })
export type Problem = z.infer<typeof problemSchema>
