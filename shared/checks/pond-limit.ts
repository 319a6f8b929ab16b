import type { CheckId } from '../schemas/check-ids'
import type { SectionCase } from '../schemas/section-case'
import { evaluateSection } from './evaluate-section'

/** The pond at which a section fails. */
export interface PondLimit {
  /** Highest depth on the dry side at which all checks hold [m]; null: it fails without any. */
  readonly dryDepth: number | null
  /** What fails beyond it. */
  readonly check: CheckId
}

/** Depths on the dry side that are looked at, in diameters. */
const STEP = 0.005

/** Edges are found to this width [m]. */
const EDGE_WIDTH = 1e-7

/**
 * How deep the water on the dry side may stand before the section fails, the water on the wet side as
 * it is. Water on both sides lifts the tube and fills the ground under it; 10 cm of it can take a
 * quarter of the grip.
 *
 * @param gripShare See `evaluateSection`.
 * @returns null where it still holds with the dry side as high as the wet one.
 */
export function pondLimit(section: SectionCase, gripShare = 1): PondLimit | null {
  const at = (dryDepth: number) =>
    evaluateSection({ ...section, water: { ...section.water, dryDepth } }, gripShare)
  const dry = at(0)
  if (dry.verdict === 'fails') return { dryDepth: null, check: dry.governs }
  const { depth } = section.water
  const steps = Math.max(1, Math.ceil(depth / (STEP * section.barrier.diameter)))
  let good = 0
  for (let i = 1; i <= steps; i += 1) {
    let bad = (i * depth) / steps
    if (at(bad).verdict !== 'fails') {
      good = bad
      continue
    }
    while (bad - good > EDGE_WIDTH) {
      const middle = (good + bad) / 2
      if (at(middle).verdict === 'fails') bad = middle
      else good = middle
    }
    return { dryDepth: good, check: at(bad).governs }
  }
  return null
}
