import { Router } from 'express'
import { catalogueSchema } from '../../../shared/schemas/catalogue'
import type { Db } from '../../db/client'
import { allowOnly, type ApiModule } from '../../http/api-module'
import { readCatalogue } from './catalogue.service'

const PATH = '/api/catalogue'

export function catalogueModule(db: Db): ApiModule {
  const router = Router()
  router
    .route(PATH)
    .get((_req, res) => {
      res.json(readCatalogue(db))
    })
    .all(allowOnly('GET', 'HEAD'))

  return {
    router,
    operations: [
      {
        method: 'get',
        path: PATH,
        id: 'readCatalogue',
        summary: 'Barriers, grounds and check bases, each with its source and revision',
        response: catalogueSchema,
        problems: ['method-not-allowed'],
      },
    ],
  }
}
