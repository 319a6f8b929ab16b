const MINUTE = 60

/** Steps in which one section is laid, in their order. */
export const LAYING_STEPS = ['carry', 'unroll', 'align', 'fill', 'join', 'ballast'] as const
export type LayingStep = (typeof LAYING_STEPS)[number]
export type StepTimes = Readonly<Record<LayingStep, number>>

/** How long the steps of one section take a crew, by diameter. */
interface LayingRow {
  readonly diameter: number
  readonly times: StepTimes
}

function row(diameter: number, minutes: readonly number[]): LayingRow {
  const times = Object.fromEntries(LAYING_STEPS.map((step, i) => [step, minutes[i]! * MINUTE]))
  return { diameter, times: times as StepTimes }
}

/** Times of the example tubes, for a section of 10 m and a crew of two. Judgement, no source; a drill tells. */
export const LAYING_TIMES: readonly LayingRow[] = [
  row(0.5, [3, 2, 3, 2, 4, 2]),
  row(0.7, [4, 3, 3, 4, 4, 3]),
  row(1, [6, 4, 4, 7, 5, 4]),
]

/** Plug, walk and clear the line before the first section [s]. Judgement, no source. */
export const CLEARING_TIME = 20 * MINUTE

/** Weighing a skirt edge with bags that lie ready. Judgement, no source: editable where it is used. */
export const EDGE_WORK = {
  /** Bags per metre of edge. */
  bagsPerMetre: 2,
  /** Mass of a bag [kg]. */
  bagMass: 20,
  /** Time of a crew for one bag [s]. */
  timePerBag: 30,
  /** A sealed edge takes so many times as long as one that is only weighed [–]. */
  sealing: 2,
} as const

/**
 * Times for one section of a tube, linear between the example tubes; beyond them in proportion to the
 * diameter.
 *
 * @param diameter Of the unloaded tube [m], above 0.
 * @returns Seconds by step.
 */
export function stepTimes(diameter: number): StepTimes {
  const [first, last] = [LAYING_TIMES[0]!, LAYING_TIMES[LAYING_TIMES.length - 1]!]
  if (diameter <= first.diameter) return scaled(first, diameter)
  if (diameter >= last.diameter) return scaled(last, diameter)
  const above = LAYING_TIMES.find((candidate) => candidate.diameter >= diameter)!
  const below = LAYING_TIMES[LAYING_TIMES.indexOf(above) - 1]!
  const share = (diameter - below.diameter) / (above.diameter - below.diameter)
  return mapped((step) => below.times[step] + share * (above.times[step] - below.times[step]))
}

/** Time that a crew needs for one section of a tube, fill included [s]. */
export function sectionTime(diameter: number): number {
  return Object.values(stepTimes(diameter)).reduce((sum, time) => sum + time, 0)
}

function scaled({ diameter, times }: LayingRow, wanted: number): StepTimes {
  return mapped((step) => (times[step] * wanted) / diameter)
}

function mapped(time: (step: LayingStep) => number): StepTimes {
  return Object.fromEntries(LAYING_STEPS.map((step) => [step, time(step)])) as Record<
    LayingStep,
    number
  >
}
