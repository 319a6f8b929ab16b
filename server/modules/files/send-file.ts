import type { Response } from 'express'
import { NotFoundError } from '../../errors'
import type { FileStore, FileVariant } from '../../files/file-store'
import { nameForType } from '../../files/media-type'

export interface Sending {
  readonly id: string
  readonly name: string
  readonly mediaType: string
  readonly variant: FileVariant
  /** Whether a browser may show it, or only save it. */
  readonly shown: 'inline' | 'attachment'
  readonly checksum: string
}

/** Whatever stands in a file: it runs nothing, loads nothing and is no page of ours. */
const POLICY = "sandbox; default-src 'none'; img-src 'self'; style-src 'unsafe-inline'"

/**
 * Answers with the bytes of a file; whoever asks again is let in again, then spared the bytes.
 *
 * @throws NotFoundError where the bytes are gone, as after a restore without the folder of files.
 */
export async function sendFile(
  res: Response,
  store: FileStore,
  { id, name, mediaType, variant, shown, checksum }: Sending,
): Promise<void> {
  if (!(await store.holds(id, variant))) {
    res.req.log.error({ fileId: id, variant }, 'the bytes of a file are missing')
    throw new NotFoundError(`file: the bytes of "${name}" are missing on the server; add it again`)
  }
  res.attachment(nameForType(name, mediaType))
  if (shown === 'inline') {
    const header = String(res.get('Content-Disposition'))
    res.set('Content-Disposition', header.replace(/^attachment/, 'inline'))
  }
  res.set({
    'Content-Type': mediaType.startsWith('text/') ? `${mediaType}; charset=utf-8` : mediaType,
    'Content-Security-Policy': POLICY,
    'X-Content-Type-Options': 'nosniff',
    'Cache-Control': 'private, no-cache',
    ETag: `"${checksum}${variant === 'preview' ? '-preview' : ''}"`,
  })
  const options = { root: store.folder, cacheControl: false, lastModified: false }
  await new Promise<void>((resolve, reject) => {
    res.sendFile(store.nameOf(id, variant), { ...options, dotfiles: 'deny' }, (error?: Error) => {
      // Once the answer has begun, an error is a reader who went away.
      if (!error || res.headersSent) resolve()
      else reject(new Error(`The bytes of file ${id} cannot be read`, { cause: error }))
    })
  })
}
