import { computed, inject, provide, shallowRef, watch, type InjectionKey, type Ref } from 'vue'
import { BARRIERS, type CatalogueBarrier } from '@shared/catalogue/barriers'
import { GROUNDS } from '@shared/catalogue/grounds'
import type { UnitSystem } from '@shared/units'
import type { AddressContent } from '@/quick-check/address'
import {
  changeForDepth,
  changeForMode,
  type CaseInput,
  type FieldValues,
} from '@/quick-check/case-input'
import { CHOICE_IDS, type ChoiceId, type Choices, OWN_SURFACE } from '@/quick-check/choices'
import {
  draftContent,
  draftFields,
  firstValid,
  readGroup,
  startState,
  type DraftFields,
} from '@/quick-check/draft-fields'
import { fieldFaults, type FieldFault, type FormInput } from '@/quick-check/field-faults'
import { readTyped, shownText, stepped } from '@/quick-check/field-text'
import { FIELD_IDS, FIELDS, type FieldId } from '@/quick-check/fields'
import { surfaceFigures } from '@/quick-check/surface'
import { TUBE_FIELDS } from '@/quick-check/tube'

/** Every field and choice of one Quick check, what is wrong with them, and the last input without a fault. */
export function useCaseDraft(
  start: AddressContent,
  units: Ref<UnitSystem>,
  isReadonly: Readonly<Ref<boolean>> = shallowRef(false),
) {
  const fields = draftFields(start)
  const choices = shallowRef<Choices>(start.choices)

  const section = computed<FormInput>(() => ({
    values: readGroup(fields, 'section'),
    choices: choices.value,
  }))
  const before = computed<FormInput>(() => ({
    values: readGroup(fields, 'before'),
    choices: start.choices,
  }))
  const sectionFaults = computed(() => fieldFaults(section.value, 'section'))
  const beforeFaults = computed(() => fieldFaults(before.value, 'before'))

  const valid = computed<CaseInput>((last) =>
    sectionFaults.value.length === 0
      ? (section.value as CaseInput)
      : withoutSkirtIfOff(last ?? firstValid(start, 'section'), section.value),
  )
  const validBefore = computed<FieldValues>((last) =>
    beforeFaults.value.length === 0
      ? (before.value.values as FieldValues)
      : (last ?? firstValid(start, 'before').values),
  )
  /** The same map as long as nothing is wrong, so that a drag does not wake every field. */
  const faults = computed<ReadonlyMap<FieldId, FieldFault>>((last) => {
    const all = [...sectionFaults.value, ...beforeFaults.value]
    return all.length === 0 && last?.size === 0 ? last : new Map(all.map((f) => [f.field, f]))
  })
  watch(units, () => forgetTyped(fields), { flush: 'sync' })

  return {
    isReadonly,
    choices,
    valid,
    validBefore,
    sectionFaults,
    beforeFaults,
    faultOf: (id: FieldId) => faults.value.get(id) ?? null,
    textOf: (id: FieldId) => shownText(fields[id].value, FIELDS[id].kind, units.value),
    valueOf: (id: FieldId) => fields[id].value.value,
    content: computed(() =>
      draftContent(fields, choices.value, { section: valid.value, before: validBefore.value }),
    ),
    ...draftActions(fields, choices, { units, valid }),
  }
}

export type CaseDraft = ReturnType<typeof useCaseDraft>

/**
 * The last valid input stands while another field is wrong, but not with a skirt that is already
 * off: then nothing on the page may say that the barrier holds.
 */
function withoutSkirtIfOff(last: CaseInput, { values }: FormInput): CaseInput {
  if (values.skirtLength !== 0 || last.values.skirtLength === 0) return last
  return { ...last, values: { ...last.values, skirtLength: 0 } }
}

interface DraftContext {
  readonly units: Ref<UnitSystem>
  readonly valid: Ref<CaseInput>
}

function draftActions(fields: DraftFields, choices: Ref<Choices>, context: DraftContext) {
  const { units, valid } = context

  function type(id: FieldId, text: string): void {
    fields[id].value = readTyped(text, FIELDS[id].kind, units.value)
  }

  function setValues(values: Partial<FieldValues>): void {
    for (const [id, value] of Object.entries(values) as [FieldId, number | null][])
      fields[id].value = { typed: null, value }
  }

  /** Arrow keys in a field: one digit of what is shown; an unreadable entry stays as it is. */
  function step(id: FieldId, direction: 1 | -1): void {
    const next = stepped(fields[id].value, direction, FIELDS[id].kind, units.value)
    if (next !== null) type(id, next)
  }

  function setDepth(depth: number): void {
    setValues(changeForDepth(valid.value, depth))
  }

  /** Changes a choice; another way of entering the water keeps the water where it is. */
  function choose<K extends ChoiceId>(id: K, option: Choices[K]): void {
    const next = { ...choices.value, [id]: option }
    if (id === 'waterMode') setValues(changeForMode(valid.value, next.waterMode))
    choices.value = next
    if (id === 'surface') layOn(option)
    if (id === 'suitable' && option === 'yes') choices.value = judgedByUser(choices.value)
  }

  function layOn(surface: string): void {
    const figures = surfaceFigures(surface)
    if (!figures) return
    setValues(figures.values)
    choices.value = { ...choices.value, suitable: figures.suitable }
  }

  function takeTube(tube: string): void {
    const barrier = BARRIERS.find(({ id }) => id === tube)
    if (!barrier) return
    setValues(figuresOf(barrier))
  }

  /** Follows a change that was made elsewhere; what is being typed in other fields stays. */
  function take(next: CaseInput, before: CaseInput): void {
    const changed = differingValues(before.values, next.values)
    const isNews = ([id, value]: [string, unknown]) => fields[id as FieldId].value.value !== value
    setValues(Object.fromEntries(Object.entries(changed).filter(isNews)))
    if (!isSameChoice(before.choices, next.choices)) choices.value = next.choices
  }

  function load({ values, choices: chosen, refused }: AddressContent): void {
    choices.value = chosen
    for (const id of FIELD_IDS) fields[id].value = startState(values[id], refused[id])
  }

  return { type, step, setValues, setDepth, choose, takeTube, take, load }
}

function differingValues(from: FieldValues, to: FieldValues): Partial<FieldValues> {
  const changed = FIELD_IDS.filter((id) => to[id] !== from[id])
  return Object.fromEntries(changed.map((id) => [id, to[id]]))
}

function isSameChoice(from: Choices, to: Choices): boolean {
  return CHOICE_IDS.every((id) => from[id] === to[id])
}

/** In other units a typed figure would mean something else: it is shown converted. A text stays as it is. */
function forgetTyped(fields: DraftFields): void {
  for (const field of Object.values(fields)) {
    const { typed, value } = field.value
    if (typed !== null && typeof value === 'number' && Number.isFinite(value))
      field.value = { typed: null, value }
  }
}

/** Figures of a catalogue tube, by field. */
function figuresOf(barrier: CatalogueBarrier): Partial<FieldValues> {
  return Object.fromEntries(TUBE_FIELDS.map((id) => [id, barrier[id]]))
}

const KEY: InjectionKey<CaseDraft> = Symbol('case draft')

export function provideCaseDraft(draft: CaseDraft): void {
  provide(KEY, draft)
}

/** The draft that the view provides. */
export function injectCaseDraft(): CaseDraft {
  const draft = inject(KEY)
  if (!draft) throw new Error('No case draft above this component')
  return draft
}

/** A ground that the catalogue calls unsuitable can only be judged otherwise as another surface. */
function judgedByUser(choices: Choices): Choices {
  const ground = GROUNDS.find(({ id }) => id === choices.surface)
  return ground && !ground.isSuitable ? { ...choices, surface: OWN_SURFACE } : choices
}
