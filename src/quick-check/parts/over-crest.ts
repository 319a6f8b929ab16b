import { overflow, overtopping, OVERTOPPING_FITTED } from '@shared/calc/moving-water/overtopping'
import type { PartInput } from './part'

/** Waves that are thrown over a crest that stands above the water. */
export interface ThrownOver {
  /** Mean and design discharge per metre run [m²/s]. */
  readonly mean: number
  readonly design: number
  /** Crest above still water, over the wave height [–]. */
  readonly ratio: number
  /** The formula was fitted there. */
  readonly isFitted: boolean
}

/** What waves throw over the loaded crest; null without waves, or where no crest stands above the water. */
export function thrownOver({ section, evaluation }: PartInput): ThrownOver | null {
  const { waveHeight: height, depth } = section.water
  const { loadedShape } = evaluation
  if (height <= 0 || !loadedShape.solved) return null
  const crestFreeboard = loadedShape.crest - depth
  const at = { height, crestFreeboard, gravity: section.gravity }
  const ratio = crestFreeboard / height
  const { min, max } = OVERTOPPING_FITTED
  return {
    mean: overtopping(at),
    design: overtopping(at, 'design'),
    ratio,
    isFitted: ratio >= min && ratio <= max,
  }
}

/**
 * Water that runs over a barrier whose crest is under water [m²/s]: at least this much, because it is
 * taken over the unloaded crest. Null where the crest is not under water.
 */
export function runsOver({ section, evaluation }: PartInput): number | null {
  const { loadedShape } = evaluation
  if (loadedShape.solved || loadedShape.reason !== 'overtopped') return null
  return overflow(section.water.depth - section.barrier.diameter, section.gravity)
}
