import {
  accountSchema,
  invitationAcceptSchema,
  invitationSchema,
  invitationsSchema,
  invitationViewSchema,
  newInvitationSchema,
  sessionAnswerSchema,
} from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { RouteParts } from '../../parts'
import { readAccount } from '../accounts/accounts.service'
import { acceptInvitation, viewInvitation } from './accept-invitation.service'
import { invite, listShownInvitations, revokeInvitation } from './invitations.service'

export function invitationsOperations(parts: RouteParts): readonly Operation[] {
  return [...forTheInvited(parts), ...forAdministrators(parts)]
}

function forTheInvited(parts: RouteParts): readonly Operation[] {
  const { db, sessions } = parts
  return [
    defineOperation({
      method: 'get',
      path: '/api/invitations/:token',
      id: 'readInvitation',
      summary: 'What an invitation offers, while it can be accepted',
      rule: 'open',
      response: invitationViewSchema,
      problems: ['not-found'],
      handle: ({ req }) => viewInvitation(parts, pathPart(req, 'token')),
    }),
    defineOperation({
      method: 'post',
      path: '/api/invitations/:token',
      id: 'acceptInvitation',
      summary: 'Accept an invitation: makes the account and signs in',
      rule: 'open',
      status: 201,
      request: invitationAcceptSchema,
      response: sessionAnswerSchema.extend({ account: accountSchema }),
      problems: ['not-found', 'conflict', 'out-of-range'],
      handle: async ({ req, res }) => {
        const accepted = parseBody(invitationAcceptSchema, req)
        const accountId = await acceptInvitation(parts, pathPart(req, 'token'), accepted)
        await sessions.open(req, res, accountId)
        return { account: readAccount(db, accountId) }
      },
    }),
  ]
}

function forAdministrators(parts: RouteParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/admin/invitations',
      id: 'listInvitations',
      summary: 'Invitations, the newest first',
      rule: 'administer',
      response: invitationsSchema,
      problems: [],
      handle: () => ({ invitations: listShownInvitations(parts) }),
    }),
    defineOperation({
      method: 'post',
      path: '/api/admin/invitations',
      id: 'invite',
      summary: 'Invite somebody by mail; an earlier invitation to the address ends',
      rule: 'administer',
      status: 201,
      request: newInvitationSchema,
      response: invitationSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) => invite(parts, actor, parseBody(newInvitationSchema, req)),
    }),
    defineOperation({
      method: 'delete',
      path: '/api/admin/invitations/:invitationId',
      id: 'revokeInvitation',
      summary: 'Revoke an open invitation',
      rule: 'administer',
      problems: ['not-found', 'conflict'],
      handle: ({ req, actor }) => {
        revokeInvitation(parts, actor, pathPart(req, 'invitationId'))
      },
    }),
  ]
}
