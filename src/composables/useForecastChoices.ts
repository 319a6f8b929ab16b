import { ref, shallowRef } from 'vue'
import { matchForecastColumns, type ForecastMatch } from '@/forecast/forecast-columns'
import type { LevelRole, LevelUnit } from '@/forecast/forecast-rows'
import type { DateOrder } from '@/forecast/read-moment'
import { guessedRoles } from '@/forecast/read-series'
import {
  looksLikeXml,
  readWaterml,
  type WaterFault,
  type WaterSeries,
} from '@/forecast/read-waterml'
import { decimalOf } from '@/survey/read-stations'
import { readTable, type Delimiter, type SurveyTable } from '@/survey/read-table'

/** What a text is, a table or series, and how it is to be read; first as it looks. */
export function useForecastChoices() {
  const table = shallowRef<SurveyTable | null>(null)
  const series = shallowRef<readonly WaterSeries[] | null>(null)
  const refused = ref<WaterFault | null>(null)
  const delimiter = ref<Delimiter>(';')
  const decimal = ref<'.' | ','>('.')
  const unit = ref<LevelUnit>('m')
  /** Of times without an offset; empty until somebody says it. */
  const zone = ref('')
  const dateOrder = ref<DateOrder>('dmy')
  const hasHeading = ref(true)
  const match = shallowRef<ForecastMatch>([])
  const roles = shallowRef<readonly (LevelRole | null)[]>([])

  function forget(): void {
    table.value = null
    series.value = null
    refused.value = null
  }
  function look(text: string): void {
    forget()
    if (text.trim() === '') return
    if (looksLikeXml(text)) lookAtXml(text)
    else lookAt(readTable(text))
  }
  function lookAtXml(text: string): void {
    const read = readWaterml(text)
    if (typeof read === 'string') {
      refused.value = read
      return
    }
    series.value = read
    roles.value = guessedRoles(read)
  }
  function lookAt(found: SurveyTable): void {
    table.value = found
    delimiter.value = found.delimiter
    const guess = matchForecastColumns(found)
    hasHeading.value = guess.hasHeading
    match.value = guess.match
    decimal.value = decimalOf(found)
  }

  const read = { table, series, refused }
  const how = { delimiter, decimal, unit, zone, dateOrder, hasHeading, match, roles }
  return { ...read, ...how, forget, look, lookAt }
}

export type ForecastChoices = ReturnType<typeof useForecastChoices>
