/** What an account is for. Permissions to check and to approve come on top. */
export const ACCOUNT_ROLES = ['admin', 'engineer', 'checker', 'trainer', 'viewer'] as const
export type AccountRole = (typeof ACCOUNT_ROLES)[number]

/** What a member may do in one project. */
export const MEMBER_ROLES = ['lead', 'editor', 'reader'] as const
export type MemberRole = (typeof MEMBER_ROLES)[number]

/** Whoever is signed in, as far as access is concerned. */
export interface Actor {
  readonly role: AccountRole
  readonly mayCheck: boolean
  readonly mayApprove: boolean
}
