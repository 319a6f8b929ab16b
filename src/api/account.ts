import type { z } from 'zod'
import type {
  Account,
  AccountChange,
  InvitationAccept,
  invitationViewSchema,
  ownSessionsSchema,
  PasswordChange,
  resetViewSchema,
  sessionAnswerSchema,
} from '@shared/schemas/account'
import { getJson, sendJson } from './request'

export type OwnSession = z.output<typeof ownSessionsSchema>['sessions'][number]
export type InvitationView = z.output<typeof invitationViewSchema>
export type ResetView = z.output<typeof resetViewSchema>

export async function changeAccount(change: AccountChange): Promise<Account> {
  return (await sendJson('PATCH', '/api/account', change)) as Account
}

export async function changePassword(change: PasswordChange): Promise<true> {
  await sendJson('PUT', '/api/account/password', change)
  return true
}

export async function fetchOwnSessions(signal?: AbortSignal): Promise<OwnSession[]> {
  const answer = await getJson('/api/account/sessions', signal)
  return (answer as z.output<typeof ownSessionsSchema>).sessions
}

export async function endOwnSession(id: string): Promise<true> {
  await sendJson('DELETE', `/api/account/sessions/${encodeURIComponent(id)}`)
  return true
}

/** Signs out everywhere, here included. */
export async function endOwnSessions(): Promise<true> {
  await sendJson('DELETE', '/api/account/sessions')
  return true
}

const invitationPath = (token: string) => `/api/invitations/${encodeURIComponent(token)}`
const resetPath = (token: string) => `/api/password-resets/${encodeURIComponent(token)}`

export async function fetchInvitation(
  token: string,
  signal?: AbortSignal,
): Promise<InvitationView> {
  return (await getJson(invitationPath(token), signal)) as InvitationView
}

/** Makes the account and signs in. */
export async function acceptInvitation(token: string, input: InvitationAccept): Promise<Account> {
  const answer = await sendJson('POST', invitationPath(token), input)
  return (answer as z.output<typeof sessionAnswerSchema>).account!
}

/** The server answers alike whether it knows the address or not. */
export async function requestReset(email: string): Promise<true> {
  await sendJson('POST', '/api/password-resets', { email })
  return true
}

export async function fetchReset(token: string, signal?: AbortSignal): Promise<ResetView> {
  return (await getJson(resetPath(token), signal)) as ResetView
}

export async function acceptReset(token: string, password: string): Promise<true> {
  await sendJson('POST', resetPath(token), { password })
  return true
}
