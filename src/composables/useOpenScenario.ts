import { useQueryClient } from '@tanstack/vue-query'
import { storeToRefs } from 'pinia'
import { computed, ref, watch, type Ref } from 'vue'
import { onBeforeRouteLeave } from 'vue-router'
import type { Line, Project, Scenario } from '@shared/schemas/project'
import { scenarioFaults } from '@shared/schemas/scenario-faults'
import { saveScenario, type ScenarioRef } from '@/api/scenarios'
import { stateOf, type ScenarioState } from '@/scenario/scenario-state'
import { useNotices } from '@/stores/notices'
import { usePreferences } from '@/stores/preferences'
import { useKeptDraft } from './useKeptDraft'
import { useScenarioDraft, type ScenarioDraft } from './useScenarioDraft'
import { useScenarioSaving, type ScenarioSaving } from './useScenarioSaving'
import { useTubeBook } from './useTubeBook'
import { useWords } from './useWords'

export interface OpenedScenario {
  readonly project: Project
  readonly line: Line
  readonly scenario: Scenario
  readonly isReadonly: boolean
}

/**
 * A scenario in the hands of a person on a page of its own: every step can be taken back, what is
 * changed is saved by itself, and what somebody else saved is met rather than overwritten.
 */
export function useOpenScenario(props: OpenedScenario) {
  const { t } = useWords()
  const { units } = storeToRefs(usePreferences())
  const notices = useNotices()
  const at: ScenarioRef = {
    projectId: props.project.id,
    lineId: props.line.id,
    scenarioId: props.scenario.id,
  }
  const line = computed(() => props.line)
  const draft = useScenarioDraft({
    line,
    initial: stateOf(props.scenario),
    units,
    tubes: useTubeBook(),
    isReadonly: computed(() => props.isReadonly),
  })
  const faults = computed(() => scenarioFaults(draft.content.value, line.value))
  const saving = savingOf(props, { at, draft, faults })
  if (!props.isReadonly && useKeptDraft(props.scenario, draft, saving)) {
    notices.say(t('scenarioPage.saving.restored'))
  }
  takeLoaded(props, { draft, saving })
  const deciding = decisions(draft, saving)

  onBeforeRouteLeave(async () => {
    if (!props.isReadonly) await saving.saveNow()
    return props.isReadonly || !saving.isDirty.value || window.confirm(t('scenarioPage.leave'))
  })
  const said = computed(() =>
    saving.standing.value === 'refused' ? (saving.problem.value?.message ?? '') : '',
  )

  return { at, draft, faults, saving, said, ...deciding }
}

interface Opened {
  readonly draft: ScenarioDraft
  readonly saving: ScenarioSaving
}

function savingOf(
  props: OpenedScenario,
  parts: {
    readonly at: ScenarioRef
    readonly draft: ScenarioDraft
    readonly faults: Readonly<Ref<readonly unknown[]>>
  },
): ScenarioSaving {
  const queries = useQueryClient()
  const { at, draft, faults } = parts
  return useScenarioSaving({
    initial: props.scenario,
    state: draft.state,
    isSavable: computed(() => faults.value.length === 0 && !props.isReadonly),
    save: (save) => saveScenario(at, save),
    whenSaved: (scenario) => {
      queries.setQueryData(['scenario', scenario.id], scenario)
      void queries.invalidateQueries({ queryKey: ['scenarios', at.lineId], refetchType: 'none' })
      void queries.invalidateQueries({ queryKey: ['desk'], refetchType: 'none' })
    },
  })
}

/** Somebody else's save, loaded while nothing here was unsaved, is taken over as a step. */
function takeLoaded(props: OpenedScenario, { draft, saving }: Opened): void {
  watch(
    () => props.scenario,
    (loaded) => {
      if (loaded.version <= saving.base.value.version || saving.isDirty.value) return
      saving.goOnFrom(loaded)
      draft.changeState(stateOf(loaded), 'loaded')
    },
  )
}

/** What is asked of a person where two versions have met. */
function decisions(draft: ScenarioDraft, saving: ScenarioSaving) {
  const { t } = useWords()
  const notices = useNotices()
  const isDeciding = ref(false)
  watch(
    () => saving.collision.value !== null,
    (hasMet) => (isDeciding.value = hasMet),
    { immediate: true },
  )
  function resolve(merged: ScenarioState): void {
    saving.goOnFrom(saving.collision.value!.current)
    draft.changeState(merged, 'merged')
    isDeciding.value = false
    notices.say(t('scenarioPage.conflict.resolved'))
    void saving.saveNow()
  }
  return { isDeciding, resolve }
}
