import {
  resetAcceptSchema,
  resetRequestSchema,
  resetViewSchema,
} from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import type { ServerParts } from '../../parts'
import { acceptReset, requestReset, viewReset } from './password-resets.service'

export function passwordResetsOperations(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: '/api/password-resets',
      id: 'requestPasswordReset',
      summary: 'Ask for a link to choose a new password; the answer is the same for any address',
      rule: 'open',
      status: 202,
      request: resetRequestSchema,
      problems: ['too-many-requests'],
      handle: ({ req }) => {
        requestReset(parts, parseBody(resetRequestSchema, req).email, senderOf(req))
      },
    }),
    defineOperation({
      method: 'get',
      path: '/api/password-resets/:token',
      id: 'readPasswordReset',
      summary: 'Whether a link for a new password still works',
      rule: 'open',
      response: resetViewSchema,
      problems: ['not-found'],
      handle: ({ req }) => viewReset(parts, pathPart(req, 'token')),
    }),
    defineOperation({
      method: 'post',
      path: '/api/password-resets/:token',
      id: 'acceptPasswordReset',
      summary: 'Choose a new password by a link; ends all sessions of the account',
      rule: 'open',
      request: resetAcceptSchema,
      problems: ['not-found'],
      handle: ({ req }) =>
        acceptReset(parts, pathPart(req, 'token'), parseBody(resetAcceptSchema, req).password),
    }),
  ]
}
