import { computed, ref, shallowRef, watch } from 'vue'
import {
  matchForecastColumns,
  type ForecastColumn,
  type ForecastMatch,
} from '@/forecast/forecast-columns'
import type { LevelRole, LevelUnit } from '@/forecast/forecast-rows'
import { readForecastTable } from '@/forecast/read-forecast-table'
import { isUnclearDate, hasOffset, type DateOrder } from '@/forecast/read-moment'
import {
  looksLikeXml,
  readWaterml,
  type WaterFault,
  type WaterSeries,
} from '@/forecast/read-waterml'
import { guessedRoles, readSeries } from '@/forecast/read-series'
import { decimalOf } from '@/survey/read-stations'
import { readTable, type Delimiter, type SurveyTable } from '@/survey/read-table'
import { useSurveyFile } from './useSurveyFile'

/** A forecast on its way from a file or from typed rows: how it is read, and what comes of it. */
export function useForecastImport(timeZone: () => string) {
  const text = ref('')
  const table = shallowRef<SurveyTable | null>(null)
  const series = shallowRef<readonly WaterSeries[] | null>(null)
  const refused = ref<WaterFault | null>(null)
  const delimiter = ref<Delimiter>(';')
  const decimal = ref<'.' | ','>('.')
  const unit = ref<LevelUnit>('m')
  /** Rows that are typed are in the time of the project; those of a file are asked for. */
  const zone = ref('')
  const dateOrder = ref<DateOrder>('dmy')
  const hasHeading = ref(true)
  const match = shallowRef<ForecastMatch>([])
  const roles = shallowRef<readonly (LevelRole | null)[]>([])
  const file = useSurveyFile((read) => take(read.text))

  function open(chosen: File): Promise<void> {
    forget()
    return file.open(chosen)
  }
  function forget(): void {
    table.value = null
    series.value = null
    refused.value = null
  }
  function take(content: string): void {
    forget()
    text.value = content
    if (content.trim() === '') return
    if (looksLikeXml(content)) takeXml(content)
    else look(readTable(content))
  }
  function takeXml(content: string): void {
    const read = readWaterml(content)
    if (typeof read === 'string') {
      refused.value = read
      return
    }
    series.value = read
    roles.value = guessedRoles(read)
    unit.value = read.find((found) => found.unit !== null)?.unit ?? unit.value
  }
  function look(found: SurveyTable): void {
    table.value = found
    delimiter.value = found.delimiter
    const guess = matchForecastColumns(found)
    hasHeading.value = guess.hasHeading
    match.value = guess.match
    decimal.value = decimalOf(found)
  }
  watch(delimiter, (sign) => {
    if (table.value && table.value.delimiter !== sign) look(readTable(text.value, sign))
  })

  /** A column of a forecast stands in one column of the file. */
  function setColumn(index: number, column: ForecastColumn | null): void {
    match.value = match.value.map((before, i) =>
      i === index ? column : before === column ? null : before,
    )
  }
  function setRole(index: number, role: LevelRole | null): void {
    roles.value = roles.value.map((before, i) =>
      i === index ? role : before === role ? null : before,
    )
  }

  const times = computed(() => {
    if (series.value) return series.value.flatMap(({ points }) => points[0]?.time ?? [])
    const column = match.value.indexOf('time')
    return table.value?.rows.slice(1, 4).map(({ cells }) => cells[column] ?? '') ?? []
  })
  const needsZone = computed(() => times.value.some((time) => time !== '' && !hasOffset(time)))
  const needsOrder = computed(() => times.value.some(isUnclearDate))
  const how = computed(() => ({ zone: zone.value, dateOrder: dateOrder.value }))
  const result = computed(() => {
    if (series.value) return readSeries(series.value, roles.value, unit.value, how.value)
    if (!table.value) return null
    const columns = { hasHeading: hasHeading.value, match: match.value }
    const signs = { decimal: decimal.value, unit: unit.value }
    return readForecastTable(table.value, { ...columns, ...signs, ...how.value })
  })
  const zones = computed(() => [
    ...new Set([timeZone(), 'UTC']),
    ...Array.from({ length: 27 }, (_, i) => {
      const hours = i - 12
      return `${hours < 0 ? '-' : '+'}${String(Math.abs(hours)).padStart(2, '0')}:00`
    }),
  ])

  const choices = { delimiter, decimal, unit, zone, dateOrder, hasHeading, match, roles }
  const asked = { needsZone, needsOrder, zones }
  return {
    file,
    table,
    series,
    refused,
    ...choices,
    ...asked,
    result,
    open,
    take,
    setColumn,
    setRole,
  }
}

export type ForecastImport = ReturnType<typeof useForecastImport>
