import { z } from 'zod'
import {
  InvalidInputError,
  isInRange,
  OutOfRangeError,
  rangeFault,
  showValue,
  type Fault,
} from '../errors'
import { sectionCaseSchema, type SectionCase } from './section-case'
import { sectionFaults, valueAt } from './section-faults'
import { NUMERIC_PATHS, resolveRange, SECTION_RANGES, type NumericPath } from './section-ranges'

/**
 * A case from unknown input, with every default filled in.
 *
 * @throws InvalidInputError for a wrong shape or type: a text where a number belongs, a missing
 * field, an unknown key.
 * @throws OutOfRangeError for a number outside its range, or one that another choice asks for.
 */
export function parseSectionCase(input: unknown): SectionCase {
  const parsed = sectionCaseSchema.safeParse(input)
  if (!parsed.success) {
    const faults = parsed.error.issues.flatMap(faultsOf(input))
    throw new InvalidInputError([...faults, ...numbersOutside(input)])
  }
  const { command: _, ...section } = parsed.data
  const faults = sectionFaults(section)
  if (faults.length > 0) throw new OutOfRangeError(faults)
  return section
}

/** Turns an issue of the schema into faults that name path, value and what is allowed. */
function faultsOf(input: unknown): (issue: z.core.$ZodIssue) => Fault[] {
  return (issue) => {
    const path = issue.path.join('.')
    if (issue.code === 'unrecognized_keys') {
      return issue.keys.map((key) => unknownKey(path === '' ? key : `${path}.${key}`, input))
    }
    const value = typeof input === 'object' && input !== null ? valueAt(input, path) : input
    return [
      path in SECTION_RANGES ? wrongNumber(path as NumericPath, input) : wrong(path, value, issue),
    ]
  }
}

/** Numbers outside their range in a case that has a wrong shape as well: nothing is told in two goes. */
function numbersOutside(input: unknown): Fault[] {
  if (typeof input !== 'object' || input === null) return []
  const read = (path: NumericPath): unknown => valueAt(input, path)
  return NUMERIC_PATHS.flatMap((path) => {
    const value = read(path)
    if (typeof value !== 'number' || !Number.isFinite(value)) return []
    const range = resolveRange(path, read)
    return isInRange(value, range) ? [] : [rangeFault(path, value, range)]
  })
}

function unknownKey(path: string, input: unknown): Fault {
  const value = valueAt(input as object, path)
  const allowed = `one of ${fieldsBeside(path).join(', ')}`
  const message = `${path}: ${showValue(value)} has no place here; the field must be ${allowed}`
  return { path, value, allowed, unit: '–', message }
}

/** Names of the fields that may stand where an unknown one stands. */
function fieldsBeside(path: string): readonly string[] {
  const [part, inner] = path.split('.') as [string, string | undefined]
  const shape = sectionCaseSchema.shape
  if (inner === undefined) return Object.keys(shape)
  const schema: unknown = shape[part as keyof typeof shape]
  const object = schema instanceof z.ZodPrefault ? schema.unwrap() : schema
  return object instanceof z.ZodObject ? Object.keys(object.shape) : []
}

function wrongNumber(path: NumericPath, input: unknown): Fault {
  const read = (other: NumericPath): unknown => valueAt(input as object, other)
  const fault = rangeFault(path, read(path), resolveRange(path, read))
  const allowed = `a number, ${fault.allowed}`
  const message = `${path}: ${showValue(fault.value)} is not allowed; it must be ${allowed}`
  return { ...fault, allowed, message }
}

function wrong(path: string, value: unknown, issue: z.core.$ZodIssue): Fault {
  const allowed = allowedBy(issue)
  const where = path === '' ? 'case' : path
  const message = `${where}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return { path: where, value, allowed, unit: '–', message }
}

function allowedBy(issue: z.core.$ZodIssue): string {
  if (issue.code === 'invalid_value') return `one of ${issue.values.map(String).join(', ')}`
  if (issue.code === 'invalid_type') {
    if (issue.expected === 'object') return 'an object'
    if (issue.expected === 'boolean') return 'true or false'
  }
  return issue.message
}
