import type { SectionCase } from '../schemas/section-case'
import type { CheckId, HoldsTo } from '../schemas/section-result'
import { evaluateSection } from './evaluate-section'

/** The scan looks at depths this far apart, in diameters, up to one diameter. */
const STEP = 0.005
const STEPS = 200

/** Edges between holding and failing are found to this width [m]; 0.1 mm is asked for. */
const EDGE_WIDTH = 1e-7

/** A run of depths at which every check holds. */
export interface HoldingInterval {
  /** Lowest holding depth [m]; 0 where it starts with the first step. */
  readonly from: number
  /** Highest holding depth [m]. */
  readonly to: number
  /** What governs at the failing end. */
  readonly check: CheckId
}

/** All holding depths of a section, whatever its own depth. */
export interface HoldingProfile {
  readonly intervals: readonly HoldingInterval[]
  /** Depth of the first step [m]; shallower water takes its place. */
  readonly firstStep: number
  /** What governs at the first step, for the case that nothing holds. */
  readonly checkAtFirstStep: CheckId
}

/**
 * Depths at which all checks hold, scanned at 0.005 D up to D and refined at each edge.
 *
 * It does not depend on the depth of the case: keep it while only the water moves.
 *
 * @param gripShare See `evaluateSection`.
 */
export function holdingProfile(section: SectionCase, gripShare = 1): HoldingProfile {
  const scanned = { section, gripShare }
  const { diameter } = section.barrier
  const intervals: HoldingInterval[] = []
  const firstStep = STEP * diameter
  let from: number | null = null
  let below = 0
  for (let step = 1; step <= STEPS; step += 1) {
    const depth = step * STEP * diameter
    const holds = holdsAt(scanned, depth)
    if (holds && from === null) {
      from = step === 1 ? 0 : edge(scanned, depth, below).holding
    }
    if (!holds && from !== null) {
      const { holding, failing } = edge(scanned, below, depth)
      intervals.push({ from, to: holding, check: governsAt(scanned, failing) })
      from = null
    }
    below = depth
  }
  if (from !== null) intervals.push({ from, to: below, check: governsAt(scanned, below) })
  return { intervals, firstStep, checkAtFirstStep: governsAt(scanned, firstStep) }
}

/** The holding interval that contains the depth, else the lowest one. */
export function holdsToAt(profile: HoldingProfile, depth: number): HoldsTo {
  const { intervals, firstStep, checkAtFirstStep } = profile
  const place = Math.max(depth, firstStep)
  const interval = intervals.find(({ from, to }) => from <= place && place <= to) ?? intervals[0]
  if (!interval) return { from: null, depth: 0, check: checkAtFirstStep }
  return { from: interval.from, depth: interval.to, check: interval.check }
}

interface Scanned {
  readonly section: SectionCase
  readonly gripShare: number
}

function at({ section, gripShare }: Scanned, depth: number) {
  return evaluateSection({ ...section, water: { ...section.water, depth } }, gripShare)
}

function holdsAt(scanned: Scanned, depth: number): boolean {
  return at(scanned, depth).verdict !== 'fails'
}

function governsAt(scanned: Scanned, depth: number): CheckId {
  return at(scanned, depth).governs
}

/** Halves the way between a holding and a failing depth. */
function edge(
  scanned: Scanned,
  holding: number,
  failing: number,
): { holding: number; failing: number } {
  let [good, bad] = [holding, failing]
  while (Math.abs(bad - good) > EDGE_WIDTH) {
    const middle = (good + bad) / 2
    if (holdsAt(scanned, middle)) good = middle
    else bad = middle
  }
  return { holding: good, failing: bad }
}
