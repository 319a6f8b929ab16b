import type { SurveyTable } from '@/survey/read-table'
import { LEVEL_ROLES, type LevelRole } from './forecast-rows'

/** What a column of a table is; a time may be parted into day and clock. */
export const FORECAST_COLUMNS = ['time', 'clock', ...LEVEL_ROLES] as const
export type ForecastColumn = (typeof FORECAST_COLUMNS)[number]

/** Which column is what; null: it is left out. */
export type ForecastMatch = readonly (ForecastColumn | null)[]

/** Beginnings of words by which a heading names its column, the longer ones first. */
const HEADINGS: readonly (readonly [string, ForecastColumn])[] = [
  ['datetime', 'time'],
  ['timestamp', 'time'],
  ['timeofday', 'clock'],
  ['clock', 'clock'],
  ['date', 'time'],
  ['time', 'time'],
  ['moment', 'time'],
  ['observed', 'observed'],
  ['measured', 'observed'],
  ['gauge', 'observed'],
  ['lower', 'low'],
  ['low', 'low'],
  ['minimum', 'low'],
  ['min', 'low'],
  ['upper', 'high'],
  ['high', 'high'],
  ['maximum', 'high'],
  ['max', 'high'],
  ['expected', 'expected'],
  ['forecast', 'expected'],
  ['level', 'expected'],
  ['stage', 'expected'],
  ['value', 'expected'],
  ['waterlevel', 'expected'],
]

/** Columns of a table without a heading, by their order. */
const USUAL: ForecastMatch = ['time', 'expected', 'low', 'high', 'observed']

/** What the first row of a table says, and what its columns probably are. */
export function matchForecastColumns(table: SurveyTable): {
  readonly hasHeading: boolean
  readonly match: ForecastMatch
} {
  const first = table.rows[0]?.cells ?? []
  const hasHeading = first.length > 0 && first.every((cell) => !/^[-+−]?\d/.test(cell))
  const wanted = hasHeading ? partedTime(first.map(columnNamed)) : USUAL
  const match = Array.from({ length: table.columns }, (_, i) => wanted[i] ?? null)
  return { hasHeading, match: match.map((role, i) => (match.indexOf(role) === i ? role : null)) }
}

/** Two columns named as times are a day and its clock. */
function partedTime(named: ForecastMatch): ForecastMatch {
  const first = named.indexOf('time')
  return named.map((role, i) => (role === 'time' && i > first ? 'clock' : role))
}

function columnNamed(heading: string): ForecastColumn | null {
  const word = heading
    .toLowerCase()
    .replace(/\(.*?\)|\[.*?\]/g, '')
    .replace(/[^a-z]/g, '')
  return HEADINGS.find(([name]) => word.startsWith(name))?.[1] ?? null
}

/** Roles that a match gives to levels. */
export function rolesOf(match: ForecastMatch): readonly LevelRole[] {
  return LEVEL_ROLES.filter((role) => match.includes(role))
}
