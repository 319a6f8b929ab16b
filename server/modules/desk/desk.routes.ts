import { deskSchema } from '../../../shared/schemas/project'
import type { Db } from '../../db/client'
import { defineOperation, type Operation } from '../../http/operation'
import { readDesk } from './desk.service'

export function deskOperations(db: Db): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/desk',
      id: 'readDesk',
      summary: 'My projects, the last changed first, sheets that wait for me, and what changed',
      rule: 'signed-in',
      response: deskSchema,
      problems: [],
      handle: ({ actor }) => readDesk(db, actor),
    }),
  ]
}
