import { computed } from 'vue'
import { useLine, useProject, useScenario } from './useProjectQueries'

/** Where a scenario is found: what the address of its pages says. */
export interface ScenarioPlace {
  readonly projectId: string
  readonly lineId: string
  readonly scenarioId: string
}

/** A scenario with its line and its project, as each of its pages needs them before it can begin. */
export function useLoadedScenario(place: ScenarioPlace) {
  const project = useProject(() => place.projectId)
  const line = useLine(() => place)
  const scenario = useScenario(() => place)
  const loaded = computed(() =>
    project.data.value && line.data.value && scenario.data.value
      ? { project: project.data.value, line: line.data.value, scenario: scenario.data.value }
      : null,
  )
  const error = computed(() => project.error.value ?? line.error.value ?? scenario.error.value)
  /** True until everything is there, for whoever only reads, and for what was put away. */
  const isReadonly = computed(() => {
    if (!loaded.value) return true
    const { project: of, line: on, scenario: it } = loaded.value
    const isPutAway = [of, on, it].some(({ archivedAt }) => archivedAt !== null)
    return of.myRole === 'reader' || isPutAway
  })

  function retry(): void {
    for (const query of [project, line, scenario]) void query.refetch()
  }

  return { loaded, error, isReadonly, retry }
}
