import fc from 'fast-check'
import { z } from 'zod'

/** The parts of JSON Schema that the contracts use. */
interface Schema {
  readonly $ref?: string
  readonly $defs?: Readonly<Record<string, Schema>>
  readonly type?: string
  readonly const?: unknown
  readonly enum?: readonly unknown[]
  readonly anyOf?: readonly Schema[]
  readonly oneOf?: readonly Schema[]
  readonly properties?: Readonly<Record<string, Schema>>
  readonly required?: readonly string[]
  readonly additionalProperties?: boolean | Schema
  readonly items?: Schema
  readonly minItems?: number
  readonly maxItems?: number
  readonly minLength?: number
  readonly maxLength?: number
  readonly minimum?: number
  readonly maximum?: number
  readonly exclusiveMinimum?: number
  readonly exclusiveMaximum?: number
}

/** Good values of a field by its name, where a random one would hardly ever be accepted. */
export type Hints = Readonly<Record<string, fc.Arbitrary<unknown>>>

interface Making {
  readonly hints: Hints
  readonly defs: Readonly<Record<string, Schema>>
}

/** Longest text and list that are drawn, whatever the schema would take. */
const MOST_LETTERS = 40
const MOST_ENTRIES = 4

/** JSON of the shape that a zod schema takes. */
export function arbitraryOf(schema: z.ZodType, hints: Hints = {}): fc.Arbitrary<unknown> {
  const json = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' }) as Schema
  return shaped(json, { hints, defs: json.$defs ?? {} })
}

function shaped(schema: Schema, making: Making): fc.Arbitrary<unknown> {
  if (schema.$ref !== undefined) return shaped(referred(schema.$ref, making), making)
  if (schema.const !== undefined) return fc.constant(schema.const)
  if (schema.enum) return fc.constantFrom(...schema.enum)
  const choices = schema.anyOf ?? schema.oneOf
  if (choices) return fc.oneof(...choices.map((choice) => shaped(choice, making)))
  switch (schema.type) {
    case 'string':
      return texts(schema)
    case 'number':
      return numbers(schema)
    case 'integer':
      return fc.integer({ min: whole(schema.minimum, -1000), max: whole(schema.maximum, 1000) })
    case 'boolean':
      return fc.boolean()
    case 'null':
      return fc.constant(null)
    case 'array':
      return lists(schema, making)
    case 'object':
      return objects(schema, making)
    default:
      return fc.jsonValue({ maxDepth: 2 })
  }
}

function referred(ref: string, { defs }: Making): Schema {
  const found = defs[ref.replace('#/$defs/', '')]
  if (!found) throw new Error(`${ref} is not in the schema`)
  return found
}

/** Words as people type them, and what nobody expects. */
function texts({ minLength = 0, maxLength = MOST_LETTERS }: Schema): fc.Arbitrary<string> {
  const bounds = { minLength, maxLength: Math.max(minLength, Math.min(maxLength, MOST_LETTERS)) }
  return fc.oneof(
    { weight: 3, arbitrary: fc.string(bounds) },
    { weight: 1, arbitrary: fc.string({ ...bounds, unit: 'binary' }) },
  )
}

function numbers(schema: Schema): fc.Arbitrary<number> {
  const min = schema.minimum ?? schema.exclusiveMinimum ?? -1e4
  const max = schema.maximum ?? schema.exclusiveMaximum ?? 1e4
  return fc.oneof(
    {
      weight: 8,
      arbitrary: fc.double({
        ...{ min, max, noNaN: true, noDefaultInfinity: true },
        minExcluded: schema.exclusiveMinimum !== undefined,
        maxExcluded: schema.exclusiveMaximum !== undefined,
      }),
    },
    { weight: 1, arbitrary: fc.constantFrom(0, -0, 1e-300, 1e300, -1e15) },
  )
}

/** Bounds beyond what people enter would only draw what nobody enters. */
function whole(bound: number | undefined, usual: number): number {
  return bound === undefined || Math.abs(bound) > 1e6 ? usual : bound
}

function lists({ items = {}, minItems = 0, maxItems = MOST_ENTRIES }: Schema, making: Making) {
  const maxLength = Math.max(minItems, Math.min(maxItems, MOST_ENTRIES))
  return fc.array(shaped(items, making), { minLength: minItems, maxLength })
}

function objects(schema: Schema, making: Making): fc.Arbitrary<unknown> {
  const { properties = {}, required = [], additionalProperties } = schema
  if (typeof additionalProperties === 'object') {
    return fc.dictionary(fc.string({ maxLength: 8 }), shaped(additionalProperties, making), {
      maxKeys: MOST_ENTRIES,
    })
  }
  const fields = Object.entries(properties).map(([name, field]) => [
    name,
    hinted(name, field, making),
  ])
  return fc.record(Object.fromEntries(fields) as Record<string, fc.Arbitrary<unknown>>, {
    requiredKeys: [...required],
    noNullPrototype: true,
  })
}

function hinted(name: string, field: Schema, making: Making): fc.Arbitrary<unknown> {
  const drawn = shaped(field, making)
  const hint = Object.hasOwn(making.hints, name) ? making.hints[name] : undefined
  if (!hint) return drawn
  return fc.oneof({ weight: 6, arbitrary: hint }, { weight: 1, arbitrary: drawn })
}
