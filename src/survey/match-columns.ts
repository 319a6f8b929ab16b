import { STATION_COLUMNS, type StationColumn } from '@/line/station-rows'
import type { SurveyTable } from './read-table'

/** Which column of the survey each column of a file is; null: it is left out. */
export type ColumnMatch = readonly (StationColumn | null)[]

/** Beginnings of words by which a heading names its column, without signs and capitals. */
const HEADINGS: readonly (readonly [string, StationColumn])[] = [
  ['chainage', 'chainage'],
  ['ch', 'chainage'],
  ['station', 'chainage'],
  ['distance', 'chainage'],
  ['easting', 'x'],
  ['east', 'x'],
  ['x', 'x'],
  ['northing', 'y'],
  ['north', 'y'],
  ['y', 'y'],
  ['groundlevel', 'groundLevel'],
  ['ground', 'groundLevel'],
  ['level', 'groundLevel'],
  ['elevation', 'groundLevel'],
  ['height', 'groundLevel'],
  ['z', 'groundLevel'],
  ['surface', 'surface'],
  ['material', 'surface'],
  ['clearwidth', 'clearWidth'],
  ['clear', 'clearWidth'],
  ['width', 'clearWidth'],
  ['note', 'note'],
  ['remark', 'note'],
  ['comment', 'note'],
]

/** Columns of a table without a heading, by their number. */
const BY_COUNT: Readonly<Record<number, readonly StationColumn[]>> = {
  2: ['chainage', 'groundLevel'],
  3: ['chainage', 'groundLevel', 'surface'],
  4: ['chainage', 'x', 'y', 'groundLevel'],
}

/** What the first row of a table says, and what its columns probably are. */
export function matchColumns(table: SurveyTable): {
  readonly hasHeading: boolean
  readonly match: ColumnMatch
} {
  const first = table.rows[0]?.cells ?? []
  const named = first.map(columnNamed)
  const hasHeading =
    named.some((column) => column !== null) && first.every((cell) => !/^[-+]?\d/.test(cell))
  const wanted = hasHeading ? named : (BY_COUNT[table.columns] ?? STATION_COLUMNS)
  const match = Array.from({ length: table.columns }, (_, i) => wanted[i] ?? null)
  return {
    hasHeading,
    match: match.map((column, i) => (match.indexOf(column) === i ? column : null)),
  }
}

/** The column that a heading names, by the longest word that fits. */
function columnNamed(heading: string): StationColumn | null {
  const word = heading
    .toLowerCase()
    .replace(/\(.*?\)|\[.*?\]/g, '')
    .replace(/[^a-z]/g, '')
  const exact = HEADINGS.find(([name]) => name === word)
  if (exact) return exact[1]
  return HEADINGS.find(([name]) => name.length > 3 && word.startsWith(name))?.[1] ?? null
}
