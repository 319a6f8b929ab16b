import sharp, { type Sharp } from 'sharp'

export interface PreparedImage {
  readonly bytes: Buffer
  readonly width: number
  readonly height: number
  /** A small WebP picture. */
  readonly preview: Buffer
}

/** A photograph of 64 megapixels is 190 MB in memory. */
export const MOST_PIXELS = 64_000_000

/** Longest side of a preview [pixel]. */
const PREVIEW_SIDE = 640

/** Keeps every size below what a phone writes, and faults of a camera to itself. */
const READING = { limitInputPixels: MOST_PIXELS, failOn: 'error' } as const

/**
 * A picture written anew: upright, and without position, camera, comments or whatever else stood in
 * the file. Null where it cannot be read, or has too many pixels.
 */
export async function prepareImage(
  bytes: Uint8Array,
  type: 'image/jpeg' | 'image/png' | 'image/webp',
): Promise<PreparedImage | null> {
  try {
    const upright = sharp(bytes, READING).autoOrient().keepIccProfile()
    const { data, info } = await encoded(upright, type).toBuffer({ resolveWithObject: true })
    const preview = await sharp(data, READING)
      .resize(PREVIEW_SIDE, PREVIEW_SIDE, { fit: 'inside', withoutEnlargement: true })
      .webp({ quality: 78 })
      .toBuffer()
    return { bytes: data, width: info.width, height: info.height, preview }
  } catch {
    return null
  }
}

function encoded(picture: Sharp, type: 'image/jpeg' | 'image/png' | 'image/webp') {
  if (type === 'image/jpeg') return picture.jpeg({ quality: 88 })
  return type === 'image/png' ? picture.png() : picture.webp({ quality: 88 })
}

/** Longest side of a photograph in print, 8 cm wide at 400 dpi [pixel]. */
const PRINT_SIDE = 1280

/** A photograph as JPEG, as large as print needs it; null where it cannot be read. */
export async function printImage(bytes: Uint8Array): Promise<Buffer | null> {
  try {
    return await sharp(bytes, READING)
      .autoOrient()
      .resize(PRINT_SIDE, PRINT_SIDE, { fit: 'inside', withoutEnlargement: true })
      .flatten({ background: '#ffffff' })
      .jpeg({ quality: 82 })
      .toBuffer()
  } catch {
    return null
  }
}
