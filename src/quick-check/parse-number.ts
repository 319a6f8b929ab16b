/** What a person typed: a number, nothing, or something that is not a number. */
export type Parsed =
  | { readonly is: 'number'; readonly value: number }
  | { readonly is: 'empty' }
  | { readonly is: 'text' }

const NUMBER = /^[+-]?(\d+([.,]\d*)?|[.,]\d+)(e[+-]?\d+)?$/i

/**
 * Reads a typed number. A decimal comma and a typographic minus are accepted; digits grouped by
 * thousands are not, because "1,234" could mean either. A figure beyond what a computer can hold
 * (1e309) is a number out of every range, never a silent infinity.
 */
export function parseNumber(typed: string): Parsed {
  const text = typed.trim().replace(/[−–]/g, '-')
  if (text === '') return { is: 'empty' }
  if (!NUMBER.test(text)) return { is: 'text' }
  return { is: 'number', value: Number(text.replace(',', '.')) }
}
