import type { z } from 'zod'
import { type Fault, InvalidInputError, OutOfRangeError, showValue } from '../../shared/errors'

/** A calculation that API and batch command offer for one case or for a list of cases. */
export interface BatchCommand {
  readonly name: string
  /** One line for `--help` and OpenAPI. */
  readonly summary: string
  readonly inputSchema: z.ZodType
  readonly outputSchema: z.ZodType
  /**
   * Answers one case.
   *
   * @throws InvalidInputError or OutOfRangeError
   */
  readonly answer: (input: unknown) => unknown
}

/**
 * Answers an object with an object and a list with a list. One refused case refuses the list; then
 * every fault of every case is reported, its path led by the place in the list: `[1].water.depth`.
 *
 * @throws InvalidInputError if any case has the wrong shape, else OutOfRangeError.
 */
export function runBatch(command: BatchCommand, input: unknown): unknown {
  if (!Array.isArray(input)) return command.answer(input)
  const answers: unknown[] = []
  const refusals: Refusal[] = []
  input.forEach((item: unknown, index) => {
    try {
      assertCase(item)
      answers.push(command.answer(item))
    } catch (error) {
      refusals.push(atIndex(error, index))
    }
  })
  if (refusals.length > 0) throw allTogether(refusals)
  return answers
}

/** Said here, because only a list knows that the place in it is the whole name of the fault. */
function assertCase(item: unknown): void {
  if (typeof item === 'object' && item !== null && !Array.isArray(item)) return
  const allowed = 'an object'
  const message = `: ${showValue(item)} is not allowed; it must be ${allowed}`
  throw new InvalidInputError([{ path: '', value: item, allowed, unit: '', message }])
}

type Refusal = InvalidInputError | OutOfRangeError

function isRefusal(error: unknown): error is Refusal {
  return error instanceof InvalidInputError || error instanceof OutOfRangeError
}

function atIndex(error: unknown, index: number): Refusal {
  if (!isRefusal(error)) throw error
  const faults = error.faults.map((fault) => faultAtIndex(fault, index))
  return error instanceof InvalidInputError
    ? new InvalidInputError(faults)
    : new OutOfRangeError(faults)
}

function allTogether(refusals: readonly Refusal[]): Refusal {
  const faults = refusals.flatMap((refusal) => refusal.faults)
  return refusals.some((refusal) => refusal instanceof InvalidInputError)
    ? new InvalidInputError(faults)
    : new OutOfRangeError(faults)
}

/** Messages begin with the path, so the place in the list goes before both. */
function faultAtIndex(fault: Fault, index: number): Fault {
  const lead = fault.path === '' ? `[${index}]` : `[${index}].`
  return { ...fault, path: `${lead}${fault.path}`, message: `${lead}${fault.message}` }
}
