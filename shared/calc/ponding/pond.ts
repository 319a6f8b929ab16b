import { OutOfRangeError, rangeFault } from '../../errors'
import { PondRun } from './pond-run'
import type { StageStorage } from './stage-storage'

/** A pump in the pond. */
export interface PondPump {
  readonly name: string
  /** Starts when the pond rises to this level [m]. */
  readonly startLevel: number
  /** Stops when it has fallen to this level [m], below the start. */
  readonly stopLevel: number
  /** What it delivers at a pond level [m³/s], 0 or more. */
  readonly flowAt: (level: number) => number
  /** What it takes while it runs at a pond level [W]; left out: its energy is not asked for. */
  readonly powerAt?: (level: number) => number
  /** Moment at which it breaks down for good [s]; never if left out. */
  readonly failsAt?: number
}

/** Water on the dry side through time. */
export interface PondInput {
  readonly storage: StageStorage
  /** All that comes in at a time and a pond level, one figure or one per source [m³/s], 0 or more. */
  readonly inflowAt: (time: number, level: number) => number | readonly number[]
  readonly pumps: readonly PondPump[]
  readonly initialLevel: number
  /** Length of the time looked at [s]. */
  readonly duration: number
  /** Longest step [s]. */
  readonly step: number
  /** Levels of which the first moment is asked for [m], such as a sill. */
  readonly thresholds?: readonly number[]
}

export interface PondMoment {
  readonly time: number
  readonly level: number
  readonly inflow: number
  readonly pumped: number
}

export interface PondEvent {
  readonly time: number
  readonly pump: string
  readonly what: 'starts' | 'stops' | 'fails'
}

/** What one pump did in the whole time. */
export interface PumpAccount {
  readonly pump: string
  /** Pumped volume [m³]. */
  readonly volume: number
  /** Time that it ran [s]. */
  readonly runningTime: number
  /** Energy that it took [J]; 0 where its power is not given. */
  readonly energy: number
}

export interface PondHistory {
  readonly moments: readonly PondMoment[]
  readonly events: readonly PondEvent[]
  /** Volumes over the whole time [m³]: inflow = pumped + stored. */
  readonly inflowVolume: number
  readonly pumpedVolume: number
  readonly stored: number
  /** The inflow by source, in the order of `inflowAt` [m³]. */
  readonly inflowVolumes: readonly number[]
  readonly pumps: readonly PumpAccount[]
  readonly highest: { readonly time: number; readonly level: number }
  /** First moment at which the pond stands at each threshold [s]; null: it never does. */
  readonly reaches: readonly { readonly level: number; readonly time: number | null }[]
}

/** Steps of one run at most. */
const MOST_STEPS = 1_000_000

/**
 * Ponding on the dry side: dV/dt = Q_in − Q_pump, with pumps that start and stop at their levels.
 *
 * Fourth-order Runge–Kutta on all volumes together, so that the balance closes to rounding; a start
 * or a stop ends the step at its own moment, found by root finding.
 *
 * @throws OutOfRangeError where a pump stops at or above its start, or time and step are not positive.
 */
export function pondThroughTime(input: PondInput): PondHistory {
  assertPond(input)
  const run = new PondRun(input)
  while (run.time < input.duration) run.advance()
  return run.history()
}

function assertPond({ pumps, duration, step, initialLevel, thresholds = [] }: PondInput): void {
  const level = { min: -Infinity, max: Infinity, unit: 'm' }
  const faults = pumps.flatMap(({ startLevel, stopLevel }, i) => {
    if (stopLevel < startLevel) return []
    const range = { ...level, max: startLevel, maxExcluded: true }
    return [rangeFault(`pumps[${i}].stopLevel`, stopLevel, range)]
  })
  const positive = { min: 0, minExcluded: true, max: Infinity, unit: 's' }
  const isDuration = duration > 0 && duration < Infinity
  if (!isDuration) faults.push(rangeFault('duration', duration, positive))
  if (!(step > 0)) faults.push(rangeFault('step', step, positive))
  if (isDuration && step > 0 && duration / step > MOST_STEPS) {
    faults.push(rangeFault('step', step, { ...positive, min: duration / MOST_STEPS }))
  }
  if (!Number.isFinite(initialLevel)) faults.push(rangeFault('initialLevel', initialLevel, level))
  thresholds.forEach((threshold, i) => {
    if (!Number.isFinite(threshold)) faults.push(rangeFault(`thresholds[${i}]`, threshold, level))
  })
  if (faults.length > 0) throw new OutOfRangeError(faults)
}
