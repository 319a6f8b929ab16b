import { assertInRange } from '../../errors'
import {
  pondThroughTime,
  type PondEvent,
  type PondMoment,
  type PondPump,
  type PumpAccount,
} from '../ponding/pond'
import { stageStorage, type StageArea } from '../ponding/stage-storage'
import { valueAt, type KnownReading, type TimeSeries } from '../series/time-series'
import { inflowOf, type DryMoment } from './inflow'
import type { InflowSource } from './inflow-source'
import { pondPump, type DryPump } from './pond-pumps'

/** The dry side of a line: what comes in, what it holds, what is pumped. Moments from one origin [s]. */
export interface DrySide {
  readonly sources: readonly InflowSource[]
  /** Level on the wet side by time [m]; across a gap the higher of the readings beside it stands. */
  readonly water: TimeSeries
  /** Water surface of the pond by level. */
  readonly storage: readonly StageArea[]
  readonly pumps: readonly DryPump[]
  readonly initialLevel: number
  /** First moment [s] and length of the time looked at [s]. */
  readonly from: number
  readonly duration: number
  readonly step: number
  readonly gravity: number
  /** Levels of which the first moment is asked for, such as a sill [m]. */
  readonly thresholds?: readonly number[]
}

/** What one source brought. */
export interface SourceAccount {
  readonly name: string
  /** In the whole time [m³]. */
  readonly volume: number
  /** Largest flow and when [m³/s], [s]. */
  readonly peak: { readonly time: number; readonly flow: number }
}

/** The dry side through time; all moments are those of the series. */
export interface DrySideAnswer {
  readonly moments: readonly PondMoment[]
  readonly events: readonly PondEvent[]
  readonly sources: readonly SourceAccount[]
  readonly pumps: readonly PumpAccount[]
  readonly inflowVolume: number
  readonly pumpedVolume: number
  readonly stored: number
  /** Inflow less pumped less stored [m³]: within 1e-9 of the inflow, or of 1 m³. */
  readonly imbalance: number
  readonly highest: { readonly time: number; readonly level: number }
  readonly reaches: readonly { readonly level: number; readonly time: number | null }[]
  /** Level of the pond by time, as an event of a section takes it. */
  readonly pond: readonly KnownReading[]
}

/**
 * Water on the dry side through time: every source by itself, the pond, the pumps with their duty at
 * each level. The balance closes to rounding.
 *
 * @throws OutOfRangeError for a storage, pumps or times that cannot be, see `pondThroughTime`.
 */
export function drySideThroughTime(input: DrySide): DrySideAnswer {
  const { sources, water, pumps, from, thresholds = [] } = input
  const known = water.filter(({ value }) => value !== null).length
  assertInRange('water.readings.length', known, { min: 1, max: Infinity, unit: 'readings' })
  const storage = stageStorage(input.storage)
  const top = Math.max(input.storage[input.storage.length - 1]!.level, ...thresholds) + 0.5
  const history = pondThroughTime({
    storage,
    inflowAt: (time, pondLevel) => {
      const moment = momentOf(input, from + time, pondLevel)
      return sources.map((source) => inflowOf(source, moment))
    },
    pumps: pumps.map((pump) => laterBy(pondPump(pump, storage.lowest, top), from)),
    initialLevel: input.initialLevel,
    duration: input.duration,
    step: input.step,
    thresholds,
  })
  const { inflowVolume, pumpedVolume, stored } = history
  const moments = history.moments.map((moment) => ({ ...moment, time: from + moment.time }))
  return {
    moments,
    events: history.events.map((event) => ({ ...event, time: from + event.time })),
    sources: sources.map((source, i) => ({
      name: source.name,
      volume: history.inflowVolumes[i]!,
      peak: peakOf(source, input, moments),
    })),
    pumps: history.pumps,
    inflowVolume,
    pumpedVolume,
    stored,
    imbalance: inflowVolume - pumpedVolume - stored,
    highest: { ...history.highest, time: from + history.highest.time },
    reaches: history.reaches.map(({ level, time }) => ({
      level,
      time: time === null ? null : from + time,
    })),
    pond: pondReadings(moments),
  }
}

function momentOf({ water, gravity }: DrySide, time: number, pondLevel: number): DryMoment {
  return { time, waterLevel: wetLevel(water, time), pondLevel, gravity }
}

/** Level on the wet side; in a gap the higher of the readings beside it, outside the nearest one. */
function wetLevel(water: TimeSeries, time: number): number {
  const level = valueAt(water, time)
  if (level !== null) return level
  const known = water.filter(({ value }) => value !== null)
  const before = known.filter((reading) => reading.time <= time).at(-1)
  const after = known.find((reading) => reading.time > time)
  return Math.max(before?.value ?? -Infinity, after?.value ?? -Infinity)
}

function peakOf(source: InflowSource, input: DrySide, moments: readonly PondMoment[]) {
  return moments.reduce(
    (peak, { time, level }) => {
      const flow = inflowOf(source, momentOf(input, time, level))
      return flow > peak.flow ? { time, flow } : peak
    },
    { time: input.from, flow: 0 },
  )
}

/** A pump whose failure is counted from the beginning of the run. */
function laterBy(pump: PondPump, from: number): PondPump {
  return pump.failsAt === undefined ? pump : { ...pump, failsAt: pump.failsAt - from }
}

/** Pond levels by rising time: a start or a stop has its moment once. */
function pondReadings(moments: readonly PondMoment[]): readonly KnownReading[] {
  return moments.flatMap(({ time, level }, i) =>
    i > 0 && time <= moments[i - 1]!.time ? [] : [{ time, value: level }],
  )
}
