import { formatQuantity, type Quantity, type UnitSystem } from '../units'

/** What a text may be filled with: words, a count, or a quantity that gets its unit on display. */
export type TextValue = string | number | Quantity

export type TextValues = Readonly<Record<string, TextValue>>

/** A message that a scene or a model carries: resolved into words only where it is shown. */
export interface Message {
  readonly key: string
  readonly values?: TextValues
}

/** Turns a message into words. Page, SVG file and PDF each bring their own. */
export type ResolveText = (message: Message) => string

/** Values as words in the chosen unit system. */
export function showValues(values: TextValues, system: UnitSystem): Record<string, string> {
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => [
      name,
      typeof value === 'object' ? formatQuantity(value, system) : String(value),
    ]),
  )
}

/** A resolver without a framework, for SVG files, PDFs and plain text; `{name}` is filled in. */
export function textResolver(texts: object, system: UnitSystem): ResolveText {
  const found = new Map<string, string>()
  const templateOf = (key: string): string => {
    const template = found.get(key) ?? lookUp(texts, key)
    // Areas add their texts later: what is not there yet is looked for again.
    if (template !== key) found.set(key, template)
    return template
  }
  return ({ key, values }) => {
    const template = templateOf(key)
    if (!values) return template
    const shown = showValues(values, system)
    return template.replace(/\{(\w+)\}/g, (placeholder, name: string) => shown[name] ?? placeholder)
  }
}

function lookUp(texts: object, key: string): string {
  let node: unknown = texts
  for (const part of key.split('.')) node = (node as Record<string, unknown> | undefined)?.[part]
  return typeof node === 'string' ? node : key
}
