import { BARRIERS, type CatalogueBarrier } from '@shared/catalogue/barriers'
import type { FieldId } from './fields'

/** Fields that a tube of the catalogue fills in. */
export const TUBE_FIELDS = [
  'diameter',
  'skirtLength',
  'contactWidth',
  'mass',
  'airPressure',
  'sectionLength',
  'fabricStrength',
  'statedHeight',
] as const satisfies readonly (FieldId & keyof CatalogueBarrier)[]

/** The tube of the catalogue whose figures these are; null as soon as one of them is the user's own. */
export function matchingTube(
  valueOf: (id: FieldId) => number | null | undefined,
): CatalogueBarrier | null {
  return BARRIERS.find((barrier) => TUBE_FIELDS.every((id) => valueOf(id) === barrier[id])) ?? null
}

/** The smallest tube of the catalogue that is larger than this one. */
export function nextTube(diameter: number): CatalogueBarrier | null {
  return BARRIERS.find((barrier) => barrier.diameter > diameter) ?? null
}
