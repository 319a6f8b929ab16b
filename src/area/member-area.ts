import { decideAccess, type RuleId } from '@shared/access/rules'
import type { Account } from '@shared/schemas/account'
import { areaTexts } from '@shared/texts/member-area'
import { ApiError } from '@/api/request'
import type { Area } from '@/router/admit-to-areas'
import { useSession } from '@/stores/session'

/** Lets people in by the rule of the page; the server decides again about everything it gives. */
export const memberArea: Area = {
  texts: areaTexts,
  async admit(to) {
    const rule: RuleId = to.meta.access ?? 'signed-in'
    if (decideAccess(rule, null, null) === 'allowed') return true
    const account = await whoeverIsThere()
    if (account === 'unknown') return true
    const decision = decideAccess(rule, account, null)
    if (decision === 'sign-in') return { name: 'sign-in', query: { next: to.fullPath } }
    return decision === 'allowed' || { name: 'account', query: { refused: to.path } }
  },
}

/** Without an answer the page opens all the same and says itself what could not be loaded. */
async function whoeverIsThere(): Promise<Account | null | 'unknown'> {
  try {
    return await useSession().load()
  } catch (error) {
    if (error instanceof ApiError) return 'unknown'
    throw error
  }
}
