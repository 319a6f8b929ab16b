import { BARRIERS } from '@shared/catalogue/barriers'
import type { ScenarioContent, SizeRun } from '@shared/schemas/scenario'
import { assumptionFor, barrierOf } from './new-content'
import type { NameTube } from './place-input'
import type { PlaceOnLine } from './place-on-line'

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
  nameTube: NameTube,
): SizeRun[] {
  const barrier = run?.barrier ?? sizes.at(-1)?.barrier ?? barrierOf(BARRIERS[0]!, nameTube)
  return [...sizes, { from: section.from, to: section.to, barrier, edgeFactor: null }]
}

/** The run with a tube of the catalogue. */
export function withCatalogueTube(
  sizes: readonly SizeRun[],
  index: number,
  tubeId: string,
  nameTube: NameTube,
): SizeRun[] {
  const tube = BARRIERS.find(({ id }) => id === tubeId)
  return tube ? withRunAt(sizes, index, { barrier: barrierOf(tube, nameTube) }) : [...sizes]
}

/** Assumptions with one for a surface that had none. */
export function withAssumption({ grounds }: ScenarioContent, surface: string) {
  return [...grounds, assumptionFor(surface)]
}
