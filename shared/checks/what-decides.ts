import type { CatalogueBarrier } from '../catalogue/barriers'
import { BASIS_IDS, type BasisId } from '../catalogue/check-bases'
import type { SectionCase } from '../schemas/section-case'
import type { HoldsTo } from '../schemas/section-result'
import { holdingProfile, holdsToAt } from './holds-to'

/** Edge factors that the product offers by name. Judgement, unverified. */
export const EDGE_FACTORS = { open: 1, weighed: 0.5, sealed: 0 } as const
export type EdgeId = keyof typeof EDGE_FACTORS

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
 */
export function whatDecides(
  section: SectionCase,
  nextTube: CatalogueBarrier | null,
): readonly Alternative[] {
  const draft = [
    ...edgeAlternatives(section),
    ...frictionAlternatives(section),
    ...basisAlternatives(section),
    ...(nextTube ? [sizeAlternative(section, nextTube)] : []),
  ]
  return draft.map((alternative) => ({
    ...alternative,
    holdsTo: holdsToAt(holdingProfile(alternative.section), section.water.depth),
  }))
}

type Draft = Omit<Alternative, 'holdsTo'>

function edgeAlternatives(section: SectionCase): readonly Draft[] {
  const { uplift } = section
  if (uplift.model === 'none') return []
  return (Object.keys(EDGE_FACTORS) as EdgeId[])
    .filter((id) => EDGE_FACTORS[id] !== uplift.edgeFactor)
    .map((id) => ({
      id: `edge-${id}` as const,
      group: 'edge' as const,
      section: { ...section, uplift: { ...uplift, edgeFactor: EDGE_FACTORS[id] } },
    }))
}

function frictionAlternatives(section: SectionCase): readonly Draft[] {
  if (section.ground.friction <= SLIPPERY_FRICTION) return []
  const ground = { ...section.ground, friction: SLIPPERY_FRICTION }
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
