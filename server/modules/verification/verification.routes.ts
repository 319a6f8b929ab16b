import {
  verifiedFileSchema,
  verifiedSheetSchema,
  verifyUploadSchema,
} from '../../../shared/schemas/verification'
import { receiveFile } from '../../files/receive-file'
import { defineOperation, type Operation } from '../../http/operation'
import { pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import { sendFile } from '../files/send-file'
import { pageOf } from '../sheets/sheet-files.service'
import type { SheetWork } from '../sheets/sheet-work'
import { sheetOfCode, verified, verifyFile } from './verification.service'

/** Open to anybody who holds a sheet. */
export function verificationOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/verify/:code',
      id: 'verifySheet',
      summary: 'Is this the sheet that was issued, and is it current?',
      rule: 'open',
      response: verifiedSheetSchema,
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req }) =>
        verified(work.db, sheetOfCode(work, pathPart(req, 'code'), senderOf(req))),
    }),
    defineOperation({
      method: 'get',
      path: '/api/verify/:code/pages/:page',
      id: 'readVerifiedPage',
      summary: 'A page of an issued sheet as a picture',
      rule: 'open',
      mediaType: 'image/png',
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req, res }) => {
        const row = sheetOfCode(work, pathPart(req, 'code'), senderOf(req))
        const page = Number(pathPart(req, 'page'))
        const { fileId: id, sha256: checksum } = pageOf(work.db, row, page)
        const common = { mediaType: 'image/png', variant: 'original', shown: 'inline' } as const
        return sendFile(res, work.store, { id, name: `page-${page}`, checksum, ...common })
      },
    }),
    defineOperation({
      method: 'post',
      path: '/api/verify',
      id: 'verifyFile',
      summary: 'Is this file the one that was issued?',
      rule: 'open',
      request: verifyUploadSchema,
      requestMediaType: 'multipart/form-data',
      response: verifiedFileSchema,
      problems: ['out-of-range', 'too-large', 'unsupported-media-type', 'too-many-requests'],
      handle: async ({ req, res }) => {
        const { bytes } = await receiveFile(req, res)
        return verifyFile(work, bytes, senderOf(req))
      },
    }),
  ]
}
