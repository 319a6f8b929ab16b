import { computed, ref, shallowRef, watch } from 'vue'
import type { StationColumn } from '@/line/station-rows'
import type { DecodedText } from '@/survey/decode-text'
import { matchColumns, type ColumnMatch } from '@/survey/match-columns'
import { decimalOf, readStations, type DecimalSign, type LengthUnit } from '@/survey/read-stations'
import { readTable, type Delimiter, type SurveyTable } from '@/survey/read-table'
import { useSurveyFile } from './useSurveyFile'

/** A survey on its way from a file: how it is read, and what comes of it. */
export function useSurveyImport(sectionLength: () => number) {
  const table = shallowRef<SurveyTable | null>(null)
  const delimiter = ref<Delimiter>(',')
  const decimal = ref<DecimalSign>('.')
  const unit = ref<LengthUnit>('m')
  const surface = ref('turf')
  const hasHeading = ref(true)
  const match = shallowRef<ColumnMatch>([])
  const file = useSurveyFile(take)

  function open(chosen: File): Promise<void> {
    table.value = null
    return file.open(chosen)
  }
  function take(read: DecodedText): void {
    const found = readTable(read.text)
    delimiter.value = found.delimiter
    look(found)
  }
  function look(found: SurveyTable): void {
    table.value = found
    const guess = matchColumns(found)
    hasHeading.value = guess.hasHeading
    match.value = guess.match
    decimal.value = decimalOf(found)
  }
  watch(delimiter, (sign) => {
    const { decoded } = file
    if (decoded.value && table.value?.delimiter !== sign) look(readTable(decoded.value.text, sign))
  })

  /** A column of the survey stands in one column of the file. */
  function setColumn(index: number, column: StationColumn | null): void {
    match.value = match.value.map((before, i) =>
      i === index ? column : before === column ? null : before,
    )
  }

  const result = computed(() => {
    if (!table.value) return null
    const how = { hasHeading: hasHeading.value, match: match.value, surface: surface.value }
    const signs = { decimal: decimal.value, unit: unit.value }
    return readStations(table.value, { ...how, ...signs }, sectionLength())
  })

  const choices = { delimiter, decimal, unit, surface, hasHeading, match }
  return { file, table, ...choices, result, open, setColumn }
}

export type SurveyImport = ReturnType<typeof useSurveyImport>
