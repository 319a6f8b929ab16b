import { seriesFaults } from '../calc/series/series-faults'
import { isInRange, rangeFault, type AllowedRange, type Fault } from '../errors'
import type { ForecastReading, ObservedReading } from '../schemas/forecast'
import { STATION_RANGES } from '../schemas/station-ranges'

const LEVEL = STATION_RANGES.groundLevel

/** Moments that can be meant: 1900 to 2200 [ms since 1970]. */
export const MOMENT_RANGE: AllowedRange = {
  min: -2_208_988_800_000,
  max: 7_258_118_400_000,
  unit: 'ms since 1970-01-01T00:00Z',
}

/** What a series of levels is checked for, and how its faults name it. */
interface Levels {
  readonly readings: readonly ForecastReading[]
  readonly observed: readonly ObservedReading[]
  readonly issuedAt: number
}

/**
 * Everything in the readings of an issue that cannot be used: a moment twice or backwards, a level
 * outside what a level may be, a band that is not low ≤ expected ≤ high, no known reading at all.
 *
 * @remarks Levels in m in the datum of the line, moments in ms since 1970.
 */
export function forecastFaults({ readings, observed, issuedAt }: Levels): readonly Fault[] {
  return [
    ...momentFault('issuedAt', issuedAt),
    ...timesFaults('readings', readings),
    ...levelFaults(
      'readings',
      'expected',
      readings.map(({ time, expected }) => ({ time, level: expected })),
    ),
    ...readings.flatMap(bandFaults).slice(0, 20),
    ...observedFaults(observed),
  ]
}

/** Everything in observed readings that cannot be used; none at all are no fault. */
export function observedFaults(observed: readonly ObservedReading[]): readonly Fault[] {
  if (observed.length === 0) return []
  return [...timesFaults('observed', observed), ...levelFaults('observed', 'level', observed)]
}

function levelFaults(
  path: string,
  field: string,
  readings: readonly ObservedReading[],
): readonly Fault[] {
  const series = readings.map(({ time, level }) => ({ time: time / 1000, value: level }))
  return seriesFaults({ series, path, field, range: LEVEL, fewest: 1 })
}

function timesFaults(path: string, readings: readonly { readonly time: number }[]): Fault[] {
  return readings.flatMap(({ time }, i) => momentFault(`${path}[${i}].time`, time)).slice(0, 20)
}

function momentFault(path: string, value: number): Fault[] {
  return isInRange(value, MOMENT_RANGE) ? [] : [rangeFault(path, value, MOMENT_RANGE)]
}

/** A band lies around the level that is expected. */
function bandFaults({ expected, low, high }: ForecastReading, i: number): Fault[] {
  const top = expected ?? LEVEL.max
  const bottom = expected ?? LEVEL.min
  return [
    ...bandFault(`readings[${i}].low`, low, { ...LEVEL, max: top }),
    ...bandFault(`readings[${i}].high`, high, { ...LEVEL, min: bottom }),
  ]
}

function bandFault(path: string, value: number | null, range: AllowedRange): Fault[] {
  return value === null || isInRange(value, range) ? [] : [rangeFault(path, value, range)]
}
