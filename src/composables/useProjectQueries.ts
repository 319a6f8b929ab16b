import { useQuery } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { fetchProjectStore } from '@/api/depots'
import { fetchGauges } from '@/api/gauges'
import { fetchLine, type LineRef } from '@/api/lines'
import { fetchProject } from '@/api/projects'
import { fetchScenario, type ScenarioRef } from '@/api/scenarios'

/** What several pages ask for under one key, so that it is loaded once. */
export function useProject(projectId: MaybeRefOrGetter<string>) {
  return useQuery({
    queryKey: computed(() => ['project', toValue(projectId)]),
    queryFn: ({ signal }) => fetchProject(toValue(projectId), signal),
  })
}

/** Depots that count in a project; they change seldom. */
export function useProjectStore(projectId: MaybeRefOrGetter<string>) {
  return useQuery({
    queryKey: computed(() => ['store', toValue(projectId)]),
    queryFn: ({ signal }) => fetchProjectStore(toValue(projectId), signal),
  })
}

export function useGauges(projectId: MaybeRefOrGetter<string>) {
  return useQuery({
    queryKey: computed(() => ['gauges', toValue(projectId)]),
    queryFn: ({ signal }) => fetchGauges(toValue(projectId), signal),
  })
}

export function useLine(line: MaybeRefOrGetter<LineRef>) {
  return useQuery({
    queryKey: computed(() => ['line', toValue(line).lineId]),
    queryFn: ({ signal }) => fetchLine(toValue(line), signal),
  })
}

export function useScenario(scenario: MaybeRefOrGetter<ScenarioRef>) {
  return useQuery({
    queryKey: computed(() => ['scenario', toValue(scenario).scenarioId]),
    queryFn: ({ signal }) => fetchScenario(toValue(scenario), signal),
  })
}
