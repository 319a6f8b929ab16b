import type { Request, Response } from 'express'
import multer from 'multer'
import { InvalidInputError } from '../../shared/errors'
import { TooLargeError, UnsupportedMediaTypeError } from '../http/http-errors'

export interface ReceivedFile {
  /** Name on the machine that it came from, without its folders. */
  readonly name: string
  readonly caption: string
  readonly bytes: Buffer
}

/** 15 MB: a photograph of a phone, or a report. */
export const LARGEST_FILE = 15_000_000

export const FILE_FIELD = 'file'

const upload = multer({
  storage: multer.memoryStorage(),
  limits: { fileSize: LARGEST_FILE, files: 1, fields: 2, parts: 4, fieldSize: 2000 },
  defParamCharset: 'utf8',
}).single(FILE_FIELD)

/**
 * The one file of a form.
 *
 * @throws UnsupportedMediaTypeError, TooLargeError or InvalidInputError
 */
export async function receiveFile(req: Request, res: Response): Promise<ReceivedFile> {
  if (!req.is('multipart/form-data')) {
    throw new UnsupportedMediaTypeError('content-type: it must be multipart/form-data')
  }
  await new Promise<void>((resolve, reject) => {
    void upload(req, res, (error: unknown) => {
      if (error) reject(refusalOf(error))
      else resolve()
    })
  })
  const { file } = req
  if (!file) throw refused(FILE_FIELD, 'nothing', 'one file')
  const caption = (req.body as Record<string, unknown> | undefined)?.caption
  return {
    name: plainName(file.originalname),
    caption: typeof caption === 'string' ? caption : '',
    bytes: file.buffer,
  }
}

function refusalOf(error: unknown): Error {
  if (!(error instanceof multer.MulterError)) {
    return refused('body', 'a broken form', 'a whole multipart form')
  }
  if (error.code === 'LIMIT_FILE_SIZE') {
    return new TooLargeError(`file: it is larger than ${LARGEST_FILE / 1_000_000} MB.`)
  }
  return refused(error.field ?? 'body', error.code, `one file in "${FILE_FIELD}", and its caption`)
}

function refused(path: string, value: string, allowed: string): InvalidInputError {
  const message = `${path}: ${value} is not allowed; it must be ${allowed}`
  return new InvalidInputError([{ path, value, allowed, unit: '–', message }])
}

/** Control signs, and signs that turn the direction of a text and disguise an ending. */
const UNSEEN = /[\p{Cc}\p{Cf}]/gu

const LONGEST_NAME = 120

function plainName(original: string): string {
  const last = original.split(/[\\/]/).at(-1) ?? ''
  const name = last.replace(UNSEEN, '').trim().slice(-LONGEST_NAME)
  return /^\.*$/.test(name) ? 'file' : name
}
