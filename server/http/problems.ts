import type { ProblemCode } from '../../shared/schemas/problem'

/** HTTP status of each problem and what it means, for the error handler and for OpenAPI. */
export const PROBLEMS: Readonly<Record<ProblemCode, { status: number; meaning: string }>> = {
  'invalid-json': { status: 400, meaning: 'The body is not JSON' },
  'invalid-input': { status: 400, meaning: 'A field has the wrong shape or type' },
  'bad-request': { status: 400, meaning: 'The request cannot be read' },
  'sign-in-required': { status: 401, meaning: 'Nobody is signed in' },
  forbidden: { status: 403, meaning: 'The account may not do this' },
  'not-found': { status: 404, meaning: 'It does not exist' },
  'method-not-allowed': { status: 405, meaning: 'The address has no such method' },
  conflict: { status: 409, meaning: 'It contradicts what is already there' },
  'too-large': { status: 413, meaning: 'The body is larger than the address takes' },
  'unsupported-media-type': {
    status: 415,
    meaning: 'The body is not sent as JSON in a known encoding',
  },
  'out-of-range': { status: 422, meaning: 'A field lies outside its range' },
  'too-many-requests': { status: 429, meaning: 'Too many attempts; try again later' },
  internal: { status: 500, meaning: 'The server failed; the fault is in its log' },
  unavailable: { status: 503, meaning: 'The server cannot do its work at present' },
}
