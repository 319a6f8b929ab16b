import type { z } from 'zod'
import type { MemberRole } from '@shared/access/roles'
import type { memberSchema, membersSchema } from '@shared/schemas/project'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type Member = z.output<typeof memberSchema>

const path = (projectId: string) => `${projectPath(projectId)}/members`
const one = (projectId: string, accountId: string) =>
  `${path(projectId)}/${encodeURIComponent(accountId)}`

export async function fetchMembers(projectId: string, signal?: AbortSignal): Promise<Member[]> {
  const answer = (await getJson(path(projectId), signal)) as z.output<typeof membersSchema>
  return answer.members
}

export async function addMember(
  projectId: string,
  member: { email: string; role: MemberRole },
): Promise<Member> {
  return (await sendJson('POST', path(projectId), member)) as Member
}

export async function changeMember(
  projectId: string,
  accountId: string,
  role: MemberRole,
): Promise<Member> {
  return (await sendJson('PATCH', one(projectId, accountId), { role })) as Member
}

export async function removeMember(projectId: string, accountId: string): Promise<void> {
  await sendJson('DELETE', one(projectId, accountId))
}

/** Ends the membership of whoever asks. */
export async function leaveProject(projectId: string): Promise<void> {
  await sendJson('DELETE', `${projectPath(projectId)}/membership`)
}
