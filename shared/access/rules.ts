import type { AccountRole, Actor, MemberRole } from './roles'

/** Who may use a route. A route names its rule; there is no other place where access is decided. */
export interface AccessRule {
  /** `anyone`: without an account; `signed-in`: any account; or the roles that may. */
  readonly account: 'anyone' | 'signed-in' | readonly AccountRole[]
  /** Member roles that may, where the route belongs to a project; membership alone gives access. */
  readonly member?: readonly MemberRole[]
  readonly meaning: string
}

const ALL_MEMBERS = ['lead', 'editor', 'reader'] as const
const WRITERS = ['lead', 'editor'] as const

/** Who may what. The docs print this table, and a test walks it against every route. */
export const ACCESS_RULES = {
  open: { account: 'anyone', meaning: 'Anyone, without an account' },
  'signed-in': { account: 'signed-in', meaning: 'Any account, for what is its own' },
  'make-project': { account: ['engineer'], meaning: 'Engineers make projects' },
  'copy-project': {
    account: ['engineer'],
    member: WRITERS,
    meaning: 'Engineers who lead or edit a project make a copy of it',
  },
  'read-project': {
    account: 'signed-in',
    member: ALL_MEMBERS,
    meaning: 'Members of the project read it; sharing an organisation gives no access',
  },
  'edit-project': {
    account: 'signed-in',
    member: WRITERS,
    meaning: 'Leads and editors change what is in the project',
  },
  'lead-project': {
    account: 'signed-in',
    member: ['lead'],
    meaning: 'Leads look after members, archive and deletion',
  },
  'keep-store': {
    account: ['admin', 'engineer'],
    meaning: 'Administrators and engineers keep the depots of their organisation',
  },
  'run-classes': { account: ['trainer'], meaning: 'Trainers open classes and lead their own' },
  administer: {
    account: ['admin'],
    meaning: 'Administrators: people, organisations, audit trail, mail',
  },
} as const satisfies Record<string, AccessRule>

export type RuleId = keyof typeof ACCESS_RULES

/** Member role that counts: a viewer is never more than a reader. */
export function effectiveMember(role: AccountRole, member: MemberRole | null): MemberRole | null {
  return role === 'viewer' && member !== null ? 'reader' : member
}

/**
 * - `allowed`
 * - `sign-in`: needs an account
 * - `hidden`: the project does not exist for somebody who is no member
 * - `forbidden`: known, but not for this role
 */
export type AccessDecision = 'allowed' | 'sign-in' | 'hidden' | 'forbidden'

/** Decides on one request. `member` is the role in the project that the route belongs to, if any. */
export function decideAccess(
  id: RuleId,
  actor: Pick<Actor, 'role'> | null,
  member: MemberRole | null,
): AccessDecision {
  const rule: AccessRule = ACCESS_RULES[id]
  if (rule.account === 'anyone') return 'allowed'
  if (!actor) return 'sign-in'
  if (rule.account !== 'signed-in' && !rule.account.includes(actor.role)) return 'forbidden'
  if (!rule.member) return 'allowed'
  const counts = effectiveMember(actor.role, member)
  if (counts === null) return 'hidden'
  return rule.member.includes(counts) ? 'allowed' : 'forbidden'
}
