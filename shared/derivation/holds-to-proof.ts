import { evaluateSection } from '../checks/evaluate-section'
import { holdingProfile } from '../checks/holds-to'
import type { SectionCase } from '../schemas/section-case'

/** Right sides of the lines that a search over all checks gives. */
export const LARGEST_HOLDING = 'largest(h, u(h) <= 1)'
export const SMALLEST_HOLDING = 'smallest(h, u(h) <= 1)'

/** True for a formula that stands for a search over all checks. */
export function isSearch(formula: string): boolean {
  return formula === LARGEST_HOLDING || formula === SMALLEST_HOLDING
}

/** The search ends when it has the edge to 1e-7 m; a little beyond it the section must fail. */
const BEYOND = 1.05e-7

/** Below this depth the width of the search is more than a millionth: the search is made again [m]. */
const SHALLOW = 0.15

/** How far the utilisation at the edge may be from 1, unless the resistance ends there. */
const UTILISATION_BOUND = 1e-3

interface Scanned {
  readonly section: SectionCase
  readonly gripShare: number
}

function at({ section, gripShare }: Scanned, depth: number) {
  const water = { ...section.water, depth }
  const evaluation = evaluateSection({ ...section, water }, gripShare)
  const governing = evaluation[evaluation.governs]
  return { holds: evaluation.verdict !== 'fails', used: governing?.utilisation ?? null }
}

/**
 * Substitutes a depth into all checks: at it they are met, 0.1 µm beyond it one is not, and the one
 * that governs is used 1 ± 1e-3 there, or has no resistance left beyond.
 *
 * @param depth Depth of water [m].
 * @param towards 1: the upper end of what holds; −1: the lower end.
 * @returns null where it agrees, else what does not.
 */
export function holdsToFault(scanned: Scanned, depth: number, towards: 1 | -1): string | null {
  const here = at(scanned, depth)
  const beyond = at(scanned, depth + towards * BEYOND)
  if (!here.holds) return 'the checks are not met at this depth'
  if (beyond.holds) return 'the checks are still met beyond this depth'
  if (depth < SHALLOW && !isFound(scanned, depth)) return 'a search does not find this depth'
  const isContinuous = here.used !== null && Math.abs(here.used - 1) <= UTILISATION_BOUND
  if (isContinuous || beyond.used === null || beyond.used > 1 + UTILISATION_BOUND) return null
  return 'the utilisation at this depth is not 1'
}

/** The search over all depths, made again, ends at this depth. */
function isFound({ section, gripShare }: Scanned, depth: number): boolean {
  const { intervals } = holdingProfile(section, gripShare)
  return intervals.some(({ from, to }) =>
    [from, to].some((edge) => Math.abs(edge - depth) <= 1e-9 * edge),
  )
}
