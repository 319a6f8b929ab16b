import { healthSchema } from '../../../shared/schemas/health'
import type { Db } from '../../db/client'
import { defineOperation, type Operation } from '../../http/operation'
import { type Identity, readHealth } from './health.service'

export function healthOperations(db: Db, identity: Identity): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/health',
      id: 'readHealth',
      summary: 'Whether the server can do its work, its version and its mode',
      rule: 'open',
      response: healthSchema,
      problems: ['unavailable'],
      handle: () => readHealth(db, identity),
    }),
  ]
}
