import { mailsPageSchema, mailsQuerySchema } from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseQuery, pathPart } from '../../http/parse-input'
import type { ServerParts } from '../../parts'
import { pageOfMails, readMailFile, retryMail } from './mails.service'

export function mailsOperations(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/admin/mails',
      id: 'listMails',
      summary: 'Mail on its way out, the newest first',
      rule: 'administer',
      query: mailsQuerySchema,
      response: mailsPageSchema,
      problems: [],
      handle: ({ req }) => pageOfMails(parts, parseQuery(mailsQuerySchema, req).page),
    }),
    defineOperation({
      method: 'get',
      path: '/api/admin/mails/:mailId',
      id: 'readMail',
      summary: 'A mail that was not sent, as .eml file',
      rule: 'administer',
      mediaType: 'message/rfc822',
      problems: ['not-found', 'conflict'],
      handle: async ({ req, res, actor }) => {
        const file = await readMailFile(parts, actor, pathPart(req, 'mailId'))
        res.attachment('mail.eml').type('message/rfc822').send(file)
      },
    }),
    defineOperation({
      method: 'post',
      path: '/api/admin/mails/:mailId/retry',
      id: 'retryMail',
      summary: 'Put a mail that was not sent back into the queue',
      rule: 'administer',
      problems: ['not-found', 'conflict'],
      handle: ({ req, actor }) => {
        retryMail(parts, actor, pathPart(req, 'mailId'))
      },
    }),
  ]
}
