import type { Organisation } from '../../../shared/schemas/account'
import { newId } from '../../auth/tokens'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { unknownIn } from '../../http/unknown-reference'
import type { ServerParts } from '../../parts'
import { type Author, recordAudit } from '../audit/record-audit'
import {
  findOrganisation,
  findOrganisationByName,
  findShownOrganisation,
  insertOrganisation,
  type OrganisationRow,
  renameOrganisation,
} from './organisations.queries'

type Parts = Pick<ServerParts, 'db' | 'now'>

/** @throws ConflictError if another organisation has the name. */
export function createOrganisation({ db, now }: Parts, author: Author, name: string): Organisation {
  return db.transaction((tx) => {
    assertNameIsFree(tx, name)
    const organisation = { id: newId(), name, createdAt: now() }
    insertOrganisation(tx, organisation)
    recordAudit(tx, author, now(), about('organisation.created', organisation))
    return readOrganisation(tx, organisation.id)
  })
}

/** @throws NotFoundError, or ConflictError if another organisation has the name. */
export function changeOrganisation(
  { db, now }: Parts,
  author: Author,
  { id, name }: { readonly id: string; readonly name: string },
): Organisation {
  return db.transaction((tx) => {
    const before = findOrganisation(tx, id)
    if (!before) throw missing(id)
    assertNameIsFree(tx, name, id)
    renameOrganisation(tx, id, name)
    recordAudit(tx, author, now(), {
      ...about('organisation.renamed', { id, name }),
      detail: { from: before.name, to: name },
    })
    return readOrganisation(tx, id)
  })
}

/**
 * The organisation that a field names.
 *
 * @throws OutOfRangeError that names the field.
 */
export function organisationIn(db: Db, path: string, id: string): OrganisationRow {
  const organisation = findOrganisation(db, id)
  if (!organisation) throw unknownIn(path, id, 'the id of an organisation')
  return organisation
}

function readOrganisation(db: Db, id: string): Organisation {
  const organisation = findShownOrganisation(db, id)
  if (!organisation) throw missing(id)
  return organisation
}

function assertNameIsFree(db: Db, name: string, own?: string): void {
  const other = findOrganisationByName(db, name)
  if (other && other.id !== own) {
    throw new ConflictError(`name: there is an organisation "${other.name}" already`)
  }
}

function missing(id: string): NotFoundError {
  return new NotFoundError(`organisation: "${id}" does not exist`)
}

function about(action: string, { id, name }: Pick<OrganisationRow, 'id' | 'name'>) {
  return { action, subjectType: 'organisation', subjectId: id, subjectName: name }
}
