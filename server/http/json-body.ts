import express, { type Request } from 'express'
import { readJson } from '../batch/read-json'
import { UnsupportedMediaTypeError } from './http-errors'

const JSON_TYPES = ['application/json', 'application/*+json']

/** 256 kB: more than the longest list that is answered needs. */
const BODY_LIMIT = 256_000

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
