import type { z } from 'zod'
import type { demoAccountsSchema } from '../../../shared/schemas/account'
import type { Mode } from '../../../shared/schemas/health'
import type { Passwords } from '../../auth/passwords'
import type { Db } from '../../db/client'
import type { DemoSeed } from '../../db/demo-seed'
import { DEMO_ORGANISATIONS, DEMO_PASSWORD, DEMO_PEOPLE } from '../../demo/demo-people'
import { NotFoundError } from '../../errors'
import { insertOrganisation } from '../organisations/organisations.queries'
import { findAccount, insertAccount } from './accounts.queries'

type DemoAccounts = z.output<typeof demoAccountsSchema>

/**
 * The accounts that are still there and can be used.
 *
 * @throws NotFoundError in production.
 */
export function listDemoAccounts(db: Db, mode: Mode): DemoAccounts {
  if (mode !== 'demonstration') throw new NotFoundError('There are no demo accounts in production.')
  const accounts = Object.values(DEMO_PEOPLE).filter(({ id }) => isUsable(db, id))
  return {
    accounts: accounts.map(({ email, name, what }) => ({
      ...{ email, name, what },
      password: DEMO_PASSWORD,
    })),
  }
}

/** Demo accounts that could sign in with the password that everybody knows. */
export function usableDemoAccounts(db: Db): readonly string[] {
  return Object.values(DEMO_PEOPLE)
    .filter(({ id }) => isUsable(db, id))
    .map(({ name }) => name)
}

/** Organisations and people that the demonstration starts with. */
export function demoPeopleSeed(passwords: Pick<Passwords, 'hashNow'>): DemoSeed {
  return {
    name: 'people',
    run: (db) => {
      const createdAt = Date.now()
      for (const organisation of Object.values(DEMO_ORGANISATIONS)) {
        insertOrganisation(db, { ...organisation, createdAt })
      }
      for (const { what: _, ...person } of Object.values(DEMO_PEOPLE)) {
        const passwordHash = passwords.hashNow(DEMO_PASSWORD)
        insertAccount(db, { ...person, passwordHash, createdAt })
      }
    },
  }
}

function isUsable(db: Db, id: string): boolean {
  const account = findAccount(db, id)
  return account !== undefined && account.deactivatedAt === null && account.passwordHash !== null
}
