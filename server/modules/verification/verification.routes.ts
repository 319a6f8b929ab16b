import {
  verifiedFileSchema,
  verifiedSheetSchema,
  verifyUploadSchema,
} from '../../../shared/schemas/verification'
import { receiveFile } from '../../files/receive-file'
import { defineOperation, type Operation } from '../../http/operation'
import { pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import type { SheetWork } from '../sheets/sheet-work'
import { pictureOfPage, sheetOfCode, verified, verifyFile } from './verification.service'

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
      handle: async ({ req, res }) => {
        const row = sheetOfCode(work, pathPart(req, 'code'), senderOf(req))
        const picture = await pictureOfPage(work, row, pathPart(req, 'page'))
        res.set({ 'Content-Type': 'image/png', 'Cache-Control': 'private, max-age=3600' })
        res.send(picture)
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
