import type { CatalogueBarrier } from '../catalogue/barriers'
import { BASIS_IDS, type BasisId } from '../catalogue/check-bases'
import type { SectionCase } from '../schemas/section-case'
import { SECTION_RANGES } from '../schemas/section-ranges'
import type { HoldsTo } from '../schemas/section-result'
import type { GripShareFor } from './bend-loss'
import { holdingProfile, holdsToAt } from './holds-to'

/** Edge factors that the product offers by name. Judgement, unverified. */
export const EDGE_FACTORS = {
  open: 1,
  weighed: SECTION_RANGES['uplift.weighedEdgeFactor'].default,
  sealed: 0,
} as const
export type EdgeId = keyof typeof EDGE_FACTORS

/** The same for a case, which may count with a weighed edge of its own. */
export function edgeFactorsOf({
  weighedEdgeFactor,
}: SectionCase['uplift']): Record<EdgeId, number> {
  return { ...EDGE_FACTORS, weighed: weighedEdgeFactor ?? EDGE_FACTORS.weighed }
}

/** Friction of a slippery surface, to show what it would change. Judgement, unverified. */
export const SLIPPERY_FRICTION = 0.25

/** What an alternative changes: one thing, all else as it is. */
export type AlternativeId =
  `edge-${EdgeId}` | 'friction-slippery' | `basis-${BasisId}` | 'next-size'

export interface Alternative {
  readonly id: AlternativeId
  readonly group: 'edge' | 'friction' | 'basis' | 'size'
  /** The case as it would be. */
  readonly section: SectionCase
  readonly holdsTo: HoldsTo
  /** Catalogue id of the other tube. */
  readonly barrierId?: string
}

/**
 * What decides the answer: skirt edge, friction, basis and size, each with the depth to which the
 * section would hold. Leaves out what is already chosen. Each costs one holding profile, so keep the
 * list while only the water moves.
 *
 * @param gripShareFor Share of the resistance that bends leave, by skirt length.
 */
export function whatDecides(
  section: SectionCase,
  nextTube: CatalogueBarrier | null,
  gripShareFor: GripShareFor = () => 1,
): readonly Alternative[] {
  const draft = [
    ...edgeAlternatives(section),
    ...frictionAlternatives(section),
    ...basisAlternatives(section),
    ...(nextTube ? [sizeAlternative(section, nextTube)] : []),
  ]
  return draft.map((alternative) => ({
    ...alternative,
    holdsTo: holdsToAt(
      holdingProfile(alternative.section, gripShareFor(alternative.section.barrier.skirtLength)),
      section.water.depth,
    ),
  }))
}

type Draft = Omit<Alternative, 'holdsTo'>

function edgeAlternatives(section: SectionCase): readonly Draft[] {
  const { uplift } = section
  const isSealed = uplift.model === 'none'
  // Nothing under the skirt is an assumption, too: show what the edge would do without it.
  const model = isSealed ? 'linear' : uplift.model
  const factors = edgeFactorsOf(uplift)
  const chosen = isSealed ? EDGE_FACTORS.sealed : uplift.edgeFactor
  return (Object.keys(factors) as EdgeId[])
    .filter((id) => factors[id] !== chosen)
    .map((id) => ({
      id: `edge-${id}` as const,
      group: 'edge' as const,
      section: { ...section, uplift: { ...uplift, model, edgeFactor: factors[id] } },
    }))
}

function frictionAlternatives(section: SectionCase): readonly Draft[] {
  const { friction } = section.ground
  // On ground that is slippery already: half of it.
  const slippery = friction > SLIPPERY_FRICTION ? SLIPPERY_FRICTION : friction / 2
  const ground = { ...section.ground, friction: slippery }
  return [{ id: 'friction-slippery', group: 'friction', section: { ...section, ground } }]
}

function basisAlternatives(section: SectionCase): readonly Draft[] {
  return BASIS_IDS.filter((basis) => basis !== section.basis).map((basis) => ({
    id: `basis-${basis}` as const,
    group: 'basis' as const,
    section: { ...section, basis },
  }))
}

function sizeAlternative(section: SectionCase, tube: CatalogueBarrier): Draft {
  const { id, statedHeight: _stated, isExample: _example, ...barrier } = tube
  return { id: 'next-size', group: 'size', section: { ...section, barrier }, barrierId: id }
}
