import type { PeopleQuery, Person, PersonChange } from '../../../shared/schemas/account'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import type { ServerParts } from '../../parts'
import { countActiveAdministrators, updateAccount } from '../accounts/accounts.queries'
import { permissionsOf } from '../accounts/permissions'
import { recordAudit } from '../audit/record-audit'
import { organisationIn } from '../organisations/organisations.service'
import { countPeople, findPerson, listPeople } from './people.queries'

type Parts = Pick<ServerParts, 'db' | 'now'>

export function pageOfPeople({ db }: Pick<Parts, 'db'>, query: PeopleQuery) {
  const items = listPeople(db, query)
  return { items, page: query.page, pageSize: PAGE_SIZE, total: countPeople(db, query) }
}

/** @throws NotFoundError */
export function readPerson(db: Db, id: string): Person {
  const person = findPerson(db, id)
  if (!person) throw new NotFoundError(`person: "${id}" does not exist`)
  return person
}

/**
 * Changes role, permissions or organisation.
 *
 * @throws NotFoundError; ConflictError if nobody would administer the program or lead a project;
 * OutOfRangeError for an unknown organisation.
 */
export function changePerson(
  { db, now }: Parts,
  actor: SignedIn,
  id: string,
  change: PersonChange,
): Person {
  return db.transaction((tx) => {
    const before = readPerson(tx, id)
    assertIsActive(before)
    if (change.organisationId !== undefined) {
      organisationIn(tx, 'organisationId', change.organisationId)
    }
    const permissions = permissionsOf({ ...before, ...change })
    assertSomebodyAdministers(tx, before, permissions.role === 'admin')
    if (permissions.role === 'viewer') assertLeadsNothing(before)
    const organisationId = change.organisationId ?? before.organisation.id
    updateAccount(tx, id, { ...permissions, organisationId })
    const after = readPerson(tx, id)
    const detail = differences(before, after)
    if (Object.keys(detail).length > 0) {
      recordAudit(tx, actor, now(), { ...about('person.changed', after), detail })
    }
    return after
  })
}

export function assertIsActive(person: Person): void {
  if (person.deactivatedAt !== null) throw new ConflictError('person: deactivated already')
}

/** @throws ConflictError if the last administrator would be one no longer. */
export function assertSomebodyAdministers(db: Db, person: Person, staysOne: boolean): void {
  if (person.role !== 'admin' || staysOne || countActiveAdministrators(db) > 1) return
  throw new ConflictError('person: this is the last administrator; name another one first')
}

function assertLeadsNothing({ leads }: Person): void {
  if (leads === 0) return
  const what = leads === 1 ? 'a project' : `${leads} projects`
  throw new ConflictError(
    `role: this person alone leads ${what}, and a viewer cannot lead; another lead comes first`,
  )
}

/** What changed, from what to what, for the audit trail. */
function differences(before: Person, after: Person): Record<string, unknown> {
  const flat = ({ role, mayCheck, mayApprove, organisation }: Person) => ({
    ...{ role, mayCheck, mayApprove },
    organisation: organisation.name,
  })
  const [from, to] = [flat(before), flat(after)]
  const changed = (Object.keys(to) as (keyof typeof to)[]).filter((key) => from[key] !== to[key])
  return Object.fromEntries(changed.map((key) => [key, { from: from[key], to: to[key] }]))
}

export function about(action: string, { id, name }: Pick<Person, 'id' | 'name'>) {
  return { action, subjectType: 'account', subjectId: id, subjectName: name }
}
