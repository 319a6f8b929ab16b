import type { z } from 'zod'
import { InvalidInputError, OutOfRangeError, showValue, type Fault } from '../../shared/errors'
import { parseInput } from '../http/parse-input'

/**
 * One case of a batch command as its schema has it.
 *
 * @param findFaults What the schema cannot say: ranges, and what one number asks of another.
 * @throws InvalidInputError for a wrong shape or type, OutOfRangeError for numbers out of range.
 */
export function parseBatchCase<Schema extends z.ZodType>(
  schema: Schema,
  input: unknown,
  findFaults: (parsed: z.output<Schema>) => readonly Fault[],
): z.output<Schema> {
  if (typeof input !== 'object' || input === null || Array.isArray(input)) {
    const message = `case: ${showValue(input)} is not allowed; it must be an object`
    const fault = { path: 'case', value: input, allowed: 'an object', unit: '–', message }
    throw new InvalidInputError([fault])
  }
  const parsed = parseInput(schema, input)
  const faults = findFaults(parsed)
  if (faults.length > 0) throw new OutOfRangeError(faults)
  return parsed
}
