import type { Request, Response } from 'express'
import type { z } from 'zod'
import type { AccountRole, MemberRole } from '../../shared/access/roles'
import type { RuleId } from '../../shared/access/rules'
import type { ProblemCode } from '../../shared/schemas/problem'

/** Whoever sends a request with a valid session. */
export interface SignedIn {
  readonly accountId: string
  readonly sessionId: string
  readonly name: string
  readonly role: AccountRole
  readonly mayCheck: boolean
  readonly mayApprove: boolean
  readonly organisationId: string
  /** Role in the project of the route, as it counts for this account; null outside a project. */
  readonly member: MemberRole | null
}

export interface Context<Rule extends RuleId = RuleId> {
  readonly req: Request
  readonly res: Response
  /** Always there unless the route is open to anyone. */
  readonly actor: Rule extends 'open' ? SignedIn | null : SignedIn
}

/** One method of one address: who may, what goes in, what comes out, what can go wrong. */
export interface OperationFor<Rule extends RuleId> {
  readonly method: 'get' | 'post' | 'put' | 'patch' | 'delete'
  /** Express path; a route of a project carries `:projectId`. */
  readonly path: string
  readonly id: string
  readonly summary: string
  readonly rule: Rule
  /** What may stand behind the question mark of the address: search, order, page. */
  readonly query?: z.ZodObject
  readonly request?: z.ZodType
  /** Media type of a body that is not JSON: a form with a file. */
  readonly requestMediaType?: string
  /** Body of the answer; left out where there is none, or where it is no JSON. */
  readonly response?: z.ZodType
  /** Media type of an answer that the handler writes itself: a file, CSV. */
  readonly mediaType?: string
  /** Status of success; 200, or 204 without an answer. */
  readonly status?: 200 | 201 | 202 | 204
  /** What can go wrong, besides what access, method and server failures add everywhere. */
  readonly problems: readonly ProblemCode[]
  /** The answer; the handler writes to `res` itself where there is a `mediaType`. */
  readonly handle: (context: Context<Rule>) => unknown
}

/** An operation of any rule, as lists hold it. */
export type Operation = Omit<OperationFor<RuleId>, 'handle'> & {
  readonly handle: (context: never) => unknown
}

/** Lets the rule decide whether the handler always has an actor. */
export function defineOperation<Rule extends RuleId>(operation: OperationFor<Rule>): Operation {
  return operation
}

/** The path as OpenAPI writes it: `:projectId` becomes `{projectId}`. */
export function openapiPath(path: string): string {
  return path.replace(/:(\w+)/g, '{$1}')
}
