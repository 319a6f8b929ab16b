import { checkSection } from '../../shared/checks/section-check'
import { InvalidInputError, OutOfRangeError, showValue, type Fault } from '../../shared/errors'
import { parseSectionCase } from '../../shared/schemas/parse-section-case'
import { sheetSchema, type Sheet } from '../../shared/schemas/sheet'
import { parseInput } from '../http/parse-input'

/** What a sheet gets where its input does not say. */
export interface SheetDefaults {
  /** Name of the project, and number of the sheet. */
  readonly name: string
  /** Day, `YYYY-MM-DD`. */
  readonly date: string
  readonly software: string
}

/**
 * A sheet from a bare case, or from a sheet whose result is computed here, whatever came with it.
 *
 * @throws InvalidInputError or OutOfRangeError that names every field at fault.
 */
export function sheetFrom(input: unknown, defaults: SheetDefaults): Sheet {
  const record = asRecord(input)
  const isSheet = 'case' in record
  const section = isSheet ? parsedCase(record.case) : parseSectionCase(input)
  const blank = {
    project: { name: defaults.name },
    number: defaults.name,
    date: defaults.date,
    software: defaults.software,
  }
  const words = isSheet ? record : {}
  return parseInput(sheetSchema, {
    ...blank,
    ...words,
    case: section,
    result: checkSection(section),
  })
}

function asRecord(input: unknown): Readonly<Record<string, unknown>> {
  if (typeof input === 'object' && input !== null && !Array.isArray(input)) {
    return input as Readonly<Record<string, unknown>>
  }
  const allowed = 'a case, or a sheet with one'
  const message = `sheet: ${showValue(input)} is not allowed; it must be ${allowed}`
  throw new InvalidInputError([{ path: 'sheet', value: input, allowed, unit: '–', message }])
}

/** Faults of a case inside a sheet are led by `case.`. */
function parsedCase(input: unknown) {
  try {
    return parseSectionCase(input)
  } catch (error) {
    if (error instanceof InvalidInputError) throw new InvalidInputError(error.faults.map(inside))
    if (error instanceof OutOfRangeError) throw new OutOfRangeError(error.faults.map(inside))
    throw error
  }
}

function inside(fault: Fault): Fault {
  return { ...fault, path: `case.${fault.path}`, message: `case.${fault.message}` }
}
