import { letterheadRecordSchema } from '../../../shared/schemas/letterhead'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ServerParts } from '../../parts'
import { changeLetterhead, readLetterhead } from './letterheads.service'

const PATH = '/api/admin/organisations/:organisationId/letterhead'

export function letterheadsOperations(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'readLetterhead',
      summary: 'What the sheets of an organisation bear at their head',
      rule: 'administer',
      response: letterheadRecordSchema,
      problems: ['not-found'],
      handle: ({ req }) => readLetterhead(parts.db, pathPart(req, 'organisationId')),
    }),
    defineOperation({
      method: 'put',
      path: PATH,
      id: 'changeLetterhead',
      summary: 'Change a letterhead; sheets that were issued keep theirs',
      rule: 'administer',
      request: letterheadRecordSchema,
      response: letterheadRecordSchema,
      problems: ['not-found', 'conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeLetterhead(parts, actor, {
          organisationId: pathPart(req, 'organisationId'),
          ...parseBody(letterheadRecordSchema, req),
        }),
    }),
  ]
}
