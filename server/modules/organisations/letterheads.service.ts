import { OutOfRangeError } from '../../../shared/errors'
import type { LetterheadRecord } from '../../../shared/schemas/letterhead'
import type { Letterhead } from '../../../shared/schemas/sheet'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { prepareImage } from '../../files/prepare-image'
import type { ServerParts } from '../../parts'
import { type Author, recordAudit } from '../audit/record-audit'
import { findLetterhead, writeLetterhead } from './letterheads.queries'
import { findOrganisation } from './organisations.queries'

const BLANK = { name: '', address: '', disclaimer: '', logo: null }

/** @throws NotFoundError */
export function readLetterhead(db: Db, organisationId: string): LetterheadRecord {
  if (!findOrganisation(db, organisationId)) {
    throw new NotFoundError(`organisation: "${organisationId}" does not exist`)
  }
  const { name, address, disclaimer, logo, version } = findLetterhead(db, organisationId) ?? {
    ...BLANK,
    version: 1,
  }
  return { name, address, disclaimer, logo, version }
}

/** What a sheet of the organisation bears at its head. */
export function letterheadOf(db: Db, organisationId: string): Letterhead {
  const { version: _, ...letterhead } = readLetterhead(db, organisationId)
  const name = letterhead.name || findOrganisation(db, organisationId)!.name
  return { ...letterhead, name }
}

/**
 * Changes a letterhead; sheets that were issued keep theirs.
 *
 * @throws NotFoundError; ConflictError with the present one where somebody changed it meanwhile;
 * OutOfRangeError for a logo that cannot be read.
 */
export async function changeLetterhead(
  { db, now }: Pick<ServerParts, 'db' | 'now'>,
  author: Author & { readonly accountId: string },
  { organisationId, ...wanted }: LetterheadRecord & { readonly organisationId: string },
): Promise<LetterheadRecord> {
  const { version, name, address, disclaimer } = wanted
  assertVersion(db, organisationId, version)
  const logo = await preparedLogo(wanted.logo)
  return db.transaction((tx) => {
    assertVersion(tx, organisationId, version)
    writeLetterhead(tx, {
      ...{ organisationId, name, address, disclaimer, logo, version: version + 1 },
      ...{ updatedAt: now(), updatedBy: author.accountId },
    })
    recordAudit(tx, author, now(), {
      action: 'organisation.letterhead-changed',
      ...{ subjectType: 'organisation', subjectId: organisationId },
      subjectName: findOrganisation(tx, organisationId)!.name,
    })
    return readLetterhead(tx, organisationId)
  })
}

function assertVersion(db: Db, organisationId: string, madeOn: number): void {
  const current = readLetterhead(db, organisationId)
  if (current.version === madeOn) return
  throw new ConflictError(
    `The letterhead was changed meanwhile: version ${current.version} is there, yours was made on ${madeOn}.`,
    current,
  )
}

/** Written anew, so that what stands on a sheet is a picture and nothing else. */
async function preparedLogo(logo: Letterhead['logo']): Promise<Letterhead['logo']> {
  if (logo === null) return null
  const { mediaType, base64 } = logo
  const prepared = await prepareImage(Buffer.from(base64, 'base64'), mediaType)
  if (prepared) return { mediaType, base64: prepared.bytes.toString('base64') }
  const allowed = 'a PNG or JPEG picture that can be read'
  const message = `logo: this file is not allowed; it must be ${allowed}`
  throw new OutOfRangeError([{ path: 'logo', value: mediaType, allowed, unit: '–', message }])
}
