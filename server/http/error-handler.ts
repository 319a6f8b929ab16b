import type { ErrorRequestHandler } from 'express'
import { type Fault, InvalidInputError, OutOfRangeError, showValue } from '../../shared/errors'
import type { Problem, ProblemCode } from '../../shared/schemas/problem'
import {
  ConflictError,
  ForbiddenError,
  InvalidJsonError,
  NotFoundError,
  SignInRequiredError,
  TooManyRequestsError,
  UnavailableError,
} from '../errors'
import { MethodNotAllowedError, TooLargeError, UnsupportedMediaTypeError } from './http-errors'
import { PROBLEMS } from './problems'

/** More than a form or a list can have by honest mistake; keeps an answer shorter than its request. */
const MOST_FIELDS = 100

/** The only place that turns errors into answers. Express knows it by its four parameters. */
export const errorHandler: ErrorRequestHandler = (error: unknown, req, res, next) => {
  if (res.headersSent) {
    next(error)
    return
  }
  const problem = toProblem(error)
  if (problem.code === 'internal') {
    req.log.error({ err: error }, 'request failed')
    problem.message += ` Reference: ${String(req.id)}`
  }
  if (error instanceof TooManyRequestsError) res.set('Retry-After', String(error.retryAfter))
  if (error instanceof MethodNotAllowedError) res.set('Allow', error.allowed.join(', '))
  res.status(PROBLEMS[problem.code].status).json(problem)
}

function toProblem(error: unknown): Problem {
  if (error instanceof InvalidInputError) return refusal('invalid-input', error.faults)
  if (error instanceof OutOfRangeError) return refusal('out-of-range', error.faults)
  if (error instanceof InvalidJsonError) {
    return problem('invalid-json', `The body is not JSON: ${error.message}`)
  }
  if (error instanceof ConflictError && error.current) {
    return { ...problem('conflict', error.message), current: error.current }
  }
  if (isBusyDatabase(error)) return problem('unavailable', 'The database is busy; try again.')
  const code = codeOf(error)
  if (code && error instanceof Error) return problem(code, error.message)
  const parserCode = codeOfStatus(error)
  if (parserCode) return problem(parserCode, limitOf(error) ?? `${PROBLEMS[parserCode].meaning}.`)
  return problem('internal', 'Something went wrong on the server; the fault is in its log.')
}

const CODES = [
  [NotFoundError, 'not-found'],
  [SignInRequiredError, 'sign-in-required'],
  [ForbiddenError, 'forbidden'],
  [ConflictError, 'conflict'],
  [UnavailableError, 'unavailable'],
  [TooManyRequestsError, 'too-many-requests'],
  [MethodNotAllowedError, 'method-not-allowed'],
  [TooLargeError, 'too-large'],
  [UnsupportedMediaTypeError, 'unsupported-media-type'],
] as const

function codeOf(error: unknown): ProblemCode | undefined {
  return CODES.find(([type]) => error instanceof type)?.[1]
}

/** Errors that Express and its parsers throw carry a status; their words are not for readers. */
function codeOfStatus(error: unknown): ProblemCode | undefined {
  const status = error instanceof Error && 'status' in error ? Number(error.status) : 500
  if (status === 413) return 'too-large'
  if (status === 415) return 'unsupported-media-type'
  return status >= 400 && status < 500 ? 'bad-request' : undefined
}

/** The limit that a parser of bodies found passed, in words. */
function limitOf(error: unknown): string | undefined {
  const limit = error instanceof Error && 'limit' in error ? Number(error.limit) : NaN
  return Number.isFinite(limit) ? `The body is larger than ${limit / 1000} kB.` : undefined
}

/** Another process, such as a backup, held the database for longer than the server waits. */
function isBusyDatabase(error: unknown): boolean {
  const cause = error instanceof Error && error.cause instanceof Error ? error.cause : error
  return cause instanceof Error && 'code' in cause && /^SQLITE_BUSY/.test(String(cause.code))
}

function problem(code: ProblemCode, message: string): Problem {
  return { code, message, fields: [] }
}

function refusal(code: ProblemCode, faults: readonly Fault[]): Problem {
  const shown = faults.slice(0, MOST_FIELDS)
  const rest = faults.length - shown.length
  const lines = shown.map((fault) => fault.message)
  if (rest > 0) lines.push(`and ${rest} more`)
  return {
    code,
    message: lines.join('\n'),
    fields: shown.map((fault) => ({ ...fault, value: forJson(fault.value) })),
  }
}

/** JSON has no Infinity, NaN or undefined; lists and objects are named, not sent back. */
function forJson(value: unknown): unknown {
  if (value === undefined || value === null) return null
  if (typeof value === 'number') return Number.isFinite(value) ? value : String(value)
  return typeof value === 'object' ? showValue(value) : value
}
