import { useQuery } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { restState } from '@shared/forecast/rests-on'
import { wholeSeries } from '@shared/forecast/whole-series'
import { bandsFrom } from '@shared/checks/line-event/event-of-scenario'
import type { BandSeries } from '@shared/checks/line-event/line-event-input'
import type { RestingForecast } from '@shared/schemas/forecast'
import { fetchNewestForecasts } from '@/api/event-forecast'
import { fetchForecastIssue } from '@/api/forecast-issue'

/** The forecast issue that a scenario rests on, and whether a newer one is there. */
export function useRestingForecast(
  projectId: string,
  resting: MaybeRefOrGetter<RestingForecast | null>,
) {
  const issue = useQuery({
    queryKey: computed(() => ['forecast', toValue(resting)?.forecastId ?? null]),
    queryFn: ({ signal }) => fetchForecastIssue(projectId, toValue(resting)!, signal),
    enabled: computed(() => toValue(resting) !== null),
  })
  const newest = useQuery({
    queryKey: ['forecasts', projectId, 'newest'],
    queryFn: ({ signal }) => fetchNewestForecasts(projectId, signal),
  })
  const state = computed(() => {
    const at = toValue(resting)
    if (!at || !newest.data.value) return null
    return restState(
      at,
      newest.data.value.find(({ gaugeId }) => gaugeId === at.gaugeId),
    )
  })
  const water = computed<BandSeries | null>(() => {
    const forecast = issue.data.value
    return forecast ? bandsFrom((band) => wholeSeries(forecast, band)) : null
  })

  return { issue, newest, state, water }
}
