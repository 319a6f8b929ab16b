import { z } from 'zod'
import { type ProblemCode, problemSchema } from '../../../shared/schemas/problem'
import { ACCESS_RULES } from '../../../shared/access/rules'
import { openapiPath, type Operation } from '../../http/operation'
import { PROBLEMS } from '../../http/problems'

const COMPONENTS = '#/components/schemas/'

type JsonObject = Record<string, unknown>

/** The OpenAPI document of all routes, made from the zod schemas that the routes use. */
export function describeApi(version: string, operations: readonly Operation[]): JsonObject {
  const paths: Record<string, JsonObject> = {}
  for (const operation of operations) {
    const path = openapiPath(operation.path)
    paths[path] = {
      ...paths[path],
      [operation.method]: describeOperation(operation),
    }
  }
  return {
    openapi: '3.1.1',
    info: {
      title: 'Toehold',
      version,
      description:
        'Checks of temporary flood barriers. SI units: the keyword "unit" names the unit of each ' +
        'quantity, "minimum" and "maximum" its range, "maximumRule" a bound that follows another ' +
        'field. A design check, not a guarantee.',
    },
    servers: [{ url: '/' }],
    paths,
    components: { schemas: describeComponents(operations) },
  }
}

function describeOperation(operation: Operation): JsonObject {
  const { id, summary, rule, request, path, query } = operation
  const parameters = [...describePath(path), ...describeQuery(query)]
  return {
    operationId: id,
    summary,
    description: `Access: ${ACCESS_RULES[rule].meaning}.`,
    ...(parameters.length > 0 ? { parameters } : {}),
    ...(request ? { requestBody: { required: true, content: bodyOf(request, operation) } } : {}),
    responses: {
      ...describeSuccess(operation),
      ...describeProblems(problemsOf(operation)),
    },
  }
}

function describePath(path: string): readonly JsonObject[] {
  return [...path.matchAll(/:(\w+)/g)].map(([, name]) => ({
    name,
    in: 'path',
    required: true,
    schema: { type: 'string' },
  }))
}

function describeQuery(query: z.ZodObject | undefined): readonly JsonObject[] {
  if (!query) return []
  const { properties = {} } = z.toJSONSchema(query, { io: 'input' })
  return Object.entries(properties).map(([name, schema]) => ({
    name,
    in: 'query',
    required: false,
    schema: withComponentPaths(schema as JsonObject),
  }))
}

function describeSuccess({ response, mediaType, status }: Operation): JsonObject {
  if (mediaType !== undefined) {
    const content = { [mediaType]: { schema: { type: 'string' } } }
    return { [status ?? 200]: { description: 'The answer', content } }
  }
  if (!response) return { [status ?? 204]: { description: 'Done' } }
  return { [status ?? 200]: { description: 'The answer', content: json(response, 'output') } }
}

/** What can go wrong on a route: its own problems, and those that its kind brings. */
function problemsOf({ rule, request, problems, path, query }: Operation): readonly ProblemCode[] {
  const ofBody = ['invalid-json', 'invalid-input', 'bad-request', 'too-large'] as const
  const ofAccess = ['sign-in-required', 'forbidden'] as const
  return [
    ...new Set<ProblemCode>([
      ...problems,
      ...(request ? [...ofBody, 'unsupported-media-type' as const] : []),
      ...(query ? (['invalid-input', 'out-of-range'] as const) : []),
      ...(rule === 'open' ? [] : ofAccess),
      ...(path.includes(':') ? (['not-found'] as const) : []),
      'method-not-allowed',
      'internal',
    ]),
  ]
}

/** One response per status; two problems that share a status share its description. */
function describeProblems(codes: readonly ProblemCode[]): JsonObject {
  const meanings = new Map<number, string[]>()
  for (const code of codes) {
    const { status, meaning } = PROBLEMS[code]
    meanings.set(status, [...(meanings.get(status) ?? []), `${code}: ${meaning}`])
  }
  return Object.fromEntries(
    [...meanings].map(([status, lines]) => [
      status,
      { description: lines.join('. '), content: json(problemSchema, 'output') },
    ]),
  )
}

/** The schema where it is used; whatever has an id is a reference to its component. */
function json(schema: z.ZodType, io: 'input' | 'output'): JsonObject {
  return { 'application/json': { schema: withComponentPaths(z.toJSONSchema(schema, { io })) } }
}

function bodyOf(request: z.ZodType, { requestMediaType }: Operation): JsonObject {
  const { 'application/json': media } = json(request, 'input')
  return { [requestMediaType ?? 'application/json']: media }
}

/**
 * Every schema with an id that a route takes or gives, with what it refers to. Where a route takes
 * what another gives, the component says what may be left out.
 */
function describeComponents(operations: readonly Operation[]): JsonObject {
  const components: JsonObject = {}
  const add = (schema: z.ZodType, io: 'input' | 'output') => {
    Object.assign(components, z.toJSONSchema(schema, { io }).$defs)
  }
  add(problemSchema, 'output')
  for (const { response } of operations) if (response) add(response, 'output')
  for (const { request } of operations) if (request) add(request, 'input')
  return withComponentPaths(components)
}

/** zod keeps shared parts in `$defs`, OpenAPI in `components`, where the dialect is known. */
function withComponentPaths(part: JsonObject): JsonObject {
  return JSON.parse(JSON.stringify(part), (key, value: unknown) => {
    if (key === '$defs' || key === '$schema') return undefined
    return key === '$ref' && typeof value === 'string'
      ? value.replace('#/$defs/', COMPONENTS)
      : value
  }) as JsonObject
}
