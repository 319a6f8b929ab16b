/** Encodings in which a survey may arrive. */
export type Encoding = 'utf-8' | 'utf-16le' | 'utf-16be' | 'windows-1252'

export interface DecodedText {
  readonly text: string
  readonly encoding: Encoding
}

/** Largest survey file; one of 5000 stations has a tenth of it. */
export const MOST_BYTES = 5_000_000

/** Why the bytes are no survey. */
export type FileFault = 'empty' | 'too-large' | 'binary' | 'pdf' | 'spreadsheet'

/** Share of zero bytes in one half of a text in two bytes that is written in plain letters. */
const MANY = 0.3

/**
 * Text of a file: UTF-8 or UTF-16, with or without a byte order mark, else Western European of
 * Windows; a file that is no text says what it is.
 */
export function decodeText(bytes: Uint8Array): DecodedText | FileFault {
  if (bytes.length > MOST_BYTES) return 'too-large'
  if (bytes.length === 0) return 'empty'
  const known = knownKind(bytes)
  if (known) return known
  const encoding = encodingOf(bytes)
  const decoded = decodeAs(bytes, encoding)
  if (decoded === null) return 'binary'
  return decoded.text.trim() === '' ? 'empty' : decoded
}

function knownKind(bytes: Uint8Array): FileFault | null {
  const start = String.fromCharCode(...bytes.subarray(0, 4))
  if (start.startsWith('%PDF')) return 'pdf'
  // A workbook is a ZIP archive, or a compound file in older programs.
  if (start.startsWith('PK\u0003\u0004') || start.startsWith('\u00d0\u00cf\u0011\u00e0')) {
    return 'spreadsheet'
  }
  return null
}

function encodingOf(bytes: Uint8Array): Encoding {
  const [a, b] = bytes
  if (a === 0xff && b === 0xfe) return 'utf-16le'
  if (a === 0xfe && b === 0xff) return 'utf-16be'
  const sample = bytes.subarray(0, 2000)
  const zeros = [0, 0]
  sample.forEach((byte, i) => (byte === 0 ? (zeros[i % 2]! += 1) : undefined))
  const half = sample.length / 2
  if (zeros[1]! > MANY * half && zeros[0]! < zeros[1]! / 4) return 'utf-16le'
  if (zeros[0]! > MANY * half && zeros[1]! < zeros[0]! / 4) return 'utf-16be'
  return 'utf-8'
}

function decodeAs(bytes: Uint8Array, encoding: Encoding): DecodedText | null {
  try {
    const text = new TextDecoder(encoding, { fatal: true }).decode(bytes)
    return hasControls(text) ? null : { text, encoding }
  } catch {
    return encoding === 'utf-8' ? westernText(bytes) : null
  }
}

function westernText(bytes: Uint8Array): DecodedText | null {
  const text = new TextDecoder('windows-1252').decode(bytes)
  return hasControls(text) ? null : { text, encoding: 'windows-1252' }
}

/** Control characters stand in no table. */
function hasControls(text: string): boolean {
  for (let i = 0; i < text.length; i += 1) {
    const code = text.charCodeAt(i)
    const isSpace = code === 0x09 || code === 0x0a || code === 0x0c || code === 0x0d
    if ((code < 0x20 && !isSpace) || code === 0xfffd) return true
  }
  return false
}
