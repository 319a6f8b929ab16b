import type { SectionEvaluation } from '@shared/checks/evaluate-section'
import type { SectionCase } from '@shared/schemas/section-case'
import type { Message } from '@shared/texts/format-text'
import type { Quantity, QuantityKind } from '@shared/units'
import type { FieldValues } from '@/quick-check/case-input'
import type { FieldId } from '@/quick-check/fields'

/** What acts on a section or keeps it, each folded to one line while it does not matter. */
export const PART_IDS = ['waves', 'current', 'debris', 'air', 'dry', 'edge', 'bends'] as const
export type PartId = (typeof PART_IDS)[number]

/** What a part is worked out from. */
export interface PartInput {
  readonly section: SectionCase
  readonly evaluation: SectionEvaluation
  /** Fields that leave the verdict alone. */
  readonly values: FieldValues
}

/** One figure of an opened part. */
export interface PartRow {
  readonly name: Message
  readonly value: Message
  readonly isWarning?: boolean
}

/** Values that a part has worked out and that one click puts into the case. */
export interface PartProposal {
  readonly label: Message
  readonly values: Partial<FieldValues>
}

/** Controls of the page that a part shows; they are handed in, so that the first page keeps them to itself. */
export interface PartSlots {
  field(props: { readonly id: FieldId }): unknown
  put(props: { readonly proposal: PartProposal }): unknown
  enter(props: { readonly field: FieldId; readonly label: Message }): unknown
}

/** Inputs of a part with what follows from them. */
export interface PartGroup {
  readonly title: Message | null
  readonly fields: readonly FieldId[]
  readonly rows: readonly PartRow[]
  readonly proposal?: PartProposal | null
  /** The first of the inputs that stand elsewhere, and what leads there. */
  readonly entered?: { readonly field: FieldId; readonly label: Message }
  readonly notes: readonly Message[]
}

/** A text with what fills it. */
export function said(key: string, values?: Message['values']): Message {
  return values ? { key, values } : { key }
}

export function quantity(
  value: number,
  kind: QuantityKind,
  rounding?: Quantity['rounding'],
): Quantity {
  return rounding ? { value, kind, rounding } : { value, kind }
}

/** A figure as the value of a row. */
export function figure(
  value: number,
  kind: QuantityKind,
  rounding?: Quantity['rounding'],
): Message {
  return { key: 'sectionDetails.sums.figure', values: { value: quantity(value, kind, rounding) } }
}
