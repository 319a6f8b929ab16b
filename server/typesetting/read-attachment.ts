import { inflateSync } from 'node:zlib'

/** An embedded file with its dictionary: length and filter stand in it, the bytes follow. */
const EMBEDDED = /<<(?:(?!>>\s*stream)[\s\S])*?\/Type\s*\/EmbeddedFile[\s\S]*?>>\s*stream\r?\n/g

/**
 * Text of the first file inside a PDF that this program wrote; null where there is none. A PDF that
 * another program has merged or saved again may keep its files in another form.
 */
export function readAttachment(pdf: Buffer): string | null {
  const text = pdf.toString('latin1')
  for (const { 0: dictionary, index } of text.matchAll(EMBEDDED)) {
    const length = Number(/\/Length\s+(\d+)/.exec(dictionary)?.[1] ?? 0)
    const from = index + dictionary.length
    const bytes = pdf.subarray(from, from + length)
    const isDeflated = dictionary.includes('/FlateDecode')
    try {
      return (isDeflated ? inflateSync(bytes) : bytes).toString('utf8')
    } catch {
      return null
    }
  }
  return null
}
