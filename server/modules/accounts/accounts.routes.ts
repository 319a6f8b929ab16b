import {
  accountChangeSchema,
  accountSchema,
  ownSessionsSchema,
  passwordChangeSchema,
} from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import type { RouteParts } from '../../parts'
import {
  changeAccount,
  changePassword,
  endOwnSession,
  endOwnSessions,
  listOwnSessions,
} from './accounts.service'

export function accountsOperations(parts: RouteParts): readonly Operation[] {
  return [...ownAccount(parts), ...ownSessions(parts)]
}

function ownAccount(parts: RouteParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'patch',
      path: '/api/account',
      id: 'changeAccount',
      summary: 'Change own name, registration number, time zone or units',
      rule: 'signed-in',
      request: accountChangeSchema,
      response: accountSchema,
      problems: ['out-of-range'],
      handle: ({ req, actor }) => changeAccount(parts, actor, parseBody(accountChangeSchema, req)),
    }),
    defineOperation({
      method: 'put',
      path: '/api/account/password',
      id: 'changePassword',
      summary: 'Change own password; ends the other sessions',
      rule: 'signed-in',
      request: passwordChangeSchema,
      problems: ['out-of-range', 'too-many-requests'],
      handle: ({ req, actor }) =>
        changePassword(parts, actor, parseBody(passwordChangeSchema, req), senderOf(req)),
    }),
  ]
}

function ownSessions(parts: RouteParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/account/sessions',
      id: 'listOwnSessions',
      summary: 'Own open sessions',
      rule: 'signed-in',
      response: ownSessionsSchema,
      problems: [],
      handle: ({ actor }) => listOwnSessions(parts, actor),
    }),
    defineOperation({
      method: 'delete',
      path: '/api/account/sessions',
      id: 'endOwnSessions',
      summary: 'Sign out everywhere',
      rule: 'signed-in',
      problems: [],
      handle: async ({ req, res, actor }) => {
        endOwnSessions(parts, actor)
        await parts.sessions.close(req, res)
      },
    }),
    defineOperation({
      method: 'delete',
      path: '/api/account/sessions/:sessionId',
      id: 'endOwnSession',
      summary: 'End one of the own sessions',
      rule: 'signed-in',
      problems: ['not-found'],
      handle: ({ req, actor }) => {
        endOwnSession(parts, actor, pathPart(req, 'sessionId'))
      },
    }),
  ]
}
