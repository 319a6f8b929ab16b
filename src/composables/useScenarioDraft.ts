import { computed, shallowReadonly, shallowRef, watch, type Ref } from 'vue'
import type { ScenarioContent } from '@shared/schemas/scenario'
import type { UnitSystem } from '@shared/units'
import { inputAtPlace, withInputAtPlace } from '@/scenario/place-input'
import { placeOnLine, type PlaceOnLine, type SurveyedLine } from '@/scenario/place-on-line'
import type { ScenarioState } from '@/scenario/scenario-state'
import type { CaseInput, FieldValues } from '@/quick-check/case-input'
import { groupOf } from '@/quick-check/draft-fields'
import { FIELD_IDS } from '@/quick-check/fields'
import { useCaseDraft } from './useCaseDraft'
import { useStepHistory } from './useStepHistory'
import type { TubeBook } from '@/scenario/tube-book'

export interface ScenarioDraftParts {
  readonly line: Readonly<Ref<SurveyedLine>>
  readonly initial: ScenarioState
  readonly units: Ref<UnitSystem>
  readonly tubes: TubeBook
  readonly isReadonly: Readonly<Ref<boolean>>
  readonly now?: () => number
}

/**
 * A scenario in the hands of a person: its state with every step, the place that is looked at, and
 * the fields of the panels at that place. Panels change the state, and the state changes the panels,
 * whoever changed it.
 */
export function useScenarioDraft(parts: ScenarioDraftParts) {
  const { line, initial, units, tubes, isReadonly, now } = parts
  const history = useStepHistory<ScenarioState>(initial, now)
  const state = history.present
  const content = computed(() => state.value.content)
  const towards = shallowRef<{ readonly from: number; readonly to: number }>()
  const place = computed<PlaceOnLine>(() =>
    placeOnLine(line.value, content.value, content.value.place, towards.value),
  )
  const start = inputAtPlace(content.value, place.value)
  const fields = useCaseDraft({ ...start, refused: {} }, units, isReadonly)

  function changeState(change: Partial<ScenarioState>, kind: string): void {
    history.change({ ...state.value, ...change }, kind)
  }
  function change(next: Partial<ScenarioContent>, kind: string): void {
    changeState({ content: { ...content.value, ...next } }, kind)
  }

  // Panels → scenario: the last input without a fault.
  watch(fields.valid, (input) => {
    const next = withInputAtPlace(content.value, place.value, input, tubes)
    if (next !== content.value) changeState({ content: next }, changedFields(content.value, next))
  })
  // Scenario → panels: another place, an undone step, somebody else's version.
  let shown = start
  watch(place, (next, before) => {
    const input = inputAtPlace(content.value, next)
    if (isElsewhere(next, before)) fields.setValues(valuesOfSection(input))
    fields.take(input, shown)
    shown = input
  })

  /** Looks at another chainage; where two sections meet, at the one that is named. */
  function lookAt(chainage: number, section?: { from: number; to: number }): void {
    towards.value = section
    change({ place: Number(chainage.toFixed(3)) }, 'place')
  }

  return {
    state,
    content,
    place,
    fields,
    history,
    change,
    changeState,
    lookAt,
    towards: shallowReadonly(towards),
  }
}

export type ScenarioDraft = ReturnType<typeof useScenarioDraft>

/** Another section or another ground: what was being typed belonged to the place before. */
function isElsewhere(a: PlaceOnLine, b: PlaceOnLine): boolean {
  return a.section.from !== b.section.from || a.surface !== b.surface
}

/** Everything but what comes before the water, which no place knows of. */
function valuesOfSection({ values }: CaseInput): Partial<FieldValues> {
  const ids = FIELD_IDS.filter((id) => groupOf(id) === 'section')
  return Object.fromEntries(ids.map((id) => [id, values[id]]))
}

/** Names what differs, so that typing one figure is one step. */
function changedFields(a: ScenarioContent, b: ScenarioContent): string {
  return Object.keys(b)
    .filter((key) => a[key as keyof ScenarioContent] !== b[key as keyof ScenarioContent])
    .join()
}
