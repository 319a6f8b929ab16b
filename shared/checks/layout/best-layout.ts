import { lineSections, type LineSection } from '../../calc/line/line-sections'
import type { Survey } from '../../schemas/line-faults'
import type { ScenarioBarrier, ScenarioContent, SizeRun } from '../../schemas/scenario'
import { sizeAt } from '../place-case'
import { chooseSizes } from './choose-sizes'
import { sizeOptions, type SizeOption } from './size-options'

/** One section of the best layout. */
export interface PlannedSection {
  readonly section: LineSection
  readonly options: readonly SizeOption[]
  /** Size that is best here, by its place in the list; null where none fits. */
  readonly best: number | null
  /** `none-holds`: the size with the highest holds-to level is laid and does not hold. */
  readonly standing: 'holds' | 'none-holds' | 'none-fits'
}

export interface BestLayout {
  readonly sizes: readonly ScenarioBarrier[]
  readonly sections: readonly PlannedSection[]
}

/**
 * The best size for each section at the level that the scenario checks: every check holds, the clear
 * width is enough, at most one size per joint, least Σ mass × length + 20 kg × changes. Where no size
 * holds, the fitting one with the highest holds-to level is laid.
 *
 * @param sizes Sizes on offer; those of another section length are left out. In any order.
 */
export function bestLayout(
  survey: Survey,
  content: ScenarioContent,
  sizes: readonly ScenarioBarrier[],
): BestLayout {
  const { sectionLength } = survey
  const offered = offeredSizes(sizes, sectionLength)
  const optionsOf = sizeOptions({ content, sizes: offered, sectionLength })
  const planned = lineSections(survey.stations, sectionLength, survey.marks).map((section) => {
    const options = optionsOf(section)
    return { section, options, ...candidatesOf(options) }
  })
  const masses = offered.map(({ mass }) => mass * sectionLength)
  const best = chooseSizes(planned, masses)
  return {
    sizes: offered,
    sections: planned.map(({ section, options, standing }, i) => ({
      section,
      options,
      standing,
      best: best[i]!,
    })),
  }
}

/** Sizes of one section length, smallest first. */
export function offeredSizes(
  sizes: readonly ScenarioBarrier[],
  sectionLength: number,
): readonly ScenarioBarrier[] {
  return sizes
    .filter((size) => size.sectionLength === sectionLength)
    .sort((a, b) => a.diameter - b.diameter)
}

/** Sizes that may be laid in a section, and why these. */
export function candidatesOf(options: readonly SizeOption[]): {
  readonly candidates: readonly number[]
  readonly standing: PlannedSection['standing']
} {
  const fitting = options.filter(({ missingRoom }) => missingRoom === 0)
  const holding = fitting.filter(({ holds }) => holds)
  if (holding.length > 0) {
    return { candidates: holding.map(({ size }) => size), standing: 'holds' }
  }
  if (fitting.length === 0) return { candidates: [], standing: 'none-fits' }
  const highest = fitting.reduce((a, b) => (isHigher(b, a) ? b : a))
  return { candidates: [highest.size], standing: 'none-holds' }
}

function isHigher(a: SizeOption, b: SizeOption): boolean {
  return (a.holdsToLevel() ?? -Infinity) > (b.holdsToLevel() ?? -Infinity)
}

/** The runs that lay the best sizes; each section keeps its edge. */
export function runsOfLayout(
  { sections, sizes }: BestLayout,
  content: ScenarioContent,
): readonly SizeRun[] {
  return mergedRuns(
    sections.map(({ section: { from, to }, best }) => {
      if (best === null) return null
      const edgeFactor = sizeAt(content, (from + to) / 2)?.edgeFactor ?? null
      return { from, to, barrier: sizes[best]!, edgeFactor }
    }),
  )
}

/** The runs of a scenario with one section laid anew, told apart by sections. */
export function runsWithSection(
  sections: readonly LineSection[],
  content: ScenarioContent,
  laid: SizeRun,
): readonly SizeRun[] {
  return mergedRuns(
    sections.map(({ from, to }) => {
      if (from === laid.from && to === laid.to) return laid
      const run = sizeAt(content, (from + to) / 2)
      return run && { ...run, from, to }
    }),
  )
}

/** Neighbours that are laid alike become one run. */
function mergedRuns(laid: readonly (SizeRun | null)[]): readonly SizeRun[] {
  const runs: SizeRun[] = []
  for (const run of laid) {
    if (!run) continue
    const before = runs.at(-1)
    const isSame = before?.to === run.from && layingOf(before) === layingOf(run)
    if (isSame) runs[runs.length - 1] = { ...before, to: run.to }
    else runs.push(run)
  }
  return runs
}

const layingOf = ({ barrier, edgeFactor }: SizeRun): string => JSON.stringify([barrier, edgeFactor])
