import type { Catalogue } from '../../../shared/schemas/catalogue'
import type { Db } from '../../db/client'
import { listBarriers, listCheckBases, listGrounds } from './catalogue.queries'

/** The whole catalogue: it is small, and a page needs all of it at once. */
export function readCatalogue(db: Db): Catalogue {
  return { barriers: listBarriers(db), grounds: listGrounds(db), bases: listCheckBases(db) }
}
