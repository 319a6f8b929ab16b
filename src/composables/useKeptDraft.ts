import { onMounted, onUnmounted, watch } from 'vue'
import type { FieldId } from '@/quick-check/fields'
import type { Scenario } from '@shared/schemas/project'
import { draftStore } from '@/scenario/kept-draft'
import { isSameState, stateOf } from '@/scenario/scenario-state'
import type { ScenarioDraft } from './useScenarioDraft'
import type { ScenarioSaving } from './useScenarioSaving'

/**
 * Keeps what is not saved in this window, so that neither a reload nor the end of a session loses it,
 * and brings it back: as a step on the same version, as a collision on a newer one.
 *
 * @returns Whether something was brought back.
 */
export function useKeptDraft(
  scenario: Scenario,
  draft: ScenarioDraft,
  saving: ScenarioSaving,
): boolean {
  const store = draftStore(scenario.id)
  const kept = store.read()
  const isNews = kept !== null && !isSameState(kept.state, stateOf(scenario))
  if (kept && isNews) {
    draft.changeState(kept.state, 'restored')
    if (kept.version !== scenario.version) saving.meet(scenario, kept.state, null)
  }
  if (kept) typeAgain(draft, kept.refused)

  const refused = () => draft.fields.content.value.refused
  const isUnsaved = () => saving.isDirty.value || Object.keys(refused()).length > 0
  function keep(): void {
    if (!isUnsaved()) return store.clear()
    // A collision was made on the version before the one that is there now.
    const version = saving.base.value.version
    store.write({ version, state: draft.state.value, refused: refused() })
  }
  watch([draft.state, saving.isDirty, saving.base, draft.fields.content], keep)

  function warn(event: BeforeUnloadEvent): void {
    if (isUnsaved()) event.preventDefault()
  }
  onMounted(() => window.addEventListener('beforeunload', warn))
  onUnmounted(() => window.removeEventListener('beforeunload', warn))
  return isNews
}

/** Entries that a field had refused stand in it again. */
function typeAgain({ fields }: ScenarioDraft, refused: Readonly<Record<string, unknown>>): void {
  for (const [id, entry] of Object.entries(refused) as [FieldId, unknown][]) {
    if (typeof entry === 'number') fields.setValues({ [id]: entry })
    else fields.type(id, String(entry))
  }
}
