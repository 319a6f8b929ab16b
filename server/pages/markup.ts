/** Markup that is safe to send: made by `markup`, its values escaped. */
export class Markup {
  constructor(private readonly text: string) {}

  toString(): string {
    return this.text
  }
}

type Value = Markup | string | number | readonly Markup[]

/**
 * HTML from a template: every value that is not itself markup is escaped, in text and in quoted
 * attributes alike.
 */
export function markup(parts: TemplateStringsArray, ...values: readonly Value[]): Markup {
  const text = parts.reduce((all, part, i) => all + shown(values[i - 1]!) + part)
  return new Markup(text)
}

/** Nothing at all. */
export const NOTHING = new Markup('')

function shown(value: Value): string {
  if (value instanceof Markup) return value.toString()
  if (typeof value === 'object') return value.map((one) => one.toString()).join('')
  return escaped(String(value))
}

function escaped(text: string): string {
  return text
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')
    .replaceAll("'", '&#39;')
}
