import { useQuery, useQueryClient } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { fetchForecast, fetchForecasts, type GaugeRef } from '@/api/forecasts'

/** All issues of a gauge, the newest first. */
export function useForecasts(gauge: MaybeRefOrGetter<GaugeRef>) {
  return useQuery({
    queryKey: computed(() => {
      const { projectId, gaugeId } = toValue(gauge)
      return ['forecasts', projectId, gaugeId]
    }),
    queryFn: ({ signal }) => fetchForecasts(toValue(gauge), signal),
  })
}

/** One issue with its readings. */
export function useForecast(
  gauge: MaybeRefOrGetter<GaugeRef>,
  forecastId: MaybeRefOrGetter<string | null>,
) {
  return useQuery({
    queryKey: computed(() => ['forecast', toValue(forecastId)]),
    queryFn: ({ signal }) => fetchForecast(toValue(gauge), toValue(forecastId)!, signal),
    enabled: computed(() => toValue(forecastId) !== null),
  })
}

/** Lets everything that shows forecasts of a project ask anew. */
export function useForgetForecasts() {
  const queries = useQueryClient()
  return (projectId: string): void => {
    void queries.invalidateQueries({ queryKey: ['forecasts', projectId] })
    void queries.invalidateQueries({ queryKey: ['forecast'] })
  }
}
