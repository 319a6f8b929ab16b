import { depthLimitedHeight } from '../calc/moving-water/wave-thrust'
import type { FreeboardResult } from '../schemas/section-result'
import { verdictOf } from './compare'
import type { SectionState } from './section-state'

/** What waves and current add to the still level: min(H_s, 0.78 h) + V²/2g [m]. */
export function waterAllowance({ section }: Pick<SectionState, 'section'>): number {
  const { water, gravity } = section
  return (
    depthLimitedHeight(water.waveHeight, water.depth, 1) + water.currentSpeed ** 2 / (2 * gravity)
  )
}

/**
 * Freeboard of the loaded crest over still water, waves and velocity head. Nothing available fails,
 * whatever is required; so does a tube that does not stand.
 */
export function freeboardCheck(state: SectionState): FreeboardResult {
  const { shape, geometry, section } = state
  const required = section.requiredFreeboard
  if (!shape.solved) return { available: null, required, utilisation: null, verdict: 'fails' }
  const available = shape.crest - geometry.depth - waterAllowance(state)
  const utilisation = available > 0 ? required / available : null
  return { available, required, utilisation, verdict: verdictOf(utilisation) }
}
