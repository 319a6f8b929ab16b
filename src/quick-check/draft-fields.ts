import { shallowRef, type ShallowRef } from 'vue'
import { INITIAL_VALUES, type AddressContent, type RefusedEntry } from './address'
import type { CaseInput, FieldValues } from './case-input'
import { INITIAL_CHOICES, type Choices } from './choices'
import { fieldFaults, type ReadValues } from './field-faults'
import type { FieldState } from './field-text'
import { FIELD_IDS, fieldOf, type FieldId } from './fields'

/** The section itself, or what comes before the water: a fault in one leaves the other alone. */
export type Group = 'section' | 'before'

export type DraftFields = Readonly<Record<FieldId, ShallowRef<FieldState>>>

export function groupOf(id: FieldId): Group {
  return fieldOf(id).group ?? 'section'
}

/** One ref per field, so that only what shows a field follows it. */
export function draftFields({ values, refused }: AddressContent): DraftFields {
  return Object.fromEntries(
    FIELD_IDS.map((id) => [id, shallowRef(startState(values[id], refused[id]))]),
  ) as DraftFields
}

/** State of a field that an address describes. */
export function startState(value: number | null, refused: RefusedEntry | undefined): FieldState {
  if (typeof refused === 'number') return { typed: null, value: refused }
  if (refused === undefined) return { typed: null, value }
  return { typed: refused, value: refused.trim() === '' ? null : undefined }
}

/** Values of one group; the other one stands at its defaults, so that nothing here depends on it. */
export function readGroup(fields: DraftFields, group: Group): ReadValues {
  return Object.fromEntries(
    FIELD_IDS.map((id) => [
      id,
      groupOf(id) === group ? fields[id].value.value : INITIAL_VALUES[id],
    ]),
  ) as ReadValues
}

/** What stands in for the last valid input before there was one. */
export function firstValid({ values, choices }: CaseInput, group: Group): CaseInput {
  const isSound = fieldFaults({ values, choices }, group).length === 0
  return isSound ? { values, choices } : { values: INITIAL_VALUES, choices: INITIAL_CHOICES }
}

/** The draft as an address tells it: accepted values, and what is refused as it was typed. */
export function draftContent(
  fields: DraftFields,
  choices: Choices,
  accepted: { readonly section: CaseInput; readonly before: FieldValues },
): AddressContent {
  const values = { ...INITIAL_VALUES } as Record<FieldId, number | null>
  const refused: Partial<Record<FieldId, RefusedEntry>> = {}
  for (const id of FIELD_IDS) {
    const { typed, value } = fields[id].value
    const last = (groupOf(id) === 'before' ? accepted.before : accepted.section.values)[id]
    values[id] = last
    if (value === last) continue
    if (typeof value === 'number' && Number.isFinite(value)) refused[id] = value
    else refused[id] = typed ?? ''
  }
  return { values, choices, refused }
}
