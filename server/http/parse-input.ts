import type { Request } from 'express'
import type { z } from 'zod'
import {
  InvalidInputError,
  OutOfRangeError,
  describeRange,
  showValue,
  type Fault,
} from '../../shared/errors'
import { jsonBody } from './json-body'

/**
 * Unknown input as the schema has it.
 *
 * @throws InvalidInputError for a wrong shape or type, OutOfRangeError where only numbers lie outside
 * their range.
 */
export function parseInput<Schema extends z.ZodType>(
  schema: Schema,
  input: unknown,
): z.output<Schema> {
  const parsed = schema.safeParse(input)
  if (parsed.success) return parsed.data
  const { issues } = parsed.error
  const faults = issues.flatMap((issue) => faultsOf(issue, input))
  if (issues.every(isOutOfRange)) throw new OutOfRangeError(faults)
  throw new InvalidInputError(faults)
}

/** The JSON body of a request as the schema has it. */
export function parseBody<Schema extends z.ZodType>(
  schema: Schema,
  req: Request,
): z.output<Schema> {
  return parseInput(schema, jsonBody(req))
}

/** The query of an address as the schema has it; a repeated key counts once, its last value. */
export function parseQuery<Schema extends z.ZodType>(
  schema: Schema,
  req: Request,
): z.output<Schema> {
  const entries = Object.entries(req.query).map(([key, value]) => [
    key,
    Array.isArray(value) ? value.at(-1) : value,
  ])
  return parseInput(schema, Object.fromEntries(entries))
}

/** A part of the address, such as `:projectId`; Express has it whenever the route was reached. */
export function pathPart(req: Request, name: string): string {
  const value = req.params[name]
  return typeof value === 'string' ? value : ''
}

type Issue = z.core.$ZodIssue

function isOutOfRange(issue: Issue): boolean {
  return (issue.code === 'too_small' || issue.code === 'too_big') && isNumber(issue.origin)
}

const isNumber = (origin: string) => origin === 'number' || origin === 'int'

function faultsOf(issue: Issue, input: unknown): Fault[] {
  const path = pathText(issue.path)
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => {
      const inner = path === '' ? key : `${path}.${key}`
      const value = valueAt(input, [...issue.path, key])
      const allowed = 'left out'
      const message = `${inner}: ${showValue(value)} has no place here; there is no such field`
      return { path: inner, value, allowed, unit: '–', message }
    })
  }
  const where = path === '' ? 'body' : path
  const isSecret = SECRETS.has(path)
  const value = isSecret ? null : valueAt(input, issue.path)
  const shown = isSecret ? 'what was entered' : showValue(value)
  const allowed = allowedBy(issue)
  const message = `${where}: ${shown} is not allowed; it must be ${allowed}`
  return [{ path: where, value, allowed, unit: '–', message }]
}

/** Fields that hold a password: what was typed is never sent back or shown. */
const SECRETS = new Set(['password', 'current', 'next'])

/** `stations[2].chainage`, as the client names its fields. */
function pathText(path: readonly PropertyKey[]): string {
  return path.reduce<string>((text, part) => {
    if (typeof part === 'number') return `${text}[${part}]`
    return text === '' ? String(part) : `${text}.${String(part)}`
  }, '')
}

function valueAt(input: unknown, path: readonly PropertyKey[]): unknown {
  return path.reduce<unknown>(
    (node, key) =>
      typeof node === 'object' && node !== null && Object.hasOwn(node, key)
        ? (node as Record<PropertyKey, unknown>)[key]
        : undefined,
    input,
  )
}

const TYPES: Readonly<Record<string, string>> = {
  object: 'an object',
  array: 'a list',
  string: 'a text',
  number: 'a number',
  int: 'a whole number',
  boolean: 'true or false',
}

function allowedBy(issue: Issue): string {
  switch (issue.code) {
    case 'invalid_value':
      return `one of ${issue.values.map(String).join(', ')}`
    case 'invalid_type':
      return TYPES[issue.expected] ?? issue.expected
    case 'too_small':
      return boundText({ min: Number(issue.minimum), max: Infinity }, issue.origin)
    case 'too_big':
      return boundText({ min: -Infinity, max: Number(issue.maximum) }, issue.origin)
    case 'invalid_format':
      return issue.format === 'email' ? 'an address for mail' : `of the form ${issue.format}`
    default:
      return issue.message
  }
}

const COUNTED: Readonly<Record<string, string>> = { string: 'characters', array: 'entries' }
const ONE_OR_MORE: Readonly<Record<string, string>> = {
  string: 'at least one character',
  array: 'a list with at least one entry',
}

function boundText(bound: { min: number; max: number }, origin: string): string {
  const unit = COUNTED[origin] ?? '–'
  if (bound.min === 1 && ONE_OR_MORE[origin] !== undefined) return ONE_OR_MORE[origin]
  if (bound.min === -Infinity)
    return `${String(bound.max)} ${unit === '–' ? '' : `${unit} `}or less`
  return describeRange({ ...bound, unit })
}
