import type { Request } from 'express'
import {
  fileChangeSchema,
  fileUploadSchema,
  projectFileSchema,
  projectFilesSchema,
} from '../../../shared/schemas/project'
import { NotFoundError } from '../../errors'
import { isImage } from '../../files/media-type'
import { receiveFile } from '../../files/receive-file'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseInput, pathPart } from '../../http/parse-input'
import { findChecksum } from './files.queries'
import {
  addFile,
  changeFile,
  type FileWork,
  readFile,
  readFiles,
  removeFile,
} from './files.service'
import { sendFile } from './send-file'

const PATH = '/api/projects/:projectId/files'
const ONE = `${PATH}/:fileId`

const CAPTION = fileUploadSchema.pick({ caption: true })

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  fileId: pathPart(req, 'fileId'),
})

export function filesOperations(work: FileWork): readonly Operation[] {
  return [...listOperations(work), ...oneOperations(work), ...bytesOperations(work)]
}

function listOperations(work: FileWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listFiles',
      summary: 'Photographs and documents of a project',
      rule: 'read-project',
      response: projectFilesSchema,
      problems: [],
      handle: ({ req }) => readFiles(work.db, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'addFile',
      summary: 'Add a photograph or a document; pictures lose their position data',
      rule: 'edit-project',
      request: fileUploadSchema,
      requestMediaType: 'multipart/form-data',
      response: projectFileSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: async ({ req, res, actor }) => {
        const file = await receiveFile(req, res)
        const { caption } = parseInput(CAPTION, { caption: file.caption })
        return addFile(work, actor, pathPart(req, 'projectId'), { ...file, caption })
      },
    }),
  ]
}

function oneOperations(work: FileWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'patch',
      path: ONE,
      id: 'changeFile',
      summary: 'Rename a file, or write its caption',
      rule: 'edit-project',
      request: fileChangeSchema,
      response: projectFileSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        changeFile(work, actor, placeOf(req), parseBody(fileChangeSchema, req)),
    }),
    defineOperation({
      method: 'delete',
      path: ONE,
      id: 'removeFile',
      summary: 'Delete a file, its row and its bytes',
      rule: 'edit-project',
      problems: ['conflict'],
      handle: ({ req, actor }) => removeFile(work, actor, placeOf(req)),
    }),
  ]
}

function bytesOperations({ db, store }: FileWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: `${ONE}/content`,
      id: 'readFileContent',
      summary: 'The file itself, to save; pictures may be shown',
      rule: 'read-project',
      mediaType: 'application/octet-stream',
      problems: [],
      handle: ({ req, res }) => {
        const { id, name, mediaType } = readFile(db, placeOf(req))
        const shown = isImage(mediaType) ? 'inline' : 'attachment'
        const checksum = findChecksum(db, id) ?? ''
        return sendFile(res, store, { id, name, mediaType, shown, checksum, variant: 'original' })
      },
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/preview`,
      id: 'readFilePreview',
      summary: 'A small picture of a photograph, or a PDF file to look at',
      rule: 'read-project',
      mediaType: 'application/octet-stream',
      problems: [],
      handle: ({ req, res }) => {
        const { id, name, mediaType } = readFile(db, placeOf(req))
        const checksum = findChecksum(db, id) ?? ''
        const common = { id, name, checksum, shown: 'inline' } as const
        if (isImage(mediaType)) {
          return sendFile(res, store, { ...common, mediaType: 'image/webp', variant: 'preview' })
        }
        if (mediaType === 'application/pdf') {
          return sendFile(res, store, { ...common, mediaType, variant: 'original' })
        }
        throw new NotFoundError(`file: "${name}" has no preview`)
      },
    }),
  ]
}
