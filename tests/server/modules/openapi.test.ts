import type { Express } from 'express'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { z } from 'zod'
import { openapiPath } from '../../../server/http/operation'
import { SECTION_RANGES } from '../../../shared/schemas/section-ranges'
import { freshApp } from '../../support/server-app'
import { holdingCase } from '../../support/server-cases'

const mediaSchema = z.strictObject({
  'application/json': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'text/csv': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'application/geo+json': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'application/pdf': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'image/png': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'image/svg+xml': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'application/octet-stream': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'multipart/form-data': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'text/event-stream': z.strictObject({ schema: z.looseObject({}) }).optional(),
  'message/rfc822': z.strictObject({ schema: z.looseObject({}) }).optional(),
})

const responseSchema = z.strictObject({
  description: z.string().min(1),
  content: mediaSchema.optional(),
})

const operationSchema = z.strictObject({
  operationId: z.string().regex(/^[a-z][A-Za-z]+$/),
  summary: z.string().min(1),
  description: z.string().startsWith('Access: '),
  parameters: z
    .array(
      z.discriminatedUnion('in', [
        z.strictObject({
          name: z.string(),
          in: z.literal('path'),
          required: z.literal(true),
          schema: z.strictObject({ type: z.literal('string') }),
        }),
        z.strictObject({
          name: z.string(),
          in: z.literal('query'),
          required: z.literal(false),
          schema: z.looseObject({ type: z.enum(['string', 'integer']) }),
        }),
      ]),
    )
    .optional(),
  requestBody: z.strictObject({ required: z.literal(true), content: mediaSchema }).optional(),
  responses: z.record(z.string().regex(/^[1-5]\d\d$/), responseSchema),
})

/** The parts of OpenAPI 3.1 that the document uses; anything else in it is a fault. */
const documentSchema = z.strictObject({
  openapi: z.string().regex(/^3\.1\.\d+$/),
  info: z.strictObject({ title: z.string(), version: z.string(), description: z.string() }),
  servers: z.array(z.strictObject({ url: z.string() })),
  paths: z.record(
    z.string().startsWith('/api/'),
    z.partialRecord(z.enum(['get', 'post', 'put', 'patch', 'delete']), operationSchema),
  ),
  components: z.strictObject({
    schemas: z.record(z.string().regex(/^[A-Za-z0-9.\-_]+$/), z.looseObject({})),
  }),
})

async function readDocument(app: Express = freshApp().app) {
  const { body } = await request(app).get('/api/openapi.json').expect(200)
  return documentSchema.parse(body)
}

interface Layer {
  readonly route?: { path: string; stack: { method?: string }[] }
  readonly handle?: { stack?: Layer[] }
}

/** Every route that Express really has, as "get /api/health". */
function routesOf(layers: readonly Layer[]): string[] {
  return layers.flatMap(({ route, handle }) => {
    if (!route) return routesOf(handle?.stack ?? [])
    const methods = route.stack.flatMap(({ method }) => method ?? [])
    return [...new Set(methods)].map((method) => `${method} ${openapiPath(route.path)}`)
  })
}

function references(node: unknown): string[] {
  if (typeof node !== 'object' || node === null) return []
  return Object.entries(node).flatMap(([key, value]) =>
    key === '$ref' ? [String(value)] : references(value),
  )
}

describe('GET /api/openapi.json', () => {
  it('is an OpenAPI document, and names the version of the program', async () => {
    expect((await readDocument()).info.version).toBe('1.2.3')
  })

  it('describes every route that the server has, and no other', async () => {
    const { app } = freshApp()
    const { paths } = await readDocument(app)
    const described = Object.entries(paths).flatMap(([path, methods]) =>
      Object.keys(methods).map((method) => `${method} ${path}`),
    )
    const actual = routesOf(app.router.stack as unknown as Layer[])
    expect(actual).toContain('post /api/check/section')
    expect(described.sort()).toEqual(actual.sort())
  })

  it('refers only to what it holds, and holds only what it refers to', async () => {
    const document = await readDocument()
    const names = Object.keys(document.components.schemas)
    const wanted = new Set(references(document))
    expect([...wanted].sort()).toEqual(names.map((name) => `#/components/schemas/${name}`).sort())
  })

  it('describes the problem of each operation, and gives each its own name', async () => {
    const operations = Object.values((await readDocument()).paths).flatMap((methods) =>
      Object.values(methods),
    )
    for (const { responses } of operations) {
      expect(references(responses['500'])).toEqual(['#/components/schemas/Problem'])
      expect(Object.keys(responses)).toEqual(expect.arrayContaining(['405', '500']))
    }
    const names = operations.map(({ operationId }) => operationId)
    expect(new Set(names).size).toBe(names.length)
  })

  it('carries unit, range and default of every number of a case', async () => {
    const { components } = await readDocument()
    for (const [path, range] of Object.entries(SECTION_RANGES)) {
      const field = path
        .split('.')
        .reduce<Record<string, unknown>>(
          (node, key) => (node.properties as Record<string, Record<string, unknown>>)[key]!,
          components.schemas.SectionCase!,
        )
      expect(field, path).toMatchObject({ unit: range.unit, description: range.meaning })
      const lower = 'minExcluded' in range ? 'exclusiveMinimum' : 'minimum'
      expect(field[lower], path).toBe(range.min)
      if ('default' in range) expect(field.default, path).toBe(range.default)
      if (typeof range.max === 'object') {
        expect(field.maximumRule, path).toBe(`${range.max.times} × ${range.max.of}`)
      } else if (Number.isFinite(range.max)) {
        expect(field.maximum, path).toBe(range.max)
      }
    }
  })

  it('describes the answers as they are', async () => {
    const { app } = freshApp()
    const { components } = await readDocument(app)
    const read = (name: string) => z.fromJSONSchema(components.schemas[name]! as JsonSchema)
    const result = await request(app).post('/api/check/section').send(holdingCase).expect(200)
    read('SectionResult').parse(result.body)
    read('SectionCase').parse(holdingCase)
    read('Health').parse((await request(app).get('/api/health')).body)
    read('Problem').parse((await request(app).get('/api/nothing')).body)
    const changed: unknown = { ...(result.body as object), verdict: 'perhaps' }
    expect(read('SectionResult').safeParse(changed).success).toBe(false)
  })
})

type JsonSchema = Parameters<typeof z.fromJSONSchema>[0]
