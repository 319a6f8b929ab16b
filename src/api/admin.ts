import type { z } from 'zod'
import type {
  auditPageSchema,
  AuditQuery,
  Invitation,
  invitationsSchema,
  mailsPageSchema,
  NewInvitation,
  Organisation,
  organisationsSchema,
  peoplePageSchema,
  PeopleQuery,
  Person,
  PersonChange,
} from '@shared/schemas/account'
import type { LetterheadRecord } from '@shared/schemas/letterhead'
import { getJson, sendJson } from './request'

export type PeoplePage = z.output<typeof peoplePageSchema>
export type AuditPage = z.output<typeof auditPageSchema>
export type MailsPage = z.output<typeof mailsPageSchema>

/** A path with what stands behind its question mark; what is empty is left out. */
function withQuery(path: string, query: Readonly<Record<string, string | number | undefined>>) {
  const given = Object.entries(query).filter(([, value]) => value !== '' && value !== undefined)
  const search = new URLSearchParams(given.map(([name, value]) => [name, String(value)]))
  return search.size === 0 ? path : `${path}?${search}`
}

export async function fetchPeople(query: PeopleQuery, signal?: AbortSignal): Promise<PeoplePage> {
  return (await getJson(withQuery('/api/admin/people', query), signal)) as PeoplePage
}

const personPath = (id: string) => `/api/admin/people/${encodeURIComponent(id)}`

export async function changePerson(id: string, change: PersonChange): Promise<Person> {
  return (await sendJson('PATCH', personPath(id), change)) as Person
}

/** Ends an account; `handOverTo` leads its projects from now on. */
export async function deactivatePerson(id: string, handOverTo: string | null): Promise<Person> {
  return (await sendJson('POST', `${personPath(id)}/deactivation`, { handOverTo })) as Person
}

export async function eraseAddress(id: string): Promise<Person> {
  return (await sendJson('DELETE', `${personPath(id)}/address`)) as Person
}

const letterheadPath = (organisationId: string) =>
  `/api/admin/organisations/${encodeURIComponent(organisationId)}/letterhead`

export async function fetchLetterhead(
  organisationId: string,
  signal?: AbortSignal,
): Promise<LetterheadRecord> {
  return (await getJson(letterheadPath(organisationId), signal)) as LetterheadRecord
}

export async function changeLetterhead(
  organisationId: string,
  letterhead: LetterheadRecord,
): Promise<LetterheadRecord> {
  return (await sendJson('PUT', letterheadPath(organisationId), letterhead)) as LetterheadRecord
}

export async function fetchInvitations(signal?: AbortSignal): Promise<Invitation[]> {
  const answer = await getJson('/api/admin/invitations', signal)
  return (answer as z.output<typeof invitationsSchema>).invitations
}

export async function invite(wanted: NewInvitation): Promise<Invitation> {
  return (await sendJson('POST', '/api/admin/invitations', wanted)) as Invitation
}

export async function revokeInvitation(id: string): Promise<true> {
  await sendJson('DELETE', `/api/admin/invitations/${encodeURIComponent(id)}`)
  return true
}

export async function fetchOrganisations(signal?: AbortSignal): Promise<Organisation[]> {
  const answer = await getJson('/api/admin/organisations', signal)
  return (answer as z.output<typeof organisationsSchema>).organisations
}

export async function createOrganisation(name: string): Promise<Organisation> {
  return (await sendJson('POST', '/api/admin/organisations', { name })) as Organisation
}

export async function renameOrganisation(id: string, name: string): Promise<Organisation> {
  const path = `/api/admin/organisations/${encodeURIComponent(id)}`
  return (await sendJson('PATCH', path, { name })) as Organisation
}

export async function fetchAudit(query: AuditQuery, signal?: AbortSignal): Promise<AuditPage> {
  return (await getJson(withQuery('/api/admin/audit', query), signal)) as AuditPage
}

/** Address of the filtered trail as a file. */
export function auditCsvPath({ search, action, from, to }: Omit<AuditQuery, 'page'>): string {
  return withQuery('/api/admin/audit.csv', { search, action, from, to })
}

export async function fetchMails(page: number, signal?: AbortSignal): Promise<MailsPage> {
  return (await getJson(withQuery('/api/admin/mails', { page }), signal)) as MailsPage
}

/** Address of a mail as a file that a mail program opens. */
export function mailFilePath(id: string): string {
  return `/api/admin/mails/${encodeURIComponent(id)}`
}

export async function retryMail(id: string): Promise<true> {
  await sendJson('POST', `${mailFilePath(id)}/retry`)
  return true
}
