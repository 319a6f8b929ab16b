import express, { type Request } from 'express'
import { readJson } from '../batch/read-json'
import { UnsupportedMediaTypeError } from './http-errors'

const JSON_TYPES = ['application/json', 'application/*+json']

/** 256 kB: more than the longest list that is answered needs. */
const BODY_LIMIT = 256_000

/** 2 MB: a survey of 5000 stations, or a scenario with 2000 sizes. */
const LONG_BODY_LIMIT = 2_000_000

/** For addresses that take whole surveys; it goes before the other. */
export const receiveLongJsonText = express.text({ type: JSON_TYPES, limit: LONG_BODY_LIMIT })

/** Takes the body in as text, so that the API reads JSON exactly as the batch command does. */
export const receiveJsonText = express.text({ type: JSON_TYPES, limit: BODY_LIMIT })

/**
 * The JSON of the request.
 *
 * @throws UnsupportedMediaTypeError or InvalidJsonError
 */
export function jsonBody(req: Request): unknown {
  // `is` gives null where there is no body at all: that is an empty body, not a wrong type.
  if (req.is(JSON_TYPES) === false) {
    const type = req.get('content-type') ?? 'nothing'
    throw new UnsupportedMediaTypeError(
      `content-type: ${type} is not allowed; it must be application/json`,
    )
  }
  return readJson(typeof req.body === 'string' ? req.body : '')
}
