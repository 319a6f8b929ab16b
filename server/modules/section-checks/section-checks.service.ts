import { InvalidInputError, rangeFault } from '../../../shared/errors'
import { runBatch } from '../../batch/batch-command'
import { sectionCommand } from '../../batch/commands'

/** Keeps one request under a second or so; the batch command takes lists of any length. */
export const MOST_CASES = 200

/**
 * Answers one case or a list, exactly as the batch command does.
 *
 * @throws InvalidInputError or OutOfRangeError with the faults of every case.
 */
export function answerSectionChecks(input: unknown): unknown {
  if (Array.isArray(input) && input.length > MOST_CASES) {
    const allowed = { min: 0, max: MOST_CASES, unit: 'cases' }
    throw new InvalidInputError([rangeFault('length', input.length, allowed)])
  }
  return runBatch(sectionCommand, input)
}
