/** Sizes that one section may get, and what each of them weighs. */
export interface SizeChoice {
  /** Sizes by their place in the list of sizes, smallest first; none: nothing can be laid. */
  readonly candidates: readonly number[]
}

/** Counts against each change of size along the line [kg]. */
export const CHANGE_MASS = 20

/** Cost of a layout: joints that step over a size come first, then the mass. */
export interface SizesCost {
  /** Joints between sizes that are not neighbours in the list; no closure takes them. */
  readonly jumps: number
  /** Σ mass + 20 kg × changes [kg]. */
  readonly mass: number
}

/**
 * Chooses a size for every section of a line so that as few joints as possible step over a size, and
 * then Σ mass × length + 20 kg × changes is least. Dynamic programming over sections and sizes:
 * optimal, and in time n × k².
 *
 * @param sections In order of chainage.
 * @param masses Mass of one section of each size [kg].
 * @returns For each section its size; null where it has no candidate.
 */
export function chooseSizes(
  sections: readonly SizeChoice[],
  masses: readonly number[],
): readonly (number | null)[] {
  const steps = sections.reduce<Step[]>((done, { candidates }) => {
    done.push(nextStep(done.at(-1) ?? null, candidates, masses))
    return done
  }, [])
  const chosen: (number | null)[] = []
  let at = cheapest(steps.at(-1) ?? null)
  for (let i = steps.length - 1; i >= 0; i -= 1) {
    const state = at === null ? null : steps[i]!.states[at]!
    chosen[i] = state?.size ?? null
    at = state ? state.before : cheapest(steps[i - 1] ?? null)
  }
  return chosen
}

/** What the sizes of a line cost. */
export function sizesCost(sizes: readonly (number | null)[], masses: readonly number[]): SizesCost {
  return sizes.reduce<SizesCost>(
    (cost, size, i) => {
      if (size === null) return cost
      const joint = jointCost(sizes[i - 1] ?? null, size)
      return { jumps: cost.jumps + joint.jumps, mass: cost.mass + joint.mass + masses[size]! }
    },
    { jumps: 0, mass: 0 },
  )
}

/** A section with one size, reached in the cheapest way. */
interface State {
  readonly size: number
  readonly cost: SizesCost
  /** State of the section before; null where there is none. */
  readonly before: number | null
}

interface Step {
  /** Empty where nothing can be laid: whatever comes after begins anew. */
  readonly states: readonly State[]
}

function nextStep(
  before: Step | null,
  candidates: readonly number[],
  masses: readonly number[],
): Step {
  const from = before?.states ?? []
  return {
    states: candidates.map((size) => {
      const own = masses[size]!
      if (from.length === 0) return { size, cost: { jumps: 0, mass: own }, before: null }
      let best: State | null = null
      from.forEach((state, index) => {
        const joint = jointCost(state.size, size)
        const cost = {
          jumps: state.cost.jumps + joint.jumps,
          mass: state.cost.mass + joint.mass + own,
        }
        if (best === null || isCheaper(cost, best.cost)) best = { size, cost, before: index }
      })
      return best!
    }),
  }
}

function jointCost(before: number | null, size: number): SizesCost {
  if (before === null || before === size) return { jumps: 0, mass: 0 }
  return { jumps: Math.abs(before - size) > 1 ? 1 : 0, mass: CHANGE_MASS }
}

/** Masses this close are one [kg]: sums in another order differ by less. */
const SAME_MASS = 1e-9

function isCheaper(a: SizesCost, b: SizesCost): boolean {
  if (a.jumps !== b.jumps) return a.jumps < b.jumps
  return a.mass < b.mass - SAME_MASS
}

function cheapest(step: Step | null): number | null {
  if (!step || step.states.length === 0) return null
  let best = 0
  step.states.forEach(({ cost }, index) => {
    if (isCheaper(cost, step.states[best]!.cost)) best = index
  })
  return best
}
