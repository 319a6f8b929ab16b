import type { z } from 'zod'
import type {
  Account,
  demoAccountsSchema,
  sessionAnswerSchema,
  signInSchema,
} from '@shared/schemas/account'
import { getJson, sendJson, SESSION_PATH } from './request'

type SessionAnswer = z.output<typeof sessionAnswerSchema>
export type SignIn = z.input<typeof signInSchema>
export type DemoAccount = z.output<typeof demoAccountsSchema>['accounts'][number]

/** Whoever is signed in; null for nobody. */
export async function fetchSession(signal?: AbortSignal): Promise<Account | null> {
  return ((await getJson(SESSION_PATH, signal)) as SessionAnswer).account
}

export async function signIn(input: SignIn): Promise<Account> {
  const { account } = (await sendJson('POST', SESSION_PATH, input)) as SessionAnswer
  return account!
}

export async function signOut(): Promise<void> {
  await sendJson('DELETE', SESSION_PATH)
}

export async function fetchDemoAccounts(signal?: AbortSignal): Promise<DemoAccount[]> {
  const { accounts } = (await getJson('/api/demo-accounts', signal)) as {
    accounts: DemoAccount[]
  }
  return accounts
}
