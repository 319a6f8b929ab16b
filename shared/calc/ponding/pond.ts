import { OutOfRangeError, rangeFault } from '../../errors'
import { findRoot } from '../numerics/find-root'
import type { StageStorage } from './stage-storage'

/** A pump in the pond. */
export interface PondPump {
  readonly name: string
  /** Starts when the pond rises to this level [m]. */
  readonly startLevel: number
  /** Stops when it has fallen to this level [m], below the start. */
  readonly stopLevel: number
  /** What it delivers at a pond level [m³/s]. */
  readonly flowAt: (level: number) => number
  /** Moment at which it breaks down for good [s]; never if left out. */
  readonly failsAt?: number
}

/** Water on the dry side through time. */
export interface PondInput {
  readonly storage: StageStorage
  /** All that comes in at a time and a pond level [m³/s]. */
  readonly inflowAt: (time: number, level: number) => number
  readonly pumps: readonly PondPump[]
  readonly initialLevel: number
  /** Length of the time looked at [s]. */
  readonly duration: number
  /** Longest step [s]. */
  readonly step: number
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

export interface PondHistory {
  readonly moments: readonly PondMoment[]
  readonly events: readonly PondEvent[]
  /** Volumes over the whole time [m³]: inflow = pumped + stored. */
  readonly inflowVolume: number
  readonly pumpedVolume: number
  readonly stored: number
  readonly highest: { readonly time: number; readonly level: number }
}

/** State that the equations move on: stored, come in, pumped [m³]. */
type Volumes = readonly [stored: number, inflow: number, pumped: number]

/** Events that may follow in one step; more is a pump that chatters. */
const MOST_EVENTS_PER_STEP = 1000

/**
 * Ponding on the dry side: dV/dt = Q_in − Q_pump, with pumps that start and stop at their levels.
 *
 * Fourth-order Runge–Kutta on the three volumes together, so that the balance closes to rounding; a
 * start or a stop ends the step at its own moment, found by root finding.
 *
 * @throws OutOfRangeError where a pump stops at or above its start, or time and step are not positive.
 */
export function pondThroughTime(input: PondInput): PondHistory {
  assertPond(input)
  const run = new PondRun(input)
  while (run.time < input.duration) run.advance()
  return run.history()
}

/** One pass through time; local to `pondThroughTime`. */
class PondRun {
  time = 0
  private volumes: Volumes
  private readonly initial: number
  private readonly running = new Set<PondPump>()
  private readonly failed = new Set<PondPump>()
  private readonly moments: PondMoment[] = []
  private readonly events: PondEvent[] = []
  private eventsHere = 0

  constructor(private readonly input: PondInput) {
    this.initial = input.storage.volumeAt(input.initialLevel)
    this.volumes = [this.initial, 0, 0]
    this.switchPumps()
    this.note()
  }

  /** One step, cut short at the first moment at which a pump starts, stops or fails. */
  advance(): void {
    const { duration, step, pumps } = this.input
    const failures = pumps.flatMap(({ failsAt }) =>
      failsAt !== undefined && failsAt > this.time ? [failsAt] : [],
    )
    const length = Math.min(step, duration - this.time, ...failures.map((at) => at - this.time))
    const end = this.after(length)
    const crossing = this.firstCrossing(length, end)
    const taken = crossing ?? length
    this.volumes = crossing === null ? end : this.after(crossing)
    this.time = crossing === null && length === duration - this.time ? duration : this.time + taken
    this.eventsHere = taken > 1e-9 * step ? 0 : this.eventsHere + 1
    if (this.eventsHere > MOST_EVENTS_PER_STEP) throw chatter(this.time)
    this.switchPumps()
    this.note()
  }

  history(): PondHistory {
    const [stored, inflowVolume, pumpedVolume] = this.volumes
    const highest = this.moments.reduce((a, b) => (b.level > a.level ? b : a))
    return {
      moments: this.moments,
      events: this.events,
      inflowVolume,
      pumpedVolume,
      stored: stored - this.initial,
      highest: { time: highest.time, level: highest.level },
    }
  }

  private get level(): number {
    return this.input.storage.levelAt(this.volumes[0])
  }

  private rates(time: number, [stored]: Volumes): Volumes {
    const level = this.input.storage.levelAt(Math.max(0, stored))
    const inflow = this.input.inflowAt(time, level)
    const wanted = [...this.running].reduce((sum, pump) => sum + pump.flowAt(level), 0)
    // An empty sump gives no more than what runs into it.
    const pumped = stored <= 0 ? Math.min(wanted, inflow) : wanted
    return [inflow - pumped, inflow, pumped]
  }

  private after(length: number): Volumes {
    const add = (by: Volumes, share: number): Volumes =>
      this.volumes.map((value, i) => value + share * length * by[i]!) as unknown as Volumes
    const k1 = this.rates(this.time, this.volumes)
    const k2 = this.rates(this.time + length / 2, add(k1, 1 / 2))
    const k3 = this.rates(this.time + length / 2, add(k2, 1 / 2))
    const k4 = this.rates(this.time + length, add(k3, 1))
    const mean = k1.map((k, i) => (k + 2 * k2[i]! + 2 * k3[i]! + k4[i]!) / 6)
    return add(mean as unknown as Volumes, 1)
  }

  /** Time into the step at which the first pump starts or stops; null: none does. */
  private firstCrossing(length: number, end: Volumes): number | null {
    const { storage, pumps } = this.input
    const atEnd = storage.levelAt(end[0])
    const crossings = pumps.flatMap((pump) => {
      if (this.failed.has(pump)) return []
      const isRunning = this.running.has(pump)
      const target = isRunning ? pump.stopLevel : pump.startLevel
      const side = isRunning ? -1 : 1
      if (side * (atEnd - target) < 0) return []
      const distance = (dt: number): number => storage.levelAt(this.after(dt)[0]) - target
      const atLow = this.level - target
      return [findRoot(distance, { low: 0, high: length, atLow, atHigh: atEnd - target }, 1e-14)]
    })
    return crossings.length > 0 ? Math.min(...crossings) : null
  }

  private switchPumps(): void {
    const slack = 1e-12 * Math.max(1, Math.abs(this.level))
    for (const pump of this.input.pumps) {
      if (this.failed.has(pump)) continue
      const isRunning = this.running.has(pump)
      if (pump.failsAt !== undefined && this.time >= pump.failsAt) {
        this.failed.add(pump)
        this.running.delete(pump)
        this.events.push({ time: this.time, pump: pump.name, what: 'fails' })
      } else if (!isRunning && this.level >= pump.startLevel - slack) {
        this.running.add(pump)
        this.events.push({ time: this.time, pump: pump.name, what: 'starts' })
      } else if (isRunning && this.level <= pump.stopLevel + slack) {
        this.running.delete(pump)
        this.events.push({ time: this.time, pump: pump.name, what: 'stops' })
      }
    }
  }

  private note(): void {
    const [, inflow, pumped] = this.rates(this.time, this.volumes)
    this.moments.push({ time: this.time, level: this.level, inflow, pumped })
  }
}

function chatter(time: number): OutOfRangeError {
  const range = { min: 0, minExcluded: true, max: Infinity, unit: 'm' }
  const fault = rangeFault('pumps', 0, range)
  const message = `pumps: start and stop lie so close that a pump chatters at ${time} s`
  return new OutOfRangeError([{ ...fault, message }])
}

function assertPond({ pumps, duration, step }: PondInput): void {
  const faults = pumps.flatMap(({ startLevel, stopLevel }, i) =>
    stopLevel < startLevel
      ? []
      : [
          rangeFault(`pumps[${i}].stopLevel`, stopLevel, {
            min: -Infinity,
            max: startLevel,
            maxExcluded: true,
            unit: 'm',
          }),
        ],
  )
  const positive = { min: 0, minExcluded: true, max: Infinity, unit: 's' }
  if (!(duration > 0)) faults.push(rangeFault('duration', duration, positive))
  if (!(step > 0)) faults.push(rangeFault('step', step, positive))
  if (faults.length > 0) throw new OutOfRangeError(faults)
}
