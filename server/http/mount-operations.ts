import { Router, type Request, type RequestHandler, type Response } from 'express'
import type { MemberRole } from '../../shared/access/roles'
import {
  ACCESS_RULES,
  decideAccess,
  effectiveMember,
  type AccessRule,
} from '../../shared/access/rules'
import { ForbiddenError, NotFoundError, SignInRequiredError } from '../errors'
import { MethodNotAllowedError } from './http-errors'
import type { Operation, SignedIn } from './operation'

/** Answers who sends a request, and what they are in a project. */
export interface Access {
  readonly signedIn: (req: Request, res: Response) => SignedIn | null | Promise<SignedIn | null>
  readonly memberRole: (projectId: string, accountId: string) => MemberRole | null
}

/** One router for all operations. A route exists only with its rule; other methods are refused. */
export function mountOperations(operations: readonly Operation[], access: Access): Router {
  const router = Router()
  for (const path of new Set(operations.map((operation) => operation.path))) {
    const route = router.route(path)
    const here = operations.filter((operation) => operation.path === path)
    for (const operation of here) {
      assertRule(operation)
      route[operation.method](handlerOf(operation, access))
    }
    const methods = here.map(({ method }) => method.toUpperCase())
    route.all(allowOnly(methods.includes('GET') ? [...methods, 'HEAD'] : methods))
  }
  return router
}

/** The compiler asks for a rule as well; this holds for whatever comes past the compiler. */
function assertRule({ id, rule }: Operation): void {
  if (!Object.hasOwn(ACCESS_RULES, rule)) {
    throw new Error(`${id} has no rule of the access table: "${String(rule)}"`)
  }
}

function allowOnly(methods: readonly string[]): RequestHandler {
  return (req) => {
    throw new MethodNotAllowedError(req.method, methods)
  }
}

function handlerOf(operation: Operation, access: Access): RequestHandler {
  return async (req, res) => {
    const actor = await admit(operation, access, req, res)
    const handle = operation.handle as (context: object) => unknown
    const answer = await handle({ req, res, actor })
    if (operation.mediaType !== undefined) return
    if (operation.response === undefined) res.status(operation.status ?? 204).end()
    else res.status(operation.status ?? 200).json(answer)
  }
}

/**
 * Lets a request in or not.
 *
 * @throws SignInRequiredError, ForbiddenError, or NotFoundError for a project that the account is no
 * member of.
 */
async function admit(
  { rule, path }: Operation,
  access: Access,
  req: Request,
  res: Response,
): Promise<SignedIn | null> {
  const account = await access.signedIn(req, res)
  const projectId = req.params.projectId
  const member =
    account && typeof projectId === 'string'
      ? access.memberRole(projectId, account.accountId)
      : null
  const decision = decideAccess(rule, account, member)
  if (decision === 'sign-in') throw new SignInRequiredError('Sign in first.')
  if (decision === 'hidden') {
    throw new NotFoundError(`project: "${String(projectId)}" does not exist, or not for you`)
  }
  if (decision === 'forbidden') {
    const allowed: AccessRule = ACCESS_RULES[rule]
    throw new ForbiddenError(`This is not for your role. ${allowed.meaning} (${path}).`)
  }
  return account && { ...account, member: effectiveMember(account.role, member) }
}
