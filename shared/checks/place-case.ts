import type { GroundAssumption, ScenarioContent, SizeRun } from '../schemas/scenario'
import type { SectionCase } from '../schemas/section-case'

/** A place on a line: its ground and what it is made of. */
export interface Place {
  readonly chainage: number
  readonly groundLevel: number
  readonly surface: string
}

/**
 * Size that a scenario lays at a chainage; of overlapping runs the last one counts. Null where the
 * scenario lays nothing.
 */
export function sizeAt(content: ScenarioContent, chainage: number): SizeRun | null {
  return content.sizes.filter(({ from, to }) => from <= chainage && chainage <= to).at(-1) ?? null
}

/** What a scenario assumes of a surface; null where it assumes nothing. */
export function assumptionOf(content: ScenarioContent, surface: string): GroundAssumption | null {
  return content.grounds.find((ground) => ground.surface === surface) ?? null
}

/**
 * The cross-section of a scenario at a place: depth = level − ground, 0 where the ground is higher.
 *
 * @param run Size laid there.
 * @param ground Assumption for the surface there.
 */
export function caseAt(
  content: ScenarioContent,
  place: Place,
  run: SizeRun,
  ground: GroundAssumption,
): SectionCase {
  const { waterLevel, dryLevel, water, uplift } = content
  const {
    name: _n,
    statedHeight: _s,
    catalogueId: _c,
    catalogueRevision: _r,
    ...barrier
  } = run.barrier
  const { surface: _, ...assumed } = ground
  return {
    barrier,
    ground: { ...assumed, fall: content.fall },
    uplift: { ...uplift, edgeFactor: run.edgeFactor ?? uplift.edgeFactor },
    water: {
      ...water,
      depth: Math.max(0, waterLevel - place.groundLevel),
      dryDepth: dryLevel === null ? 0 : Math.max(0, dryLevel - place.groundLevel),
    },
    debris: content.debris,
    gravity: content.gravity,
    requiredFreeboard: content.requiredFreeboard,
    basis: content.basis,
  }
}
