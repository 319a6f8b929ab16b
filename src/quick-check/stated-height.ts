import { evaluateSection } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { CheckId } from '@shared/schemas/section-result'
import type { Message } from '@shared/texts/format-text'
import type { Quantity } from '@shared/units'

/** Where the height on the label goes: stated = depth + label + sag + freeboard + moving + spare. */
export interface StatedHeight {
  /** Height on the label [m]. */
  readonly stated: number
  /** Depth to which every check is met [m]; 0 where none is. */
  readonly depth: number
  /** Depth from which every check is met [m]; 0: from the first drop. */
  readonly from: number
  /** What the label says more than the tube measures [m]; negative where it says less. */
  readonly label: number
  /** Unloaded diameter less the loaded crest at that depth [m]. */
  readonly sag: number
  /** Freeboard that is required [m]. */
  readonly freeboard: number
  /** For waves and the velocity head of the current [m]. */
  readonly allowance: number
  /** Height that stays dry because another check gives way first [m]. */
  readonly spare: number
  /** The check that gives way first. */
  readonly check: CheckId
  /** Water presses up under the barrier at that depth. */
  readonly hasUplift: boolean
}

interface Held {
  readonly from: number | null
  readonly depth: number
  readonly check: CheckId
}

/** Answers "but it says 0.70 m on the bag"; null where no height is stated. */
export function statedHeight(
  stated: number | null,
  section: SectionCase,
  { from, depth, check }: Held,
): StatedHeight | null {
  if (stated === null) return null
  const none = { ...NOTHING, stated, check }
  if (from === null || depth <= 0) return none
  const at = evaluateSection({ ...section, water: { ...section.water, depth } })
  if (!at.loadedShape.solved || at.freeboard.available === null) return none
  const { crest } = at.loadedShape
  const { diameter } = section.barrier
  const freeboard = section.requiredFreeboard
  return {
    stated,
    depth,
    from,
    label: stated - diameter,
    sag: diameter - crest,
    freeboard,
    allowance: crest - depth - at.freeboard.available,
    spare: Math.max(0, at.freeboard.available - freeboard),
    check,
    hasUplift: at.vertical.uplift > 0,
  }
}

const NOTHING = {
  depth: 0,
  from: 0,
  label: 0,
  sag: 0,
  freeboard: 0,
  allowance: 0,
  spare: 0,
  hasUplift: false,
}

/** Less than this is not worth a word [m]. */
const LEAST = 0.0005

/** The answer, and where the rest of the height goes. */
export function statedWords(held: StatedHeight): {
  readonly answer: Message
  readonly parts: readonly Message[]
} {
  const { depth, from } = held
  if (depth <= 0) return { answer: { key: 'quickCheck.stated.answerNone' }, parts: [] }
  const to = { value: depth, kind: 'length', rounding: 'down' } as const
  const answer: Message =
    from > 0
      ? {
          key: 'quickCheck.stated.answerBetween',
          values: { from: { value: from, kind: 'length', rounding: 'up' }, depth: to },
        }
      : { key: 'quickCheck.stated.answer', values: { depth: to } }
  return { answer, parts: partsOf(held) }
}

function partsOf({ label, sag, freeboard, allowance, spare, ...why }: StatedHeight): Message[] {
  const part = (key: string, value: number): Message[] =>
    value < LEAST ? [] : [{ key, values: { height: mm(value) } }]
  return [
    ...part('quickCheck.stated.labelOver', label),
    ...part('quickCheck.stated.labelUnder', -label),
    ...part('quickCheck.stated.sag', sag),
    ...part('quickCheck.stated.freeboard', freeboard),
    ...part('quickCheck.stated.moving', allowance),
    ...part(`quickCheck.stated.spare.${givingWay(why)}`, spare),
  ]
}

function mm(value: number): Quantity {
  return { value, kind: 'smallLength' }
}

/** What gives way; sliding and flotation with water under the skirt are another thing than without. */
function givingWay({ check, hasUplift }: Pick<StatedHeight, 'check' | 'hasUplift'>): string {
  if (hasUplift && check === 'sliding') return 'slidingOnWater'
  if (hasUplift && check === 'flotation') return 'flotationOnWater'
  return check
}
