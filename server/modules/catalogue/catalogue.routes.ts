import { catalogueSchema } from '../../../shared/schemas/catalogue'
import type { Db } from '../../db/client'
import { defineOperation, type Operation } from '../../http/operation'
import { readCatalogue } from './catalogue.service'

export function catalogueOperations(db: Db): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/catalogue',
      id: 'readCatalogue',
      summary: 'Barriers, grounds and check bases, each with its source and revision',
      rule: 'open',
      response: catalogueSchema,
      problems: [],
      handle: () => readCatalogue(db),
    }),
  ]
}
