import { auditPageSchema, auditQuerySchema } from '../../../shared/schemas/account'
import type { Db } from '../../db/client'
import { defineOperation, type Operation } from '../../http/operation'
import { parseQuery } from '../../http/parse-input'
import { auditCsv, pageOfAudit } from './audit.service'

const csvQuerySchema = auditQuerySchema.omit({ page: true })

export function auditOperations({ db }: { readonly db: Db }): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/admin/audit',
      id: 'readAudit',
      summary: 'The audit trail, the newest first: who, what, when, from which version to which',
      rule: 'administer',
      query: auditQuerySchema,
      response: auditPageSchema,
      problems: [],
      handle: ({ req }) => pageOfAudit(db, parseQuery(auditQuerySchema, req)),
    }),
    defineOperation({
      method: 'get',
      path: '/api/admin/audit.csv',
      id: 'readAuditCsv',
      summary: 'The same as CSV, without pages',
      rule: 'administer',
      query: csvQuerySchema,
      mediaType: 'text/csv',
      problems: [],
      handle: ({ req, res }) => {
        const csv = auditCsv(db, parseQuery(csvQuerySchema, req))
        res.attachment('audit.csv').type('text/csv').send(csv)
      },
    }),
  ]
}
