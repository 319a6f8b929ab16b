import type { SectionCase } from '@shared/schemas/section-case'

/** True where two cases differ in nothing but the depth of the water: then what they hold to is the same. */
export function isSameButDepth(a: SectionCase, b: SectionCase): boolean {
  return isSame(
    { ...a, water: { ...a.water, depth: 0 } },
    { ...b, water: { ...b.water, depth: 0 } },
  )
}

function isSame(a: object, b: object): boolean {
  return Object.entries(a).every(([key, value]: [string, unknown]) => {
    const other: unknown = (b as Record<string, unknown>)[key]
    return typeof value === 'object' &&
      value !== null &&
      typeof other === 'object' &&
      other !== null
      ? isSame(value, other)
      : Object.is(value, other)
  })
}
