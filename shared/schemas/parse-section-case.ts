import type { z } from 'zod'
import { InvalidInputError, OutOfRangeError, rangeFault, showValue, type Fault } from '../errors'
import { sectionCaseSchema, type SectionCase } from './section-case'
import { sectionFaults, valueAt } from './section-faults'
import { resolveRange, SECTION_RANGES, type NumericPath } from './section-ranges'

/**
 * A case from unknown input, with every default filled in.
 *
 * @throws InvalidInputError for a wrong shape or type: a text where a number belongs, a missing
 * field, an unknown key.
 * @throws OutOfRangeError for a number outside its range, or one that another choice asks for.
 */
export function parseSectionCase(input: unknown): SectionCase {
  const parsed = sectionCaseSchema.safeParse(input)
  if (!parsed.success) throw new InvalidInputError(parsed.error.issues.flatMap(faultsOf(input)))
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

function unknownKey(path: string, input: unknown): Fault {
  const value = valueAt(input as object, path)
  return {
    path,
    value,
    allowed: 'no such field',
    unit: '–',
    message: `${path}: there is no such field`,
  }
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
