/**
 * A value as JSON in one form only: names of fields in order of their code units, no blanks, figures
 * in the shortest form. Equal values give equal texts, whoever writes them.
 *
 * @throws TypeError for what JSON does not hold: functions, NaN, infinities.
 * @see RFC 8785, JSON Canonicalization Scheme.
 */
export function canonicalJson(value: unknown): string {
  if (value === null || typeof value === 'string' || typeof value === 'boolean') {
    return JSON.stringify(value)
  }
  if (typeof value === 'number') {
    if (!Number.isFinite(value)) throw new TypeError(`${value} has no form in JSON`)
    return JSON.stringify(value)
  }
  if (Array.isArray(value)) return `[${value.map(canonicalJson).join(',')}]`
  if (typeof value !== 'object') throw new TypeError(`${typeof value} has no form in JSON`)
  const fields = Object.entries(value)
    .filter(([, inner]) => inner !== undefined)
    .sort(([a], [b]) => (a < b ? -1 : 1))
    .map(([name, inner]) => `${JSON.stringify(name)}:${canonicalJson(inner)}`)
  return `{${fields.join(',')}}`
}
