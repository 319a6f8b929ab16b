import { computed, ref, watch } from 'vue'
import type { ForecastColumn } from '@/forecast/forecast-columns'
import type { LevelRole } from '@/forecast/forecast-rows'
import { readForecastTable } from '@/forecast/read-forecast-table'
import { hasOffset, isUnclearDate } from '@/forecast/read-moment'
import { readSeries } from '@/forecast/read-series'
import { readTable } from '@/survey/read-table'
import { useForecastChoices, type ForecastChoices } from './useForecastChoices'
import { useSurveyFile } from './useSurveyFile'

/** A forecast on its way from a file or from typed rows: how it is read, and what comes of it. */
export function useForecastImport(timeZone: () => string) {
  const text = ref('')
  const choices = useForecastChoices()
  const { table, delimiter, match, roles } = choices
  const file = useSurveyFile((read) => take(read.text))

  function open(chosen: File): Promise<void> {
    choices.forget()
    return file.open(chosen)
  }
  function take(content: string): void {
    text.value = content
    choices.look(content)
  }
  watch(delimiter, (sign) => {
    if (table.value && table.value.delimiter !== sign) choices.lookAt(readTable(text.value, sign))
  })

  /** A column of a forecast stands in one column of the file. */
  function setColumn(index: number, column: ForecastColumn | null): void {
    match.value = only(match.value, index, column)
  }
  function setRole(index: number, role: LevelRole | null): void {
    roles.value = only(roles.value, index, role)
  }

  const result = computed(() => readAs(choices))
  return { file, ...choices, ...asked(choices, timeZone), result, open, take, setColumn, setRole }
}

export type ForecastImport = ReturnType<typeof useForecastImport>

/** The list with something at one place, and nowhere else. */
function only<Kind>(list: readonly (Kind | null)[], index: number, chosen: Kind | null) {
  return list.map((before, i) => (i === index ? chosen : before === chosen ? null : before))
}

function readAs(choices: ForecastChoices) {
  const { table, series, roles, hasHeading, match, decimal, unit, zone, dateOrder } = choices
  const how = { zone: zone.value, dateOrder: dateOrder.value }
  if (series.value) return readSeries(series.value, roles.value, unit.value, how)
  if (!table.value) return null
  const columns = { hasHeading: hasHeading.value, match: match.value }
  const signs = { decimal: decimal.value, unit: unit.value }
  return readForecastTable(table.value, { ...columns, ...signs, ...how })
}

/** What the times of the file leave open. */
function asked({ table, series, match }: ForecastChoices, timeZone: () => string) {
  const times = computed(() => {
    if (series.value) return series.value.flatMap(({ points }) => points[0]?.time ?? [])
    const [day, clock] = [match.value.indexOf('time'), match.value.indexOf('clock')]
    const cellsOf = (cells: readonly string[]) => `${cells[day] ?? ''} ${cells[clock] ?? ''}`.trim()
    return table.value?.rows.slice(0, 4).map(({ cells }) => cellsOf(cells)) ?? []
  })
  const needsZone = computed(() => times.value.some((time) => /\d/.test(time) && !hasOffset(time)))
  const needsOrder = computed(() => times.value.some(isUnclearDate))
  const zones = computed(() => [
    ...new Set([timeZone(), 'UTC']),
    ...Array.from({ length: 27 }, (_, i) => {
      const hours = i - 12
      return `${hours < 0 ? '-' : '+'}${String(Math.abs(hours)).padStart(2, '0')}:00`
    }),
  ])
  return { needsZone, needsOrder, zones }
}
