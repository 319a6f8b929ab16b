import express, { type RequestHandler } from 'express'
import { pino } from 'pino'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import {
  ConflictError,
  ForbiddenError,
  InvalidJsonError,
  NotFoundError,
  UnavailableError,
} from '../../../server/errors'
import { errorHandler } from '../../../server/http/error-handler'
import { MethodNotAllowedError, UnsupportedMediaTypeError } from '../../../server/http/http-errors'
import { requestLog } from '../../../server/logger'
import { InvalidInputError, OutOfRangeError, rangeFault } from '../../../shared/errors'
import { problemSchema } from '../../../shared/schemas/problem'

const fault = rangeFault('water.depth', 5, { min: 0, max: 1.05, unit: 'm' })

/** A server with the one error handler, whose only route does as it is told. */
function serverThat(handler: RequestHandler) {
  const lines: string[] = []
  const app = express()
  app.use(requestLog(pino({ level: 'info' }, { write: (line: string) => lines.push(line) })))
  app.get('/', handler)
  app.use(errorHandler)
  return { app, lines }
}

function serverThatThrows(error: unknown) {
  return serverThat(() => {
    throw error
  })
}

describe('the error handler', () => {
  it.each([
    [new InvalidJsonError('it is empty'), 400, 'invalid-json'],
    [new InvalidInputError([fault]), 400, 'invalid-input'],
    [new ForbiddenError('Not yours'), 403, 'forbidden'],
    [new NotFoundError('No such line'), 404, 'not-found'],
    [new MethodNotAllowedError('PUT', ['GET']), 405, 'method-not-allowed'],
    [new ConflictError('Changed meanwhile'), 409, 'conflict'],
    [new UnsupportedMediaTypeError('JSON only'), 415, 'unsupported-media-type'],
    [new OutOfRangeError([fault]), 422, 'out-of-range'],
    [new UnavailableError('Down'), 503, 'unavailable'],
    [Object.assign(new Error('x'), { status: 413 }), 413, 'too-large'],
    [Object.assign(new Error('x'), { status: 415 }), 415, 'unsupported-media-type'],
    [Object.assign(new Error('x'), { status: 418 }), 400, 'bad-request'],
    [Object.assign(new Error('x'), { status: 502 }), 500, 'internal'],
    ['a text', 500, 'internal'],
    [new TypeError('x is not a function'), 500, 'internal'],
  ])('answers %s with %i %s', async (error, status, code) => {
    const answer = await request(serverThatThrows(error).app).get('/').expect(status)
    expect(problemSchema.parse(answer.body).code).toBe(code)
  })

  it('names each refused field with its value, what is allowed and the unit', async () => {
    const { app } = serverThatThrows(new OutOfRangeError([fault]))
    const { body } = await request(app).get('/')
    expect(body).toEqual({
      code: 'out-of-range',
      message: 'water.depth: 5 is not allowed; it must be 0 to 1.05 m',
      fields: [
        {
          path: 'water.depth',
          value: 5,
          allowed: '0 to 1.05 m',
          unit: 'm',
          message: 'water.depth: 5 is not allowed; it must be 0 to 1.05 m',
        },
      ],
    })
  })

  it.each([
    [Infinity, 'Infinity'],
    [NaN, 'NaN'],
    [undefined, null],
    [[1, 2], 'a list'],
    [{ a: 1 }, 'an object'],
    ['0,42', '0,42'],
    [false, false],
  ])('sends the value %j as %j', async (value, shown) => {
    const { app } = serverThatThrows(new InvalidInputError([{ ...fault, value }]))
    const { body } = await request(app).get('/')
    expect(problemSchema.parse(body).fields[0]?.value).toEqual(shown)
  })

  it('says how many more faults there are than it lists', async () => {
    const { app } = serverThatThrows(new OutOfRangeError(Array<typeof fault>(130).fill(fault)))
    const problem = problemSchema.parse((await request(app).get('/')).body)
    expect(problem.fields).toHaveLength(100)
    expect(problem.message).toMatch(/\nand 30 more$/)
  })

  it('logs a failure of the server and tells nobody what it was', async () => {
    const secret = 'password=hunter2 in /srv/secret.ts'
    const { app, lines } = serverThatThrows(new Error(secret))
    const answer = await request(app).get('/').expect(500)
    const problem = problemSchema.parse(answer.body)
    expect(answer.text).not.toContain('hunter2')
    expect(answer.text).not.toContain('.ts')
    const reference = /Reference: (\S+)$/.exec(problem.message)?.[1]
    const logged = lines.find((line) => line.includes(secret))
    expect(logged).toContain(reference)
  })

  it('does not log a refusal as a failure', async () => {
    const { app, lines } = serverThatThrows(new OutOfRangeError([fault]))
    await request(app).get('/')
    const levels = lines.map((line) => (JSON.parse(line) as { level: number }).level)
    expect(levels).toEqual([pino.levels.values.info])
  })

  it('names the methods that the address has', async () => {
    const { app } = serverThatThrows(new MethodNotAllowedError('PUT', ['GET', 'HEAD']))
    const answer = await request(app).get('/')
    expect(answer.headers.allow).toBe('GET, HEAD')
  })

  it('breaks off an answer that has begun instead of writing into it', async () => {
    const { app } = serverThat((_req, res) => {
      res.write('{"half":')
      throw new Error('too late')
    })
    await expect(request(app).get('/')).rejects.toThrow()
  })
})
