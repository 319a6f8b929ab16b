import type { SectionEvaluation } from '@shared/checks/evaluate-section'
import { checkBasis } from '@shared/catalogue/check-bases'
import type { SummedCheck } from '@shared/checks/check-terms'
import type { SectionCase } from '@shared/schemas/section-case'
import type { CheckId, Verdict } from '@shared/schemas/section-result'
import type { Message } from '@shared/texts/format-text'
import type { Quantity, QuantityKind } from '@shared/units'

/** One check as the band shows it. */
export interface CheckRow {
  readonly id: CheckId
  readonly verdict: Verdict
  /** Word for the check alone. */
  readonly state: Message
  /** Factor or available freeboard, rounded down; a message where there is no figure. */
  readonly main: Quantity | Message
  readonly required: Quantity | null
  /** Share of what is allowed; null where nothing resists. */
  readonly utilisation: number | null
  /** Demand, resistance and where they come from; asked for once the check is opened. */
  readonly workings: () => readonly Message[]
  /** The check as sums of terms; null where it is none. */
  readonly sums: SummedRow | null
}

/** What the sums of a check are worked out from. */
export interface SummedRow {
  readonly check: SummedCheck
  readonly section: SectionCase
}

const ORDER: readonly CheckId[] = [
  'sliding',
  'overturning',
  'flotation',
  'skirt',
  'freeboard',
  'fabric',
  'ground',
]

/** All checks of an evaluation, in the order in which ties are decided. */
export function checkRows(evaluation: SectionEvaluation, section: SectionCase): CheckRow[] {
  return ORDER.filter((id) => evaluation[id] !== undefined).map((id) => {
    const { verdict, required, utilisation } = evaluation[id]!
    const kind: QuantityKind = id === 'freeboard' ? 'smallLength' : 'ratio'
    return {
      id,
      verdict,
      state: { key: `checks.state.${stateOf(verdict, section)}` },
      main: mainFigure(evaluation, id, section),
      required: required === null ? null : { value: required, kind },
      utilisation,
      workings: () => workingsOf(evaluation, section, id),
      sums: isSummed(id) && !isReversed(section) ? { check: id, section } : null,
    }
  })
}

const SUMMED: readonly CheckId[] = ['sliding', 'overturning', 'flotation', 'skirt']

function isSummed(id: CheckId): id is SummedCheck {
  return SUMMED.includes(id)
}

/** A check that passes says nothing about a barrier whose skirt is off. */
function stateOf(verdict: Verdict, section: SectionCase): string {
  const passes = verdict === 'holds' || verdict === 'narrow'
  return passes && section.barrier.skirtLength === 0 ? 'noHelp' : verdict
}

function mainFigure(
  evaluation: SectionEvaluation,
  id: CheckId,
  section: SectionCase,
): CheckRow['main'] {
  if (id === 'ground') return { key: 'quickCheck.verdict.unsuitable' }
  if (id === 'freeboard') {
    const { available } = evaluation.freeboard
    if (available === null) return { key: 'quickCheck.verdict.noResistance' }
    return { value: available, kind: 'smallLength', rounding: 'down' }
  }
  const { factor, verdict } = evaluation[id]
  if (factor !== null) return { value: factor, kind: 'ratio', rounding: 'down' }
  if (verdict === 'fails')
    return { key: `quickCheck.verdict.${isReversed(section) ? 'notCovered' : 'noResistance'}` }
  if (verdict === 'notChecked')
    return { key: `quickCheck.verdict.${id === 'fabric' ? 'noStrength' : 'notChecked'}` }
  return { key: 'quickCheck.verdict.nothingActs' }
}

function isReversed({ water }: SectionCase): boolean {
  return water.dryDepth > water.depth
}

function workingsOf(evaluation: SectionEvaluation, section: SectionCase, id: CheckId): Message[] {
  const key = `quickCheck.working.${id}`
  if (id === 'ground') return [{ key }]
  if (id === 'freeboard') return freeboardWorkings(evaluation, section)
  if (isReversed(section) && id !== 'fabric' && id !== 'flotation')
    return [{ key: 'quickCheck.working.reversed' }]
  const kind: QuantityKind = id === 'overturning' ? 'momentPerLength' : 'forcePerLength'
  const { demand, resistance } = evaluation.workings[id]
  const values = { demand: { value: demand, kind }, resistance: { value: resistance, kind } }
  const partial: Message[] =
    checkBasis(section.basis).format === 'partial' ? [{ key: 'quickCheck.working.partial' }] : []
  return [{ key, values }, ...sourceOf(evaluation, section, id), ...partial]
}

function freeboardWorkings(evaluation: SectionEvaluation, section: SectionCase): Message[] {
  const { available, required } = evaluation.freeboard
  const { loadedShape } = evaluation
  if (!loadedShape.solved || available === null) return [{ key: 'quickCheck.working.notStanding' }]
  const small = (value: number, rounding?: 'down'): Quantity => ({
    value,
    kind: 'smallLength',
    ...(rounding ? { rounding } : {}),
  })
  const { diameter } = section.barrier
  return [
    {
      key: 'quickCheck.working.freeboard',
      values: { available: small(available, 'down'), required: small(required ?? 0) },
    },
    {
      key: 'quickCheck.working.freeboardFrom',
      values: {
        crest: { value: loadedShape.crest, kind: 'length' },
        sag: small(diameter - loadedShape.crest),
      },
    },
  ]
}

type Explained = Exclude<CheckId, 'freeboard' | 'ground'>

/** What the sums of a check do not say. */
function sourceOf(
  { loadedShape, overturningGross }: SectionEvaluation,
  { barrier }: SectionCase,
  id: Explained,
): Message[] {
  if (id === 'sliding' || id === 'flotation') return []
  const key = `quickCheck.working.${id}From`
  if (id === 'overturning')
    return overturningGross === null
      ? []
      : [{ key, values: { gross: { value: overturningGross, kind: 'ratio' } } }]
  if (!loadedShape.solved) return [{ key: 'quickCheck.working.notStanding' }]
  if (id === 'fabric')
    return [
      { key, values: { tension: { value: loadedShape.skinTension, kind: 'forcePerLength' } } },
    ]
  const skirt: Quantity = { value: barrier.skirtLength, kind: 'length' }
  return [{ key, values: { skirt, free: { value: loadedShape.freeSkirt, kind: 'length' } } }]
}
