import { and, asc, count, eq, isNotNull, isNull, type SQL, sql } from 'drizzle-orm'
import type { PeopleQuery } from '../../../shared/schemas/account'
import { PAGE_SIZE } from '../../../shared/schemas/paging'
import type { Db } from '../../db/client'
import { accounts, organisations, projectMembers } from '../../db/schema'
import { containsWords } from '../../db/search'

/** Projects in which nobody else could take the lead: no other active lead that counts as one. */
const leads = sql<number>`(
  select count(*) from ${projectMembers} mine
  where mine.account_id = ${accounts.id} and mine.role = 'lead' and not exists (
    select 1 from ${projectMembers} other
    inner join ${accounts} someone on someone.id = other.account_id
    where other.project_id = mine.project_id and other.role = 'lead'
      and other.account_id <> mine.account_id
      and someone.deactivated_at is null and someone.role <> 'viewer'
  )
)`

const { id, email, name, role, mayCheck, mayApprove, createdAt, deactivatedAt } = accounts

const shown = {
  ...{ id, email, name, role, mayCheck, mayApprove, createdAt, deactivatedAt },
  organisation: { id: organisations.id, name: organisations.name },
  leads,
}

const STATES: Readonly<Record<PeopleQuery['state'], SQL | undefined>> = {
  active: isNull(deactivatedAt),
  deactivated: isNotNull(deactivatedAt),
  any: undefined,
}

function wanted({ search, state }: PeopleQuery): SQL | undefined {
  return and(STATES[state], containsWords(search, name, email, organisations.name))
}

export function listPeople(db: Db, query: PeopleQuery) {
  return db
    .select(shown)
    .from(accounts)
    .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
    .where(wanted(query))
    .orderBy(asc(sql`lower(${name})`), asc(id))
    .limit(PAGE_SIZE)
    .offset((query.page - 1) * PAGE_SIZE)
    .all()
}

export function countPeople(db: Db, query: PeopleQuery): number {
  return (
    db
      .select({ total: count() })
      .from(accounts)
      .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
      .where(wanted(query))
      .get()?.total ?? 0
  )
}

export function findPerson(db: Db, accountId: string) {
  return db
    .select(shown)
    .from(accounts)
    .innerJoin(organisations, eq(organisations.id, accounts.organisationId))
    .where(eq(id, accountId))
    .get()
}
