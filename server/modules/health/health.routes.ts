import { Router } from 'express'
import { healthSchema } from '../../../shared/schemas/health'
import type { Db } from '../../db/client'
import { allowOnly, type ApiModule } from '../../http/api-module'
import { type Identity, readHealth } from './health.service'

const PATH = '/api/health'

export function healthModule(db: Db, identity: Identity): ApiModule {
  const router = Router()
  router
    .route(PATH)
    .get((_req, res) => {
      res.json(readHealth(db, identity))
    })
    .all(allowOnly('GET', 'HEAD'))

  return {
    router,
    operations: [
      {
        method: 'get',
        path: PATH,
        id: 'readHealth',
        summary: 'Whether the server can do its work, its version and its mode',
        response: healthSchema,
        problems: ['method-not-allowed', 'unavailable'],
      },
    ],
  }
}
