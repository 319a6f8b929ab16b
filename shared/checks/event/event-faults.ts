import { seriesFaults } from '../../calc/series/series-faults'
import { stretchesOf, type TimeSeries } from '../../calc/series/time-series'
import { isInRange, rangeFault, type AllowedRange, type Fault } from '../../errors'
import { STATION_RANGES } from '../../schemas/station-ranges'
import type { EventInput } from './event-input'
import { countSteps } from './event-steps'

/** Most steps of one event: a year by the quarter of an hour, three times over. */
export const MOST_STEPS = 200_000

const LEVEL = STATION_RANGES.groundLevel
const TEMPERATURE: AllowedRange = { min: -40, max: 60, unit: '°C' }

/** Longest step that still shows a tide, and the shortest that makes sense [s]. */
const STEP: AllowedRange = { min: 1, max: 3 * 3600, unit: 's' }
const TIME_TO_CLEAR: AllowedRange = { min: 0, max: 86_400, unit: 's' }
const SHARE: AllowedRange = { min: 0, max: 1, unit: '–' }

/**
 * Everything that makes an event impossible to compute; empty: it can be. The section itself is
 * expected inside its ranges.
 */
export function eventFaults(input: EventInput): readonly Fault[] {
  const { groundLevel, water, pond, air, step, gripShare, timeToClear } = input
  const faults = [
    ...outside('groundLevel', groundLevel, LEVEL),
    ...outside('step', step, STEP),
    ...outside('gripShare', gripShare, SHARE),
    ...outside('timeToClear', timeToClear, TIME_TO_CLEAR),
    ...levels(water, 'water.readings', 2),
    ...(pond ? levels(pond, 'pond.readings', 1) : []),
    ...(air ? temperatures(air.temperature) : []),
    ...(air ? outside('air.filledAt', air.filledAt, TEMPERATURE) : []),
  ]
  return faults.length > 0
    ? faults
    : [...noStretch(water), ...tooManySteps(input), ...lacking(input)]
}

function levels(series: TimeSeries, path: string, fewest: number): readonly Fault[] {
  return seriesFaults({ series, path, field: 'level', range: LEVEL, fewest })
}

function temperatures(series: TimeSeries): readonly Fault[] {
  const path = 'air.readings'
  return seriesFaults({ series, path, field: 'temperature', range: TEMPERATURE, fewest: 1 })
}

/** A series of gaps alone has nothing between its readings. */
function noStretch(water: TimeSeries): Fault[] {
  if (stretchesOf(water).length > 0) return []
  const path = 'water.readings'
  const allowed = 'two readings or more within 3 h of each other'
  const message = `${path}: nothing but gaps is not allowed; there must be ${allowed}`
  return [{ path, value: water.length, allowed, unit: 's', message }]
}

function tooManySteps({ water, step }: EventInput): Fault[] {
  const count = countSteps(water, step)
  if (count <= MOST_STEPS) return []
  const least = Math.ceil((step * count) / MOST_STEPS)
  const fault = rangeFault('step', step, { ...STEP, min: Math.min(least, STEP.max) })
  return [{ ...fault, message: `${fault.message} (at most ${MOST_STEPS} steps)` }]
}

/** Growing uplift needs to know how fast pressure spreads. */
function lacking({ section }: EventInput): Fault[] {
  const { model, diffusivity } = section.uplift
  if (model !== 'developing' || diffusivity !== null) return []
  const range = { min: 0, minExcluded: true, max: Infinity, unit: 'm²/s' }
  return [rangeFault('section.uplift.diffusivity', null, range)]
}

function outside(path: string, value: number | undefined, range: AllowedRange): Fault[] {
  return value === undefined || isInRange(value, range) ? [] : [rangeFault(path, value, range)]
}
