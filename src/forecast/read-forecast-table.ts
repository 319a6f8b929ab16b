import { isInRange } from '@shared/errors'
import { MOST_FORECAST_READINGS } from '@shared/schemas/forecast'
import { STATION_RANGES } from '@shared/schemas/station-ranges'
import type { SurveyTable, TableRow } from '@/survey/read-table'
import { rolesOf, type ForecastColumn, type ForecastMatch } from './forecast-columns'
import {
  inMetres,
  readingsOf,
  type FileReadings,
  type LevelRow,
  type LevelUnit,
} from './forecast-rows'
import { readMoment, type MomentChoice, type MomentFault } from './read-moment'

/** How a table is to be read. */
export interface TableChoice extends MomentChoice {
  readonly hasHeading: boolean
  readonly match: ForecastMatch
  readonly decimal: '.' | ','
  readonly unit: LevelUnit
}

export type ForecastFaultKind =
  | MomentFault
  | 'moment-twice'
  | 'backwards'
  | 'text'
  | 'decimal'
  | 'formula'
  | 'range'
  | 'band'
  | 'no-time-column'
  | 'no-level-column'
  | 'no-level'
  | 'no-series'
  | 'no-rows'
  | 'one-column'
  | 'too-many'
  | 'quotes'

/** A fault by line and column of the file; null where it is of the whole file. */
export interface ForecastFault {
  readonly kind: ForecastFaultKind
  readonly line: number | null
  readonly column: number | null
  readonly cell: string
}

export interface ReadForecast extends FileReadings {
  readonly faults: readonly ForecastFault[]
}

const LEVEL = STATION_RANGES.groundLevel
const NOTHING = { readings: [], observed: [] }

/**
 * Levels of a table. Each cell that cannot be read is a fault by line and column, and then there is no
 * forecast: nothing is guessed and nothing is left out in silence. An empty level is a gap.
 */
export function readForecastTable(table: SurveyTable, choice: TableChoice): ReadForecast {
  const rows = table.rows.slice(choice.hasHeading ? 1 : 0)
  const whole = wholeFaults(table, rows, choice)
  if (whole.length > 0) return { ...NOTHING, faults: whole }
  const faults: ForecastFault[] = []
  const read = rows.map((row) => rowOf(row, choice, (fault) => faults.push(fault)))
  if (!faults.some(({ kind }) => kind !== 'band')) faults.push(...orderFaults(read, rows, choice))
  if (faults.length > 0) return { ...NOTHING, faults }
  const found = readingsOf(read, rolesOf(choice.match))
  const isEmpty = found.readings.length === 0 && found.observed.length === 0
  return isEmpty ? { ...NOTHING, faults: [fileFault('no-level')] } : { ...found, faults: [] }
}

const fileFault = (kind: ForecastFaultKind, cell = '', line: number | null = null) => ({
  ...{ kind, line, cell },
  column: null,
})

function wholeFaults(
  table: SurveyTable,
  rows: readonly TableRow[],
  { match }: TableChoice,
): readonly ForecastFault[] {
  if (table.brokenAt !== null) return [fileFault('quotes', '', table.brokenAt)]
  if (rows.length === 0) return [fileFault('no-rows')]
  if (table.columns < 2) return [fileFault('one-column', table.delimiter)]
  if (rows.length > MOST_FORECAST_READINGS) return [fileFault('too-many', String(rows.length))]
  if (!match.includes('time')) return [fileFault('no-time-column')]
  const roles = rolesOf(match)
  return roles.includes('expected') || roles.includes('observed')
    ? []
    : [fileFault('no-level-column')]
}

type Report = (fault: ForecastFault) => void

function rowOf(row: TableRow, choice: TableChoice, report: Report): LevelRow {
  const { match } = choice
  const cellOf = (column: ForecastColumn) => row.cells[match.indexOf(column)] ?? ''
  const tell = (kind: ForecastFaultKind, column: ForecastColumn): void => {
    report({ kind, line: row.line, column: match.indexOf(column), cell: cellOf(column) })
  }
  const clock = match.includes('clock') ? ` ${cellOf('clock')}` : ''
  const time = readMoment(`${cellOf('time')}${clock}`, choice)
  if (typeof time === 'string') tell(time, 'time')
  const levels = rolesOf(match).map((role) => {
    const level = readLevel(cellOf(role), choice)
    if (typeof level !== 'string') return [role, level] as const
    tell(level, role)
    return [role, null] as const
  })
  const read: LevelRow = {
    time: typeof time === 'number' ? time : NaN,
    ...Object.fromEntries(levels),
  }
  const { expected = null, low = null, high = null } = read
  if (expected !== null && low !== null && low > expected) tell('band', 'low')
  if (expected !== null && high !== null && high < expected) tell('band', 'high')
  return read
}

/** Words by which files say that there is no value. */
const NO_VALUE = /^(nan|null|n\/a|na|-|–|—)$/i

function readLevel(
  cell: string,
  { decimal, unit }: Pick<TableChoice, 'decimal' | 'unit'>,
): number | null | 'text' | 'decimal' | 'formula' | 'range' {
  if (cell === '' || NO_VALUE.test(cell)) return null
  if (/^'?[=@]/.test(cell) || cell.startsWith('#')) return 'formula'
  const plain = cell.replace(/^−/, '-')
  const own = decimal === ',' ? /^[-+]?(\d+(,\d*)?|,\d+)$/ : /^[-+]?(\d+(\.\d*)?|\.\d+)$/
  if (!own.test(plain)) return /^[-+]?\d*[.,]\d+$/.test(plain) ? 'decimal' : 'text'
  const value = inMetres(Number(plain.replace(',', '.')), unit)
  return isInRange(value, LEVEL) ? value : 'range'
}

/** A moment that is there twice, or goes backwards. */
function orderFaults(
  read: readonly LevelRow[],
  rows: readonly TableRow[],
  { match }: TableChoice,
): ForecastFault[] {
  const column = match.indexOf('time')
  return read.flatMap(({ time }, i) => {
    const before = read[i - 1]?.time
    if (before === undefined || time > before) return []
    const { line, cells } = rows[i]!
    const kind = time === before ? ('moment-twice' as const) : ('backwards' as const)
    return [{ kind, line, column, cell: cells[column] ?? '' }]
  })
}
