import type { z } from 'zod'
import type { AccountRole, MemberRole } from '../../../shared/access/roles'
import { OutOfRangeError, showValue } from '../../../shared/errors'
import type { memberSchema, membersSchema, newMemberSchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { change, type Doer, noteChange, type ProjectWork } from '../projects/deed'
import {
  countOtherLeads,
  deleteMember,
  findActiveAccount,
  findMember,
  insertMember,
  listMembers,
  updateMemberRole,
} from './members.queries'

type Member = z.output<typeof memberSchema>
type Row = NonNullable<ReturnType<typeof findMember>>

export interface MemberPlace {
  readonly projectId: string
  readonly accountId: string
}

function shownMember({ deactivatedAt, ...member }: Row): Member {
  return { ...member, isActive: deactivatedAt === null }
}

export function readMembers(db: Db, projectId: string): z.output<typeof membersSchema> {
  return { members: listMembers(db, projectId).map(shownMember) }
}

/**
 * Adds somebody by the address of their account.
 *
 * @throws OutOfRangeError for an address without an active account (unknown and closed ones alike),
 * or for a role that a viewer cannot have; ConflictError for somebody who is a member already.
 */
export function addMember(
  work: ProjectWork,
  actor: Doer,
  projectId: string,
  { email, role }: z.output<typeof newMemberSchema>,
): Member {
  return change(work, actor, (deed) => {
    const account = findActiveAccount(deed.tx, email)
    if (!account) throw refused('email', email, 'the address of an active account')
    const place = { projectId, accountId: account.id }
    if (findMember(deed.tx, projectId, account.id)) {
      throw new ConflictError(`${account.name} is a member already; change the role instead.`)
    }
    assertRoleFits(account, role)
    insertMember(deed.tx, { ...place, role, addedAt: deed.at })
    noteChange(deed, projectId, { ...subject(account), action: 'member.added', detail: { role } })
    return memberAt(deed.tx, place)
  })
}

/** @throws ConflictError where no lead would be left; OutOfRangeError for more than a viewer may. */
export function changeMemberRole(
  work: ProjectWork,
  actor: Doer,
  place: MemberPlace,
  role: MemberRole,
): Member {
  return change(work, actor, (deed) => {
    const before = memberAt(deed.tx, place)
    assertRoleFits({ name: before.name, role: before.accountRole as AccountRole }, role)
    if (role !== 'lead') assertLeadStays(deed.tx, place, before)
    updateMemberRole(deed.tx, { ...place, role })
    noteChange(deed, place.projectId, {
      ...subject({ id: before.accountId, name: before.name }),
      action: 'member.role-changed',
      detail: { from: before.role, to: role },
    })
    return memberAt(deed.tx, place)
  })
}

/** @throws ConflictError where no lead would be left. */
export function removeMember(work: ProjectWork, actor: Doer, place: MemberPlace): void {
  endMembership(work, actor, place, 'member.removed')
}

/** Whatever somebody made stays. @throws ConflictError for the only lead. */
export function leaveProject(work: ProjectWork, actor: Doer, projectId: string): void {
  endMembership(work, actor, { projectId, accountId: actor.accountId }, 'member.left')
}

function endMembership(work: ProjectWork, actor: Doer, place: MemberPlace, action: string): void {
  change(work, actor, (deed) => {
    const before = memberAt(deed.tx, place)
    assertLeadStays(deed.tx, place, before)
    deleteMember(deed.tx, place.projectId, place.accountId)
    noteChange(deed, place.projectId, {
      ...subject({ id: before.accountId, name: before.name }),
      action,
      detail: { role: before.role },
    })
  })
}

function memberAt(db: Db, { projectId, accountId }: MemberPlace): Member {
  const row = findMember(db, projectId, accountId)
  if (!row) throw new NotFoundError(`member: "${accountId}" is no member of this project`)
  return shownMember(row)
}

const subject = ({ id, name }: { id: string; name: string }) => ({
  subjectType: 'member',
  subjectId: id,
  subjectName: name,
})

function assertRoleFits(account: { name: string; role: AccountRole }, role: MemberRole): void {
  if (account.role !== 'viewer' || role === 'reader') return
  throw refused('role', role, `reader: ${account.name} has a viewer's account, which only reads`)
}

/** A project always has a lead who can sign in. */
function assertLeadStays(db: Db, { projectId, accountId }: MemberPlace, member: Member): void {
  if (member.role !== 'lead' || countOtherLeads(db, projectId, accountId) > 0) return
  throw new ConflictError(`${member.name} is the only lead; make somebody else a lead first.`)
}

function refused(path: string, value: string, allowed: string): OutOfRangeError {
  const message = `${path}: ${showValue(value)} is not allowed; it must be ${allowed}`
  return new OutOfRangeError([{ path, value, allowed, unit: '–', message }])
}
