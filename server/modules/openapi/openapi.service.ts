import { z } from 'zod'
import { type ProblemCode, problemSchema } from '../../../shared/schemas/problem'
import type { Operation } from '../../http/api-module'
import { PROBLEMS } from '../../http/problems'

const COMPONENTS = '#/components/schemas/'

type JsonObject = Record<string, unknown>

/** The OpenAPI document of all routes, made from the zod schemas that the routes use. */
export function describeApi(version: string, operations: readonly Operation[]): JsonObject {
  const paths: Record<string, JsonObject> = {}
  for (const operation of operations) {
    paths[operation.path] = {
      ...paths[operation.path],
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

function describeOperation({ id, summary, request, response, problems }: Operation): JsonObject {
  return {
    operationId: id,
    summary,
    ...(request ? { requestBody: { required: true, content: json(request, 'input') } } : {}),
    responses: {
      200: { description: 'The answer', content: json(response, 'output') },
      ...describeProblems([...problems, 'internal']),
    },
  }
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

/** Every schema with an id that a route takes or gives, with what it refers to. */
function describeComponents(operations: readonly Operation[]): JsonObject {
  const components: JsonObject = {}
  const add = (schema: z.ZodType, io: 'input' | 'output') => {
    Object.assign(components, z.toJSONSchema(schema, { io }).$defs)
  }
  add(problemSchema, 'output')
  for (const { request, response } of operations) {
    if (request) add(request, 'input')
    add(response, 'output')
  }
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
