import type { Station } from '@shared/schemas/line'
import type { UnitSystem } from '@shared/units'
import { fieldText, readTyped, type FieldState } from '@/quick-check/field-text'

/** Columns of a survey that hold numbers, in the order in which they are pasted. */
export const NUMBER_COLUMNS = ['chainage', 'x', 'y', 'groundLevel', 'clearWidth'] as const
export type NumberColumn = (typeof NUMBER_COLUMNS)[number]

/** All columns of a survey, in the order of the demonstration tables. */
export const STATION_COLUMNS = [
  'chainage',
  'x',
  'y',
  'groundLevel',
  'surface',
  'clearWidth',
  'note',
] as const
export type StationColumn = (typeof STATION_COLUMNS)[number]

/** Columns that may be left empty. */
const OPTIONAL: readonly StationColumn[] = ['x', 'y', 'clearWidth', 'note']

/** A station as it is typed: numbers as fields, so that nothing typed is lost. */
export interface StationRow {
  /** Stays the same while the row is moved and edited. */
  readonly key: number
  readonly numbers: Readonly<Record<NumberColumn, FieldState>>
  readonly surface: string
  readonly note: string
}

/** Why a cell is refused, before the server is asked. */
export type CellFault = 'empty' | 'text'

export interface CellProblem {
  readonly row: number
  readonly column: StationColumn
  readonly reason: CellFault
}

export function isNumberColumn(column: StationColumn): column is NumberColumn {
  return (NUMBER_COLUMNS as readonly string[]).includes(column)
}

/** Rows of stations that are stored. */
export function rowsOf(stations: readonly Station[], firstKey = 0): readonly StationRow[] {
  return stations.map((station, i) => ({
    key: firstKey + i,
    numbers: Object.fromEntries(
      NUMBER_COLUMNS.map((column) => [column, { typed: null, value: station[column] }]),
    ) as StationRow['numbers'],
    surface: station.surface,
    note: station.note,
  }))
}

/** A row without figures; it goes on with the surface of the row before. */
export function emptyRow(key: number, surface: string): StationRow {
  const empty: FieldState = { typed: null, value: null }
  const numbers = Object.fromEntries(NUMBER_COLUMNS.map((column) => [column, empty]))
  return { key, numbers: numbers as StationRow['numbers'], surface, note: '' }
}

/** The row with one cell typed anew. */
export function withCell(
  row: StationRow,
  column: StationColumn,
  text: string,
  units: UnitSystem,
): StationRow {
  if (!isNumberColumn(column)) return { ...row, [column]: text }
  return { ...row, numbers: { ...row.numbers, [column]: readTyped(text, 'length', units) } }
}

/** What a cell shows. */
export function cellText(row: StationRow, column: StationColumn, units: UnitSystem): string {
  if (!isNumberColumn(column)) return row[column]
  const { typed, value } = row.numbers[column]
  if (typed !== null) return typed
  return typeof value === 'number' ? fieldText(value, 'length', units) : ''
}

/** Cells that no station can be made of. */
export function cellProblems(rows: readonly StationRow[]): readonly CellProblem[] {
  return rows.flatMap((row, i) =>
    STATION_COLUMNS.flatMap((column): CellProblem[] => {
      const reason = cellFault(row, column)
      return reason ? [{ row: i, column, reason }] : []
    }),
  )
}

function cellFault(row: StationRow, column: StationColumn): CellFault | null {
  if (!isNumberColumn(column)) {
    return OPTIONAL.includes(column) || row[column].trim() !== '' ? null : 'empty'
  }
  const { value } = row.numbers[column]
  if (value === undefined) return 'text'
  return value === null && !OPTIONAL.includes(column) ? 'empty' : null
}

/** The stations of rows without a refused cell. */
export function stationsOf(rows: readonly StationRow[]): readonly Station[] {
  return rows.map(({ numbers, surface, note }) => ({
    chainage: numbers.chainage.value ?? 0,
    x: numbers.x.value ?? null,
    y: numbers.y.value ?? null,
    groundLevel: numbers.groundLevel.value ?? 0,
    surface: surface.trim(),
    clearWidth: numbers.clearWidth.value ?? null,
    note: note.trim(),
  }))
}

/** The cell that a fault of the server names: "stations[3].groundLevel". */
export function cellOfPath(path: string): { row: number; column: StationColumn } | null {
  const [, row, column] = /stations\[(\d+)\]\.(\w+)/.exec(path) ?? []
  const known = STATION_COLUMNS.find((candidate) => candidate === column)
  return row === undefined || !known ? null : { row: Number(row), column: known }
}
