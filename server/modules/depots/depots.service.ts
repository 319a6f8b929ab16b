import { randomUUID } from 'node:crypto'
import type { z } from 'zod'
import type { Depot, depotChangeSchema, NewDepot, Store } from '../../../shared/schemas/depot'
import { storeFaults } from '../../../shared/schemas/depot-faults'
import { OutOfRangeError } from '../../../shared/errors'
import type { Db } from '../../db/client'
import { NotFoundError } from '../../errors'
import { recordAudit } from '../audit/record-audit'
import { listBarriers } from '../catalogue/catalogue.queries'
import { findOrganisation } from '../organisations/organisations.queries'
import { change, type Deed, type Doer, type ProjectWork } from '../projects/deed'
import { assertVersion, changedFields, noProject } from '../projects/open-project'
import {
  deleteDepot,
  findDepot,
  findStoreOrganisation,
  insertDepot,
  listDepots,
  listItems,
  replaceItems,
  updateDepot,
} from './depots.queries'

/** Whoever keeps a store, and whose store it is. */
export interface Keeper extends Doer {
  readonly organisationId: string
}

/** The store of an organisation. */
export function readStore(db: Db, organisationId: string): Store {
  const { id, name } = findOrganisation(db, organisationId)!
  return { organisation: { id, name }, depots: depotsOf(db, id) }
}

/**
 * The store that counts in a project: that of the organisation whose account made it. Every member
 * reads the same figures, whichever organisation is their own.
 *
 * @throws NotFoundError
 */
export function readProjectStore(db: Db, projectId: string): Store {
  const organisation = findStoreOrganisation(db, projectId)
  if (!organisation) throw noProject(projectId)
  return { organisation, depots: depotsOf(db, organisation.id) }
}

function depotsOf(db: Db, organisationId: string): Depot[] {
  return listDepots(db, organisationId).map((row) => shown(db, row))
}

function shown(db: Db, { organisationId: _, ...row }: NonNullable<ReturnType<typeof findDepot>>) {
  return { ...row, items: listItems(db, row.id) }
}

/** @throws OutOfRangeError for a tube that the catalogue does not know, or a row without its size. */
export function createDepot(work: ProjectWork, keeper: Keeper, input: NewDepot): Depot {
  return change(work, keeper, (deed) => {
    const id = makeDepot(deed, keeper.organisationId, input)
    noteDepot(deed, { id, name: input.name, action: 'depot.created', toVersion: 1 })
    return depotAt(deed.tx, keeper, id)
  })
}

/** A depot without its line in the audit trail, for whoever makes more than one. */
export function makeDepot(
  { tx, by, at }: Deed,
  organisationId: string,
  { items, ...input }: NewDepot,
  id = randomUUID() as string,
): string {
  assertItems(tx, items)
  const { accountId } = by
  const kept = { createdAt: at, createdBy: accountId, updatedAt: at, updatedBy: accountId }
  insertDepot(tx, { id, organisationId, ...input, ...kept })
  replaceItems(tx, id, items)
  return id
}

/** @throws ConflictError for an older version. */
export function changeDepot(
  work: ProjectWork,
  keeper: Keeper,
  depotId: string,
  { version, items, ...fields }: z.output<typeof depotChangeSchema>,
): Depot {
  return change(work, keeper, (deed) => {
    const { tx, at, by } = deed
    const before = depotAt(tx, keeper, depotId)
    assertVersion(before, version)
    if (items) {
      assertItems(tx, items)
      replaceItems(tx, depotId, items)
    }
    const changed = { version: version + 1, updatedAt: at, updatedBy: by.accountId }
    updateDepot(tx, depotId, { ...fields, ...changed })
    noteDepot(deed, {
      id: depotId,
      name: fields.name ?? before.name,
      action: 'depot.changed',
      fromVersion: version,
      toVersion: version + 1,
      detail: {
        fields: [...changedFields(before, fields), ...(items ? ['items'] : [])],
        ...(items ? { before: before.items } : {}),
      },
    })
    return depotAt(tx, keeper, depotId)
  })
}

export function removeDepot(work: ProjectWork, keeper: Keeper, depotId: string): void {
  change(work, keeper, (deed) => {
    const { name, version, items } = depotAt(deed.tx, keeper, depotId)
    deleteDepot(deed.tx, depotId)
    const detail = { before: items }
    noteDepot(deed, { id: depotId, name, action: 'depot.removed', fromVersion: version, detail })
  })
}

/** @throws NotFoundError for a depot that is not of the keeper's organisation. */
function depotAt(db: Db, keeper: Keeper, depotId: string): Depot {
  const depot = findDepot(db, depotId)
  if (depot?.organisationId !== keeper.organisationId) {
    throw new NotFoundError(`depot: "${depotId}" does not exist in your organisation`)
  }
  return shown(db, depot)
}

function assertItems(db: Db, items: Depot['items']): void {
  const known = listBarriers(db).map(({ id }) => id)
  const faults = storeFaults(items, known)
  if (faults.length > 0) throw new OutOfRangeError(faults)
}

function noteDepot(
  { tx, by, at }: Deed,
  {
    id,
    name,
    action,
    ...rest
  }: {
    readonly id: string
    readonly name: string
    readonly action: string
    readonly fromVersion?: number
    readonly toVersion?: number
    readonly detail?: Readonly<Record<string, unknown>>
  },
): void {
  const subject = { subjectType: 'depot', subjectId: id, subjectName: name }
  recordAudit(tx, by, at, { action, ...subject, ...rest })
}
