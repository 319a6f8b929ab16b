import { EDGE_FACTORS, SLIPPERY_FRICTION, type Alternative } from '@shared/checks/what-decides'
import type { SectionCase } from '@shared/schemas/section-case'
import type { HoldsTo } from '@shared/schemas/section-result'
import type { Message } from '@shared/texts/format-text'

export type DecisionGroupId = Alternative['group']

/** One option of a group: chosen, or what it would be. */
export interface DecisionRow {
  readonly id: string
  readonly name: Message
  readonly holdsTo: HoldsTo
  readonly isChosen: boolean
}

export interface DecisionGroup {
  readonly id: DecisionGroupId
  readonly rows: readonly DecisionRow[]
}

const GROUPS: readonly DecisionGroupId[] = ['edge', 'friction', 'basis', 'size']

/** What decides, by group, the chosen option first; groups without an alternative are left out. */
export function decisionGroups(
  section: SectionCase,
  holdsTo: HoldsTo,
  alternatives: readonly Alternative[],
): readonly DecisionGroup[] {
  return GROUPS.flatMap((id) => {
    const others = alternatives.filter(({ group }) => group === id)
    if (others.length === 0) return []
    const chosen = { id: `${id}-chosen`, name: chosenName(id, section), holdsTo, isChosen: true }
    const rows = others.map((alternative) => ({
      id: alternative.id,
      name: alternativeName(alternative),
      holdsTo: alternative.holdsTo,
      isChosen: false,
    }))
    return [{ id, rows: [chosen, ...rows] }]
  })
}

function chosenName(id: DecisionGroupId, section: SectionCase): Message {
  if (id === 'edge') return edgeName(section.uplift.edgeFactor)
  if (id === 'friction') return frictionName(section.ground.friction)
  if (id === 'basis') return { key: `checks.basis.${section.basis}` }
  return tubeName(section.barrier.diameter)
}

function alternativeName({ group, section }: Alternative): Message {
  if (group === 'friction')
    return {
      key: 'quickCheck.decides.slippery',
      values: { friction: { value: SLIPPERY_FRICTION, kind: 'ratio' } },
    }
  return chosenName(group, section)
}

function edgeName(edgeFactor: number): Message {
  const named = Object.entries(EDGE_FACTORS).find(([, factor]) => factor === edgeFactor)
  if (named) return { key: `quickCheck.decides.edge.${named[0]}` }
  return {
    key: 'quickCheck.decides.edge.typed',
    values: { share: { value: edgeFactor, kind: 'percent' } },
  }
}

function frictionName(friction: number): Message {
  const values = { friction: { value: friction, kind: 'ratio' as const } }
  return { key: 'quickCheck.decides.friction', values }
}

function tubeName(diameter: number): Message {
  const values = { diameter: { value: diameter, kind: 'length' as const } }
  return { key: 'quickCheck.decides.tube', values }
}
