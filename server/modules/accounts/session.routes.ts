import {
  accountSchema,
  demoAccountsSchema,
  sessionAnswerSchema,
  signInSchema,
} from '../../../shared/schemas/account'
import type { Mode } from '../../../shared/schemas/health'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import type { RouteParts } from '../../parts'
import { readAccount } from './accounts.service'
import { listDemoAccounts } from './demo-accounts.service'
import { signIn } from './sign-in.service'

export function sessionOperations(parts: RouteParts): readonly Operation[] {
  const { db, sessions } = parts
  return [
    defineOperation({
      method: 'get',
      path: '/api/session',
      id: 'readSession',
      summary: 'Whoever is signed in',
      rule: 'open',
      response: sessionAnswerSchema,
      problems: [],
      handle: ({ actor }) => ({ account: actor && readAccount(db, actor.accountId) }),
    }),
    defineOperation({
      method: 'post',
      path: '/api/session',
      id: 'signIn',
      summary: 'Sign in',
      rule: 'open',
      request: signInSchema,
      response: sessionAnswerSchema.extend({ account: accountSchema }),
      problems: ['sign-in-required', 'too-many-requests'],
      handle: async ({ req, res }) => {
        const accountId = await signIn(parts, parseBody(signInSchema, req), senderOf(req))
        await sessions.open(req, res, accountId)
        return { account: readAccount(db, accountId) }
      },
    }),
    defineOperation({
      method: 'delete',
      path: '/api/session',
      id: 'signOut',
      summary: 'Sign out; does nothing for nobody',
      rule: 'open',
      problems: [],
      handle: ({ req, res }) => sessions.close(req, res),
    }),
  ]
}

/** The way into the demonstration. */
export function demoAccountsOperations(
  { db }: Pick<RouteParts, 'db'>,
  mode: Mode,
): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/demo-accounts',
      id: 'listDemoAccounts',
      summary: 'Accounts of the demonstration with their password; there are none in production',
      rule: 'open',
      response: demoAccountsSchema,
      problems: ['not-found'],
      handle: () => listDemoAccounts(db, mode),
    }),
  ]
}
