import { checkBasis } from '../catalogue/check-bases'
import { windOnEmptyBarrier } from '../calc/wind/wind-on-empty-barrier'
import { assumptionOf } from '../checks/place-case'
import type { StoreItem } from '../schemas/depot'
import type { ScenarioContent } from '../schemas/scenario'
import type { SectionWork } from './laying-jobs'

/** Required factor against wind where the basis has partial factors. Method page, "Before the water". */
const PARTIAL_BASIS_FACTOR = 1.5

/** Ballast that one section needs before the water holds it. */
export interface SectionBallast {
  /** On the skirt [kg/m]. */
  readonly perMetre: number
  /** Of the section [kg]. */
  readonly mass: number
  /** null: the mass of a bag is not known. */
  readonly bags: number | null
}

export interface BallastInput {
  readonly content: ScenarioContent
  readonly sectionLength: number
  /** Peak gust [m/s], 0 to 60. */
  readonly gust: number
  /** Mass of one bag [kg]; null: not known. */
  readonly bagMass: number | null
}

/** Factor of friction resistance over wind that the check basis asks for [–]. */
export function windFactor({ basis }: Pick<ScenarioContent, 'basis'>): number {
  const { format, sliding } = checkBasis(basis)
  return format === 'partial' ? PARTIAL_BASIS_FACTOR : sliding
}

/**
 * Ballast for one section on its own ground; where it lies on several, on the one with the least
 * friction. Bags are counted by section, whole.
 *
 * @throws OutOfRangeError for a gust outside 0 to 60 m/s.
 * @see windOnEmptyBarrier for formula and source.
 */
export function sectionBallast(
  { section, run: { barrier } }: Pick<SectionWork, 'section' | 'run'>,
  { content, sectionLength, gust, bagMass }: BallastInput,
): SectionBallast {
  const demands = section.pieces.flatMap(({ surface }) => {
    const friction = assumptionOf(content, surface)?.friction
    if (friction === undefined) return []
    const { diameter, mass } = barrier
    const required = windFactor(content)
    const empty = { diameter, mass, friction, gravity: content.gravity, gust, required }
    return windOnEmptyBarrier(empty).ballast
  })
  const perMetre = Math.max(0, ...demands)
  const mass = perMetre * sectionLength
  // 1e-9: what binary arithmetic adds to a whole number of bags.
  return {
    perMetre,
    mass,
    bags: bagMass === null ? null : Math.ceil(Math.max(0, mass / bagMass - 1e-9)),
  }
}

/** Bags of one kind in all depots; of several masses the lightest counts, which asks for most bags. */
export function bagsInStore(
  items: readonly Pick<StoreItem, 'kind' | 'mass' | 'serviceable'>[],
  kind: 'ballast-bag' | 'edge-bag',
): { readonly bagMass: number | null; readonly inStore: number } {
  const bags = items.filter((item) => item.kind === kind && item.mass !== null)
  const masses = bags.map(({ mass }) => mass!)
  return {
    bagMass: masses.length > 0 ? Math.min(...masses) : null,
    inStore: bags.reduce((sum, { serviceable }) => sum + serviceable, 0),
  }
}
