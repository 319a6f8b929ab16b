import { extname } from 'node:path'

/** What a project takes in, by what the bytes are; the name decides only between two kinds of text. */
export const MEDIA_TYPES = {
  'image/jpeg': '.jpg',
  'image/png': '.png',
  'image/webp': '.webp',
  'application/pdf': '.pdf',
  'text/csv': '.csv',
  'text/plain': '.txt',
} as const

export type MediaType = keyof typeof MEDIA_TYPES

/** In words, for whoever sent something else. */
export const ALLOWED_FILES = 'a JPEG, PNG, WebP or PDF file, or CSV or plain text in UTF-8'

const latin = (bytes: Uint8Array, from: number, to: number): string =>
  Buffer.from(bytes.subarray(from, to)).toString('latin1')

/** Type of a file by its content; null for what a project does not take in. */
export function detectMediaType(bytes: Uint8Array, name: string): MediaType | null {
  if (latin(bytes, 0, 3) === '\xff\xd8\xff') return 'image/jpeg'
  if (latin(bytes, 0, 8) === '\x89PNG\r\n\x1a\n') return 'image/png'
  if (latin(bytes, 0, 4) === 'RIFF' && latin(bytes, 8, 12) === 'WEBP') return 'image/webp'
  if (latin(bytes, 0, 5) === '%PDF-') return 'application/pdf'
  if (!isPlainText(bytes)) return null
  return extname(name).toLowerCase() === '.csv' ? 'text/csv' : 'text/plain'
}

export function isImage(type: string): boolean {
  return type.startsWith('image/')
}

function isPlainText(bytes: Uint8Array): boolean {
  if (bytes.length === 0) return false
  const isControl = (byte: number) =>
    (byte < 0x20 && byte !== 0x09 && byte !== 0x0a && byte !== 0x0d) || byte === 0x7f
  return !bytes.some(isControl) && isUtf8(bytes)
}

function isUtf8(bytes: Uint8Array): boolean {
  try {
    new TextDecoder('utf-8', { fatal: true }).decode(bytes)
    return true
  } catch {
    return false
  }
}

/** A name under which a file may be saved: its ending says what it is. */
export function nameForType(name: string, type: string): string {
  const ending = MEDIA_TYPES[type as MediaType]
  const given = extname(name).toLowerCase()
  const fits = given === ending || (type === 'image/jpeg' && given === '.jpeg')
  return fits ? name : `${name}${ending}`
}
