import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { checkSection } from '../../../shared/checks/section-check'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import { problemSchema } from '../../../shared/schemas/problem'
import { sectionResultSchema } from '../../../shared/schemas/section-result'
import { freshApp } from '../../support/server-app'
import { BAD_INPUTS, holdingCase } from '../../support/server-cases'

const deeper = { ...holdingCase, water: { depth: 0.55 } }

function post(text: string, type = 'application/json') {
  return request(freshApp().app).post('/api/check/section').set('Content-Type', type).send(text)
}

async function problemOf(text: string, status: number, type?: string) {
  return problemSchema.parse((await post(text, type).expect(status)).body)
}

describe('POST /api/check/section', () => {
  it('answers a case with what the engine computes', async () => {
    const { body } = await post(JSON.stringify(holdingCase)).expect(200)
    const expected = checkSection(parseSectionCase(holdingCase))
    expect(sectionResultSchema.parse(body)).toEqual(JSON.parse(JSON.stringify(expected)))
    expect(expected.verdict).toBe('holds')
  })

  it('answers a list with a list in the same order', async () => {
    const { body } = await post(JSON.stringify([holdingCase, deeper])).expect(200)
    const verdicts = sectionResultSchema
      .array()
      .parse(body)
      .map(({ verdict }) => verdict)
    expect(verdicts).toEqual(['holds', 'fails'])
  })

  it('takes a depth between the crest and 1.5 diameters for a case, not for a fault', async () => {
    const overtopped = { ...holdingCase, water: { depth: 0.9 } }
    const { body } = await post(JSON.stringify(overtopped)).expect(200)
    const { verdict, loadedShape } = sectionResultSchema.parse(body)
    expect(verdict).toBe('fails')
    expect(loadedShape).toMatchObject({ solved: false, reason: 'overtopped' })
  })

  it.each(BAD_INPUTS)('refuses $what', async ({ text, status, path, value, message }) => {
    const problem = await problemOf(text, status)
    expect(problem.code).toBe(status === 422 ? 'out-of-range' : 'invalid-input')
    expect(problem.fields).toHaveLength(1)
    expect(problem.fields[0]).toMatchObject({ path, value, message })
    expect(problem.message).toBe(message)
  })

  it('names a key that does not exist', async () => {
    const typo = { ...holdingCase, water: { depth: 0.42, dept: 0.5 } }
    const problem = await problemOf(JSON.stringify(typo), 400)
    expect(problem.fields[0]).toMatchObject({ path: 'water.dept', value: 0.5 })
  })

  it('does not let a key reach into the program', async () => {
    const text = JSON.stringify(holdingCase).replace('{', '{"__proto__":{"polluted":1},')
    const answer = await post(text)
    expect(answer.status).toBe(400)
    expect(({} as Record<string, unknown>).polluted).toBeUndefined()
  })

  it.each([
    ['nothing', ''],
    ['broken JSON', '{"barrier":'],
    ['a decimal comma', '{"depth": 0,42}'],
  ])('refuses %s as no JSON', async (_what, text) => {
    const problem = await problemOf(text, 400)
    expect(problem.code).toBe('invalid-json')
  })

  it.each(['5', '"text"', 'null', 'true'])('refuses %s, which is no case', async (text) => {
    const problem = await problemOf(text, 400)
    expect(problem.code).toBe('invalid-input')
    expect(problem.message).toMatch(/is not allowed; it must be an object/)
  })

  it('refuses a list that is longer than one request may ask for', async () => {
    const problem = await problemOf(JSON.stringify(Array(201).fill({})), 400)
    expect(problem.message).toBe('length: 201 is not allowed; it must be 0 to 200 cases')
  })

  it('survives brackets within brackets without end', async () => {
    const depth = 100_000
    const problem = await problemOf(`[${'['.repeat(depth)}${']'.repeat(depth)}]`, 400)
    expect(problem.message).toBe('[0]: a list is not allowed; it must be an object')
  })

  it('refuses a body above 256 kB', async () => {
    const problem = await problemOf(`[${' '.repeat(256_000)}]`, 413)
    expect(problem).toMatchObject({ code: 'too-large', message: 'The body is larger than 256 kB.' })
  })

  it.each([
    'text/plain',
    'application/x-www-form-urlencoded',
    'application/json; charset=nonsense',
  ])('refuses a body sent as %s', async (type) => {
    const problem = await problemOf(JSON.stringify(holdingCase), 415, type)
    expect(problem.code).toBe('unsupported-media-type')
  })

  it('has no other method', async () => {
    const answer = await request(freshApp().app).get('/api/check/section').expect(405)
    expect(answer.headers.allow).toBe('POST')
  })
})
