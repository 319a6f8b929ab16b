import { CODE_SIGNS } from '../sheet/verification-code'

/** Signs of a token; with 32 signs to choose from these are 80 bits. */
export const TOKEN_LENGTH = 16

const GROUP = 4

/** What people read for signs that are not in the list. */
const READ_AS: Readonly<Record<string, string>> = { O: '0', I: '1', L: '1' }

/**
 * A token in groups of four: `7Q4K-19XM-3TRP-8C2D`.
 *
 * @throws RangeError for another number of bytes than `TOKEN_LENGTH`.
 */
export function tokenFrom(bytes: Uint8Array): string {
  if (bytes.length !== TOKEN_LENGTH) throw new RangeError(`a token takes ${TOKEN_LENGTH} bytes`)
  return grouped([...bytes].map((byte) => CODE_SIGNS[byte % CODE_SIGNS.length]).join(''))
}

/** The token that somebody typed, whatever its case, blanks and dashes; null: it cannot be one. */
export function readToken(typed: string): string | null {
  const signs = typed
    .toUpperCase()
    .replace(/[\s\-–—]/g, '')
    .replace(/[OIL]/g, (sign) => READ_AS[sign]!)
  const isToken = signs.length === TOKEN_LENGTH && [...signs].every((s) => CODE_SIGNS.includes(s))
  return isToken ? grouped(signs) : null
}

function grouped(signs: string): string {
  return signs.replace(new RegExp(`(.{${GROUP}})(?=.)`, 'g'), '$1-')
}
