import { InvalidInputError, OutOfRangeError, type Fault } from '../../../shared/errors'
import { callFaults, sketchedReadings } from '../../../shared/forecast/call-sketch'
import { forecastCrest } from '../../../shared/forecast/crest'
import { forecastFaults } from '../../../shared/forecast/forecast-faults'
import { addedToReading, type GaugeDatum } from '../../../shared/forecast/gauge-level'
import { observedShift } from '../../../shared/forecast/observed-shift'
import type {
  ForecastCall,
  ForecastReading,
  LevelReference,
  NewForecast,
  ObservedReading,
} from '../../../shared/schemas/forecast'

/** What is kept of an issue, in the datum of the line. */
export interface IssueLevels {
  readonly call: ForecastCall | null
  readonly readings: ForecastReading[]
  readonly observed: ObservedReading[]
}

/**
 * The levels of an issue at the line; a call is drawn as a sketch.
 *
 * @throws InvalidInputError where call or readings are missing or there is one too many, OutOfRangeError
 * for levels and moments that cannot be used.
 */
export function levelsOfIssue(input: NewForecast, gauge: GaugeDatum): IssueLevels {
  const { origin, call, readings, observed, reference, issuedAt } = input
  assertOneSource(input)
  const toSite = (level: number) => round(level + addedToReading(gauge, reference))
  const siteCall = call && callAtSite(call, toSite)
  const faults = siteCall ? callFaults(siteCall) : []
  if (faults.length > 0) throw new OutOfRangeError(faults)
  const site = siteCall
    ? [...sketchedReadings(siteCall)]
    : readings.map((reading) => readingAtSite(reading, toSite))
  const seen = observedAtSite(observed, gauge, reference)
  const unusable = forecastFaults({ readings: site, observed: seen, issuedAt })
  if (unusable.length > 0) throw new OutOfRangeError(unusable)
  return { call: origin === 'call' ? siteCall : null, readings: site, observed: seen }
}

/** A call has figures and no readings, every other origin readings and no call. */
function assertOneSource({ origin, call, readings }: NewForecast): void {
  const faults: Fault[] = []
  const tell = (path: string, value: unknown, allowed: string): void => {
    const shown = value === null ? 'nothing' : 'what was sent'
    const message = `${path}: ${shown} is not allowed; it must be ${allowed}`
    faults.push({ path, value, allowed, unit: '–', message })
  }
  const isCall = origin === 'call'
  if (isCall && !call) tell('call', null, 'what was said, where the origin is a call')
  if (!isCall && call) tell('call', call, 'left out, where the origin is not a call')
  if (isCall && readings.length > 0) tell('readings', readings, 'left out for a call')
  if (!isCall && readings.length === 0) tell('readings', null, 'one reading or more')
  if (faults.length > 0) throw new InvalidInputError(faults)
}

/** Observed levels at the line. */
export function observedAtSite(
  observed: readonly ObservedReading[],
  gauge: GaugeDatum,
  reference: LevelReference,
): ObservedReading[] {
  const added = addedToReading(gauge, reference)
  return observed.map(({ time, level }) => ({
    time,
    level: level === null ? null : round(level + added),
  }))
}

/** The columns that are computed from an issue, for lists. */
export function answersOf({ readings, observed }: Pick<IssueLevels, 'readings' | 'observed'>) {
  return {
    shift: observedShift(readings, observed),
    crest: forecastCrest({ readings, observed }),
    readingCount: readings.length,
    observedCount: observed.length,
  }
}

/** Two lists of observed levels as one by time; of one moment the newer list counts. */
export function mergeObserved(
  older: readonly ObservedReading[],
  newer: readonly ObservedReading[],
): ObservedReading[] {
  const byTime = new Map([...older, ...newer].map((reading) => [reading.time, reading]))
  return [...byTime.values()].sort((a, b) => a.time - b.time)
}

function callAtSite(call: ForecastCall, toSite: (level: number) => number): ForecastCall {
  return { ...call, levelNow: toSite(call.levelNow), crest: toSite(call.crest) }
}

function readingAtSite(
  { time, expected, low, high }: ForecastReading,
  toSite: (level: number) => number,
): ForecastReading {
  const at = (level: number | null) => (level === null ? null : toSite(level))
  return { time, expected: at(expected), low: at(low), high: at(high) }
}

/** Takes off what binary arithmetic adds to a sum of decimals. */
function round(level: number): number {
  return Number(level.toFixed(9))
}
