import type { Express } from 'express'
import request from 'supertest'
import type { AccountRole } from '../../shared/access/roles'
import { newId } from '../../server/auth/tokens'
import {
  findOrganisation,
  insertOrganisation,
} from '../../server/modules/organisations/organisations.queries'
import { insertAccount } from '../../server/modules/accounts/accounts.queries'
import type { RouteParts } from '../../server/parts'
import { CHEAP_PASSWORDS } from './server-app'

/** Password of every person of the tests. */
export const PASSWORD = 'a password of the tests'
const PASSWORD_HASH = CHEAP_PASSWORDS.hashNow(PASSWORD)

/** Address of the program in the tests, as browsers name it. */
export const ORIGIN = 'http://localhost:3000'

const ORGANISATION = { id: 'tests', name: 'Organisation of the tests', createdAt: 0 }

export interface Wanted {
  readonly id?: string
  readonly role?: AccountRole
  readonly name?: string
  readonly email?: string
  readonly mayCheck?: boolean
  readonly mayApprove?: boolean
}

export interface TestPerson {
  readonly id: string
  readonly email: string
  readonly name: string
}

/** Puts a person with an active account into the database. */
export function makePerson({ db }: Pick<RouteParts, 'db'>, wanted: Wanted = {}): TestPerson {
  if (!findOrganisation(db, ORGANISATION.id)) insertOrganisation(db, ORGANISATION)
  const { id = newId(), role = 'engineer', ...rest } = wanted
  const person = { id, role, name: `Person ${id.slice(0, 4)}`, email: `${id}@people.test`, ...rest }
  insertAccount(db, {
    ...person,
    organisationId: ORGANISATION.id,
    passwordHash: PASSWORD_HASH,
    createdAt: 0,
  })
  return person
}

/** A browser without a session: it keeps cookies and names its origin. */
export function browser(app: Express) {
  return request.agent(app).set('Origin', ORIGIN)
}

export type Browser = ReturnType<typeof browser>

/** A browser in which the person is signed in. */
export async function signedIn(
  app: Express,
  { email }: Pick<TestPerson, 'email'>,
  password = PASSWORD,
): Promise<Browser> {
  const agent = browser(app)
  await agent.post('/api/session').send({ email, password }).expect(200)
  return agent
}
