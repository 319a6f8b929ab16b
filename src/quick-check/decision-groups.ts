import { edgeFactorsOf, type Alternative } from '@shared/checks/what-decides'
import { basisKey } from './basis-key'
import type { SectionCase } from '@shared/schemas/section-case'
import type { HoldsTo } from '@shared/schemas/section-result'
import type { Message } from '@shared/texts/format-text'
import type { QuantityKind } from '@shared/units'

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

/** Shows a figure as it was given. */
type Given = (value: number, kind: QuantityKind) => string

const GROUPS: readonly DecisionGroupId[] = ['edge', 'friction', 'basis', 'size']

/** What decides, by group, the chosen option first; groups without an alternative are left out. */
export function decisionGroups(
  given: Given,
  section: SectionCase,
  holdsTo: HoldsTo,
  alternatives: readonly Alternative[],
): readonly DecisionGroup[] {
  return GROUPS.flatMap((id) => {
    const others = alternatives.filter(({ group }) => group === id)
    if (others.length === 0) return []
    const chosen = {
      id: `${id}-chosen`,
      name: chosenName(id, section, given),
      holdsTo,
      isChosen: true,
    }
    const rows = others.map((alternative) => ({
      id: alternative.id,
      name: alternativeName(alternative, given),
      holdsTo: alternative.holdsTo,
      isChosen: false,
    }))
    return [{ id, rows: [chosen, ...rows] }]
  })
}

function chosenName(id: DecisionGroupId, section: SectionCase, given: Given): Message {
  if (id === 'edge') {
    if (section.uplift.model === 'none') return { key: 'quickCheck.decides.edge.none' }
    return edgeName(section.uplift, given)
  }
  if (id === 'friction') {
    const values = { friction: given(section.ground.friction, 'ratio') }
    return { key: 'quickCheck.decides.friction', values }
  }
  if (id === 'basis') return { key: basisKey(section.basis) }
  return {
    key: 'quickCheck.decides.tube',
    values: { diameter: given(section.barrier.diameter, 'length') },
  }
}

function alternativeName({ group, section }: Alternative, given: Given): Message {
  if (group === 'friction')
    return {
      key: 'quickCheck.decides.slippery',
      values: { friction: given(section.ground.friction, 'ratio') },
    }
  return chosenName(group, section, given)
}

function edgeName(uplift: SectionCase['uplift'], given: Given): Message {
  const { edgeFactor } = uplift
  const named = Object.entries(edgeFactorsOf(uplift)).find(([, factor]) => factor === edgeFactor)
  return {
    key: `quickCheck.decides.edge.${named?.[0] ?? 'typed'}`,
    values: { share: given(edgeFactor, 'percent') },
  }
}
