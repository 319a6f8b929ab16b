import { GROUNDS } from '@shared/catalogue/grounds'
import type { UnitSystem } from '@shared/units'
import {
  emptyRow,
  STATION_COLUMNS,
  withCell,
  type StationColumn,
  type StationRow,
} from './station-rows'

/** What was pasted: cells in rows, and the columns that a heading named. */
export interface PastedTable {
  readonly cells: readonly (readonly string[])[]
  /** Columns by a heading; null where there was none. */
  readonly columns: readonly (StationColumn | null)[] | null
}

/** Words by which a heading names its column, without signs and capitals. */
const HEADINGS: Readonly<Record<string, StationColumn>> = {
  ch: 'chainage',
  chainage: 'chainage',
  station: 'chainage',
  x: 'x',
  easting: 'x',
  y: 'y',
  northing: 'y',
  ground: 'groundLevel',
  groundlevel: 'groundLevel',
  level: 'groundLevel',
  z: 'groundLevel',
  surface: 'surface',
  clear: 'clearWidth',
  clearwidth: 'clearWidth',
  note: 'note',
  notes: 'note',
  remark: 'note',
}

/** Columns of rows without a heading, by their number. */
const BY_COUNT: Readonly<Record<number, readonly StationColumn[]>> = {
  2: ['chainage', 'groundLevel'],
  3: ['chainage', 'groundLevel', 'surface'],
  4: ['chainage', 'x', 'y', 'groundLevel'],
  5: ['chainage', 'x', 'y', 'groundLevel', 'surface'],
  6: ['chainage', 'x', 'y', 'groundLevel', 'surface', 'clearWidth'],
}

/**
 * Takes a text from a spreadsheet apart. Tabs part cells, else semicolons, else commas; where tabs or
 * semicolons do, a comma is a decimal comma.
 */
export function readPasted(text: string): PastedTable {
  const lines = text.split(/\r?\n/).filter((line) => line.trim() !== '')
  const separator = separatorOf(lines)
  const cells = lines.map((line) => splitCells(line, separator))
  const [head, ...body] = cells
  const columns = head ? headingColumns(head) : null
  return columns ? { cells: body, columns } : { cells, columns: null }
}

function separatorOf(lines: readonly string[]): string {
  if (lines.some((line) => line.includes('\t'))) return '\t'
  return lines.some((line) => line.includes(';')) ? ';' : ','
}

/** Cells may stand in quotation marks, which double inside. */
function splitCells(line: string, separator: string): readonly string[] {
  const cells: string[] = []
  let cell = ''
  let isQuoted = false
  for (let i = 0; i < line.length; i += 1) {
    const sign = line[i]!
    if (sign === '"' && isQuoted && line[i + 1] === '"') {
      cell += sign
      i += 1
    } else if (sign === '"') isQuoted = !isQuoted
    else if (sign === separator && !isQuoted) {
      cells.push(cell.trim())
      cell = ''
    } else cell += sign
  }
  return [...cells, cell.trim()]
}

/** Columns of a first row that is a heading: it names the chainage or the ground and holds no number. */
function headingColumns(head: readonly string[]): readonly (StationColumn | null)[] | null {
  const columns = head.map((cell) => HEADINGS[plainWord(cell)] ?? null)
  const isHeading = columns.includes('chainage') || columns.includes('groundLevel')
  return isHeading && head.every((cell) => !/^[\d.,+-]+$/.test(cell)) ? columns : null
}

function plainWord(cell: string): string {
  return cell
    .toLowerCase()
    .replace(/\(.*?\)|\[.*?\]/g, '')
    .replace(/[^a-z]/g, '')
}

/** Which columns the cells of a pasted table are. */
export function columnsOf({ cells, columns }: PastedTable): readonly (StationColumn | null)[] {
  const most = Math.max(0, ...cells.map((row) => row.length))
  return columns ?? BY_COUNT[most] ?? STATION_COLUMNS
}

/** Rows of a pasted table. What cannot be read stays in its cell, to be corrected there. */
export function rowsOfPasted(
  table: PastedTable,
  { units, firstKey, surface }: { units: UnitSystem; firstKey: number; surface: string },
): readonly StationRow[] {
  const columns = columnsOf(table)
  return table.cells.map((cells, i) =>
    columns.reduce<StationRow>(
      (row, column, at) => {
        const cell = cells[at] ?? ''
        if (column === null || cell === '') return row
        return withCell(row, column, column === 'surface' ? knownSurface(cell) : cell, units)
      },
      emptyRow(firstKey + i, surface),
    ),
  )
}

/** "Loose gravel" is `loose-gravel` of the catalogue; what is not known stays as it was written. */
function knownSurface(cell: string): string {
  const id = cell.toLowerCase().replace(/[\s_]+/g, '-')
  return GROUNDS.find((ground) => ground.id === id)?.id ?? cell
}
