import type { AccountRole } from '../../../shared/access/roles'

export interface Permissions {
  readonly role: AccountRole
  readonly mayCheck: boolean
  readonly mayApprove: boolean
}

/** Permissions as they count: a checker has both. */
export function permissionsOf({ role, mayCheck, mayApprove }: Permissions): Permissions {
  const isChecker = role === 'checker'
  return { role, mayCheck: mayCheck || isChecker, mayApprove: mayApprove || isChecker }
}
