import { useQuery } from '@tanstack/vue-query'
import { computed, toValue, type MaybeRefOrGetter } from 'vue'
import { dayTime } from '@shared/forecast/project-time'
import { restState, type RestState } from '@shared/forecast/rests-on'
import type { RestingForecast } from '@shared/schemas/forecast'
import { fetchNewestForecasts } from '@/api/event-forecast'
import { useWords } from './useWords'

interface NewestIssues {
  readonly projectId: MaybeRefOrGetter<string>
  /** IANA name; times are printed in it. */
  readonly timeZone: MaybeRefOrGetter<string>
  /** False while nothing on the page could rest on one. */
  readonly isNeeded: MaybeRefOrGetter<boolean>
}

/** The newest issue of each gauge of a project, and whether what rests on one is still the newest. */
export function useNewestIssues({ projectId, timeZone, isNeeded }: NewestIssues) {
  const { t } = useWords()
  const query = useQuery({
    queryKey: computed(() => ['forecasts', toValue(projectId), 'newest']),
    queryFn: ({ signal }) => fetchNewestForecasts(toValue(projectId), signal),
    enabled: computed(() => toValue(isNeeded)),
  })
  const issues = computed(() => query.data.value ?? [])
  const newestOf = (gaugeId: string) => issues.value.find((issue) => issue.gaugeId === gaugeId)

  /** State of what rests on an issue; null where it rests on none, or that is not known yet. */
  function stateOf(resting: RestingForecast | null | undefined): RestState | null {
    if (!resting || !query.data.value) return null
    return restState(resting, newestOf(resting.gaugeId))
  }

  const day = (moment: number) => dayTime(moment, toValue(timeZone))
  /** "Rests on the issue of Mon 21:45; a newer one of Mon 23:10 is there." */
  function restWords(resting: RestingForecast): string {
    const state = stateOf(resting)
    const at = day(resting.issuedAt)
    const band = t(`forecast.rests.band.${resting.band}`)
    if (state === null || state === 'current') return t('forecast.rests.current', { at, band })
    const newest = newestOf(resting.gaugeId)
    return t(`forecast.rests.${state}`, { at, newer: newest ? day(newest.issuedAt) : '' })
  }

  return { issues, newestOf, stateOf, restWords, day }
}
