import type { RequestHandler, Router } from 'express'
import type { z } from 'zod'
import type { ProblemCode } from '../../shared/schemas/problem'
import { MethodNotAllowedError } from './http-errors'

/** What OpenAPI says about one method of one address. */
export interface Operation {
  readonly method: 'get' | 'post'
  readonly path: string
  readonly id: string
  readonly summary: string
  readonly request?: z.ZodType
  readonly response: z.ZodType
  /** What can go wrong, besides `internal`, which can everywhere. */
  readonly problems: readonly ProblemCode[]
}

/** A router with full paths, and the description of each of its routes. */
export interface ApiModule {
  readonly router: Router
  readonly operations: readonly Operation[]
}

/** Last handler of a route: answers every method that the route does not have. */
export function allowOnly(...methods: readonly string[]): RequestHandler {
  return (req) => {
    throw new MethodNotAllowedError(req.method, methods)
  }
}
