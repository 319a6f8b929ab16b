import { BARRIERS } from '@shared/catalogue/barriers'
import type { ScenarioContent, SizeRun } from '@shared/schemas/scenario'
import { assumptionFor, barrierOf } from './new-content'
import type { PlaceOnLine } from './place-on-line'
import type { TubeBook } from './tube-book'

/** The runs with one of them changed. */
export function withRunAt(
  sizes: readonly SizeRun[],
  index: number,
  change: Partial<SizeRun>,
): SizeRun[] {
  return sizes.map((run, i) => (i === index ? { ...run, ...change } : run))
}

/** A run over one section, laid over what was there: the tube before it, or the smallest. */
export function withTubeAt(
  { sizes }: ScenarioContent,
  { section, run }: PlaceOnLine,
  tubes: TubeBook,
): SizeRun[] {
  const barrier = run?.barrier ?? sizes.at(-1)?.barrier ?? barrierOf(BARRIERS[0]!, tubes)
  return [...sizes, { from: section.from, to: section.to, barrier, edgeFactor: null }]
}

/** The run with a tube of the catalogue. */
export function withCatalogueTube(
  sizes: readonly SizeRun[],
  index: number,
  tubeId: string,
  tubes: TubeBook,
): SizeRun[] {
  const tube = BARRIERS.find(({ id }) => id === tubeId)
  return tube ? withRunAt(sizes, index, { barrier: barrierOf(tube, tubes) }) : [...sizes]
}

/** Assumptions with one for a surface that had none. */
export function withAssumption({ grounds }: ScenarioContent, surface: string) {
  return [...grounds, assumptionFor(surface)]
}
