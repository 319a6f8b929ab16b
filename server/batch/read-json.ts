import { InvalidJsonError } from '../errors'

/** A string of JSON, or a bare word that JSON does not have. */
const STRING_OR_BARE_NUMBER = /"(?:[^"\\]|\\.)*"|-?\b(?:NaN|Infinity)\b/g

/** Stands for NaN between reading and reviving; no key of ours can be taken for it. */
const NAN_MARK = '\u0000NaN'

/**
 * Reads JSON. The words NaN and Infinity, which JSON does not have, are read as those numbers, so
 * that the schema refuses them and can name the field; everything else that is not JSON is refused.
 *
 * @throws InvalidJsonError that quotes the first fault.
 */
export function readJson(text: string): unknown {
  const body = text.replace(/^\uFEFF/, '')
  if (body.trim() === '') throw new InvalidJsonError('it is empty')
  try {
    return JSON.parse(body)
  } catch (error) {
    // The message quotes the text, line breaks and all; a fault is one line.
    const reason = String(error instanceof Error ? error.message : error).replace(/\s+/g, ' ')
    return readBareNumbers(body, reason)
  }
}

function readBareNumbers(body: string, reason: string): unknown {
  const readable = body.replace(STRING_OR_BARE_NUMBER, (token) => {
    if (token.startsWith('"')) return token
    if (token.endsWith('NaN')) return JSON.stringify(NAN_MARK)
    return token.startsWith('-') ? '-1e999' : '1e999'
  })
  try {
    return JSON.parse(readable, (_key, value: unknown) => (value === NAN_MARK ? NaN : value))
  } catch {
    throw new InvalidJsonError(reason)
  }
}
