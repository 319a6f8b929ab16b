import type { Person } from '@shared/schemas/account'

/** A viewer never leads, and an administrator sees no project without being asked in. */
export function mayLead({ role, deactivatedAt }: Person): boolean {
  return deactivatedAt === null && role !== 'viewer' && role !== 'admin'
}
