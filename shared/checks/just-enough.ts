import { findRoot } from '../calc/numerics/find-root'
import { fieldRange } from '../schemas/section-ranges'
import type { SectionCase } from '../schemas/section-case'
import type { SectionResult } from '../schemas/section-result'
import { globalPairs } from './global-checks'
import { partialSliding } from './partial-checks'
import type { GripShareFor } from './bend-loss'
import { sectionState } from './section-state'

export type JustEnough = SectionResult['justEnough']

/** What rounding leaves of a root [N/m]. */
const ROUNDING = 1e-6

const NONE: JustEnough = { skirtLength: null, friction: null, edgeFactor: null }

/**
 * The value of skirt length, friction and edge factor at which sliding is just enough, all else as
 * it is; null where no value in its range is enough.
 *
 * An edge factor of 1 or more means that any edge will do. Demand and resistance are linear in the
 * edge factor and the friction, so two evaluations give these exactly; the skirt length is a root.
 *
 * @param gripShareFor Share of the resistance that bends leave, by skirt length.
 */
export function justEnough(section: SectionCase, gripShareFor?: GripShareFor): JustEnough {
  if (section.water.dryDepth > section.water.depth) return NONE
  const share = gripShareFor ?? (() => 1)
  return {
    skirtLength: enoughSkirt(section, share),
    friction: enoughFriction(section, share),
    edgeFactor: enoughEdge(section, share),
  }
}

/** Resistance less required demand of sliding [N/m], one figure per combination of the basis. */
function slidingSpare(section: SectionCase, shareFor: GripShareFor): readonly number[] {
  const state = sectionState(section)
  const { format, sliding: required } = state.basis
  const pairs =
    format === 'partial'
      ? [partialSliding(state, 1), partialSliding(state, 2)]
      : [globalPairs(state).sliding]
  const share = shareFor(section.barrier.skirtLength)
  return pairs.map(({ demand, resistance }) => share * resistance - required * demand)
}

function enoughSkirt(section: SectionCase, share: GripShareFor): number | null {
  const spare = (skirtLength: number): number =>
    Math.min(...slidingSpare({ ...section, barrier: { ...section.barrier, skirtLength } }, share))
  const low = 0
  const high = fieldRange('barrier.skirtLength').max as number
  const atLow = spare(low)
  if (atLow >= 0) return 0
  const atHigh = spare(high)
  if (atHigh < 0) return null
  return findRoot(spare, { low, high, atLow, atHigh })
}

function enoughFriction(section: SectionCase, share: GripShareFor): number | null {
  const spare = (friction: number, soft = section.ground.undrainedStrength ?? null) =>
    slidingSpare(
      { ...section, ground: { ...section.ground, friction, undrainedStrength: soft } },
      share,
    )
  // Linear as long as friction decides; what soft ground allows is asked for afterwards.
  const without = spare(0, null)
  const perUnit = spare(1, null).map((value, i) => value - without[i]!)
  const needed = without.map((value, i) => needAlong(value, perUnit[i]!))
  const most = Math.max(...needed)
  if (isSoft(section) && spare(most).some((value) => value < -ROUNDING)) return null
  return most <= (fieldRange('ground.friction').max as number) ? most : null
}

/** Where a line that starts at `value` and rises by `slope` reaches zero: 0 if it starts there. */
function needAlong(value: number, slope: number): number {
  if (value >= 0) return 0
  return slope > 0 ? -value / slope : Infinity
}

function enoughEdge(section: SectionCase, share: GripShareFor): number | null {
  const spare = (edgeFactor: number): readonly number[] =>
    slidingSpare({ ...section, uplift: { ...section.uplift, edgeFactor } }, share)
  const sealed = spare(0)
  const open = spare(1)
  if (sealed.some((value) => value < 0)) return null
  if (isSoft(section)) return enoughEdgeOnSoftGround(spare)
  const limits = sealed.map((value, i) => (value > open[i]! ? value / (value - open[i]!) : 1))
  return Math.min(...limits)
}

/** On soft ground the resistance is the least of three, so the edge factor is a root. */
function enoughEdgeOnSoftGround(spare: (edgeFactor: number) => readonly number[]): number {
  const least = (edgeFactor: number): number => Math.min(...spare(edgeFactor))
  const atHigh = least(1)
  if (atHigh >= 0) return 1
  return findRoot(least, { low: 0, high: 1, atLow: least(0), atHigh })
}

function isSoft({ ground }: SectionCase): boolean {
  return (ground.undrainedStrength ?? null) !== null
}
