import { presentCase, type PresentCase } from '@shared/drawing/chart/present-case'
import { readAddress } from '@/quick-check/address'
import { sectionCase } from '@/quick-check/case-input'
import { fieldFaults } from '@/quick-check/field-faults'

/** Where the case of the design chart comes from. */
export interface MarkedCase {
  readonly origin: 'address' | 'default' | 'refused'
  readonly present: PresentCase | null
}

/**
 * The case that the address of the page carries, with the keys of the Quick check; without one, the
 * case with which the Quick check opens.
 */
export function markedCase(search: string): MarkedCase {
  const content = readAddress(search)
  const isRefused =
    Object.keys(content.refused).length > 0 ||
    content.problems.length > 0 ||
    fieldFaults(content, 'section').length > 0
  if (isRefused) return { origin: 'refused', present: null }
  const origin = search === '' ? 'default' : 'address'
  return { origin, present: presentCase(sectionCase(content)) }
}
