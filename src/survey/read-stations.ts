import { GROUNDS } from '@shared/catalogue/grounds'
import { MOST_STATIONS, type Station } from '@shared/schemas/line'
import { lineFaults, lineWarnings } from '@shared/schemas/line-faults'
import { FOOT } from '@shared/units'
import { isNumberColumn, type NumberColumn, type StationColumn } from '@/line/station-rows'
import type { ColumnMatch } from './match-columns'
import type { SurveyTable, TableRow } from './read-table'

export type DecimalSign = '.' | ','
export type LengthUnit = 'm' | 'ft'

/** How a table is to be read. */
export interface ReadingChoice {
  readonly hasHeading: boolean
  readonly match: ColumnMatch
  readonly decimal: DecimalSign
  readonly unit: LengthUnit
  /** Surface of rows that name none, for a file without that column. */
  readonly surface: string
}

/** Why a cell, a row or the whole table cannot be taken. */
export type ReadingFaultKind =
  | 'empty'
  | 'text'
  | 'decimal'
  | 'formula'
  | 'thousands'
  | 'long'
  | 'range'
  | 'no-ground'
  | 'no-place'
  | 'half-place'
  | 'one-column'
  | 'no-rows'
  | 'too-many'
  | 'quotes'

/** A fault by line and column of the file; null where it is of the whole file. */
export interface ReadingFault {
  readonly kind: ReadingFaultKind
  readonly line: number | null
  /** Number of the column in the file, from 0. */
  readonly column: number | null
  readonly cell: string
  /** What would be allowed, where the survey itself says so. */
  readonly allowed?: string
}

/** What looks like a slip, by line of the file. */
export interface ReadingWarning {
  readonly line: number | null
  readonly message: string
}

export interface ReadSurvey {
  readonly stations: readonly Station[]
  readonly faults: readonly ReadingFault[]
  readonly warnings: readonly ReadingWarning[]
}

/** Longest texts of a station. */
const MOST_LETTERS = { surface: 40, note: 200 } as const

/** The decimal sign that most numbers of a table have; mixed ones stay faults. */
export function decimalOf(table: SurveyTable): DecimalSign {
  if (table.delimiter === ',') return quotedDecimal(table)
  const cells = table.rows.flatMap(({ cells }) => cells)
  const commas = cells.filter((cell) => /^[-+−]?\d+,\d+$/.test(cell)).length
  const points = cells.filter((cell) => /^[-+−]?\d+\.\d+$/.test(cell)).length
  return commas > points ? ',' : '.'
}

/** With commas between cells a decimal comma needs quotation marks, and then it is in every number. */
function quotedDecimal({ rows }: SurveyTable): DecimalSign {
  const cells = rows.flatMap((row) => row.cells)
  return cells.some((cell) => /^[-+−]?\d+,\d+$/.test(cell)) ? ',' : '.'
}

/**
 * Stations of a table. Every cell that cannot be read is a fault by line and column, and then there is
 * no survey: nothing is guessed, nothing is left out in silence.
 */
export function readStations(
  table: SurveyTable,
  choice: ReadingChoice,
  sectionLength: number,
): ReadSurvey {
  const rows = table.rows.slice(choice.hasHeading ? 1 : 0)
  const whole = wholeFaults(table, rows, choice)
  if (whole.length > 0) return { stations: [], faults: whole, warnings: [] }
  const faults: ReadingFault[] = []
  const read = rows.map((row) => stationOf(row, choice, (fault) => faults.push(fault)))
  if (faults.length > 0) return { stations: [], faults, warnings: [] }
  const stations = withChainages(read)
  return checked(stations, { rows, choice, sectionLength })
}

function wholeFaults(
  table: SurveyTable,
  rows: readonly TableRow[],
  { match }: ReadingChoice,
): readonly ReadingFault[] {
  const fault = (kind: ReadingFaultKind, cell = '', line: number | null = null) => [
    { kind, line, column: null, cell },
  ]
  if (table.brokenAt !== null) return fault('quotes', '', table.brokenAt)
  if (rows.length === 0) return fault('no-rows')
  if (table.columns < 2) return fault('one-column', table.delimiter)
  if (rows.length > MOST_STATIONS) return fault('too-many', String(rows.length))
  if (!match.includes('groundLevel')) return fault('no-ground')
  if (match.includes('x') !== match.includes('y')) return fault('half-place')
  return match.includes('chainage') || match.includes('x') ? [] : fault('no-place')
}

type Draft = Omit<Station, 'chainage'> & { readonly chainage: number | null }

function stationOf(
  row: TableRow,
  choice: ReadingChoice,
  report: (fault: ReadingFault) => void,
): Draft {
  const indexOf = (column: StationColumn) => choice.match.indexOf(column)
  const cellOf = (column: StationColumn) => row.cells[indexOf(column)] ?? ''
  const number = (column: NumberColumn, isNeeded: boolean): number | null => {
    if (indexOf(column) < 0) return null
    const cell = cellOf(column)
    const value = readNumber(cell, choice)
    if (typeof value === 'number' || (value === null && !isNeeded)) return value
    const kind = value ?? 'empty'
    report({ kind, line: row.line, column: indexOf(column), cell })
    return null
  }
  const text = (column: 'surface' | 'note'): string => {
    const cell = plainCell(cellOf(column))
    if (cell.length <= MOST_LETTERS[column]) return cell
    report({ kind: 'long', line: row.line, column: indexOf(column), cell })
    return ''
  }
  return {
    chainage: number('chainage', true),
    x: number('x', !choice.match.includes('chainage')),
    y: number('y', !choice.match.includes('chainage')),
    groundLevel: number('groundLevel', true) ?? 0,
    surface: knownSurface(text('surface')) || choice.surface,
    clearWidth: number('clearWidth', false),
    note: text('note'),
  }
}

/** A number in metres, nothing, or why it is none. */
function readNumber(
  cell: string,
  { decimal, unit }: ReadingChoice,
): number | null | 'text' | 'decimal' | 'formula' | 'thousands' {
  if (cell === '') return null
  if (/^'?[=@]/.test(cell) || cell.startsWith('#')) return 'formula'
  const plain = cell.replace(/^−/, '-').replace(/[\u00a0\u202f]/g, ' ')
  if (/^[-+]?\d{1,3}([ ',.]\d{3})+[.,]\d+$/.test(plain)) return 'thousands'
  const own = decimal === ',' ? /^[-+]?(\d+(,\d*)?|,\d+)$/ : /^[-+]?(\d+(\.\d*)?|\.\d+)$/
  if (!own.test(plain)) {
    return /^[-+]?\d*[.,]\d+$/.test(plain) ? 'decimal' : 'text'
  }
  const value = Number(plain.replace(',', '.'))
  return unit === 'ft' ? Number((value * FOOT).toFixed(6)) : value
}

/** Our own files put an apostrophe before what a spreadsheet would run; it is taken off again. */
function plainCell(cell: string): string {
  return /^'\s*[=+\-@＝＋－＠]/u.test(cell) ? cell.slice(1) : cell
}

/** "Loose gravel" is `loose-gravel` of the catalogue; what is not known stays as it was written. */
function knownSurface(cell: string): string {
  const id = cell.toLowerCase().replace(/[\s_]+/g, '-')
  return GROUNDS.find((ground) => ground.id === id)?.id ?? cell
}

/** Without a chainage the distances in the grid are added up. */
function withChainages(drafts: readonly Draft[]): Station[] {
  let chainage = 0
  return drafts.map((draft, i) => {
    const before = drafts[i - 1]
    if (before) chainage += Math.hypot(draft.x! - before.x!, draft.y! - before.y!)
    return { ...draft, chainage: draft.chainage ?? Number(chainage.toFixed(3)) }
  })
}

interface Checking {
  readonly rows: readonly TableRow[]
  readonly choice: ReadingChoice
  readonly sectionLength: number
}

/** The rules of a survey, told by line and column of the file. */
function checked(stations: Station[], { rows, choice, sectionLength }: Checking): ReadSurvey {
  const at = (path: string) => {
    const [, row, field] = /stations\[(\d+)\]\.(\w+)/.exec(path) ?? []
    const line = row === undefined ? null : (rows[Number(row)]?.line ?? null)
    const column = choice.match.findIndex((candidate) => candidate === field)
    return { line, column: column < 0 ? null : column, row: Number(row ?? 0), field }
  }
  const faults = lineFaults({ stations, sectionLength }).map((fault): ReadingFault => {
    const { line, column, row } = at(fault.path)
    const cell = column === null ? '' : (rows[row]?.cells[column] ?? '')
    return { kind: 'range', line, column, cell, allowed: fault.allowed }
  })
  if (faults.length > 0) return { stations: [], faults, warnings: [] }
  const known = GROUNDS.map(({ id }) => id)
  const warnings = lineWarnings(stations, known, sectionLength).map(({ path, message }) => ({
    line: at(path).line,
    message: message.startsWith(`${path}: `) ? message.slice(path.length + 2) : message,
  }))
  return { stations, faults: [], warnings }
}

/** True for a column of numbers; the preview sets them right. */
export function isFigureColumn(column: StationColumn | null): boolean {
  return column !== null && isNumberColumn(column)
}
