import {
  LEVEL_ROLES,
  readingsOf,
  type LevelRole,
  type LevelRow,
  type LevelUnit,
} from './forecast-rows'
import type { ForecastFault, ReadForecast } from './read-forecast-table'
import type { MomentChoice } from './read-moment'
import { levelsOfSeries, type WaterSeries } from './read-waterml'

/** What each series probably is: by its name, else the first one the expected level. */
export function guessedRoles(series: readonly WaterSeries[]): readonly (LevelRole | null)[] {
  const named = series.map(({ name }) => {
    const word = name.toLowerCase()
    return LEVEL_ROLES.find((role) => word.includes(role)) ?? null
  })
  const once = named.map((role, i) => (named.indexOf(role) === i ? role : null))
  if (once.includes('expected') || once.includes('observed')) return once
  const free = once.indexOf(null)
  return once.map((role, i) => (i === free ? 'expected' : role))
}

/** Levels of the series that have a role, by time; faults by line. */
export function readSeries(
  series: readonly WaterSeries[],
  roles: readonly (LevelRole | null)[],
  unit: LevelUnit,
  choice: MomentChoice,
): ReadForecast {
  const nothing = { readings: [], observed: [] }
  if (!roles.includes('expected') && !roles.includes('observed')) {
    return { ...nothing, faults: [{ kind: 'no-series', line: null, column: null, cell: '' }] }
  }
  const rows = new Map<number, LevelRow>()
  const faults: ForecastFault[] = []
  series.forEach((one, i) => {
    const role = roles[i]
    if (!role) return
    const read = levelsOfSeries(one, one.unit ?? unit, choice)
    faults.push(...read.faults.map((fault) => ({ ...fault, column: null })))
    for (const { time, level } of read.levels) {
      rows.set(time, { ...rows.get(time), time, [role]: level })
    }
  })
  if (faults.length > 0) return { ...nothing, faults }
  const used = LEVEL_ROLES.filter((role) => roles.includes(role))
  const sorted = [...rows.values()].sort((a, b) => a.time - b.time)
  const found = readingsOf(sorted, used)
  const isEmpty = found.readings.length === 0 && found.observed.length === 0
  const none = [{ kind: 'no-level' as const, line: null, column: null, cell: '' }]
  return isEmpty ? { ...nothing, faults: none } : { ...found, faults: [] }
}
