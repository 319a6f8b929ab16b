/** 32 signs: of those that look alike, only one of each. */
export const CODE_SIGNS = '0123456789ABCDEFGHJKMNPQRSTVWXYZ'

/** Signs of a code; with 32 signs to choose from these are 60 bits. */
export const CODE_LENGTH = 12

const GROUP = 4

/** What people read for signs that are not in the list. */
const READ_AS: Readonly<Record<string, string>> = { O: '0', I: '1', L: '1' }

/** A code in groups of four: `7Q4K-19XM-3TRP`. */
export function codeFrom(bytes: Uint8Array): string {
  if (bytes.length !== CODE_LENGTH) throw new RangeError(`a code takes ${CODE_LENGTH} bytes`)
  return grouped([...bytes].map((byte) => CODE_SIGNS[byte % CODE_SIGNS.length]).join(''))
}

/** The code that somebody typed, whatever its case, blanks and dashes; null: it cannot be one. */
export function readCode(typed: string): string | null {
  const signs = typed
    .toUpperCase()
    .replace(/[\s\-–—]/g, '')
    .replace(/[OIL]/g, (sign) => READ_AS[sign]!)
  const isCode = signs.length === CODE_LENGTH && [...signs].every((s) => CODE_SIGNS.includes(s))
  return isCode ? grouped(signs) : null
}

function grouped(signs: string): string {
  return signs.replace(new RegExp(`(.{${GROUP}})(?=.)`, 'g'), '$1-')
}
