/** Signs of a class code: none looks like another, and no vowel makes a word of it. */
export const CLASS_SIGNS = 'CDFGHJKMNPQRTWXY34679'

/** Signs of a code; with 21 signs to choose from these are 26 bits, for four hours. */
export const CLASS_CODE_LENGTH = 6

/** A byte from here on would favour the first signs, so it is not used. */
const FAIR = 256 - (256 % CLASS_SIGNS.length)

/**
 * A code from random bytes; null where too few of them are fair.
 *
 * @param bytes Random bytes, more than six: one in 64 is left out.
 */
export function classCodeFrom(bytes: Uint8Array): string | null {
  const fair = [...bytes].filter((byte) => byte < FAIR).slice(0, CLASS_CODE_LENGTH)
  if (fair.length < CLASS_CODE_LENGTH) return null
  return fair.map((byte) => CLASS_SIGNS[byte % CLASS_SIGNS.length]).join('')
}

/** The code that somebody typed, whatever its case, blanks and dashes; null: it cannot be one. */
export function readClassCode(typed: string): string | null {
  const signs = typed.toUpperCase().replace(/[\s\-–—]/g, '')
  const isCode =
    signs.length === CLASS_CODE_LENGTH && [...signs].every((s) => CLASS_SIGNS.includes(s))
  return isCode ? signs : null
}

/** As it is read out: "C7K 4MN". */
export function spacedCode(code: string): string {
  const half = CLASS_CODE_LENGTH / 2
  return `${code.slice(0, half)} ${code.slice(half)}`
}
