import { OutOfRangeError, rangeFault } from '../../errors'
import { findRoot } from '../numerics/find-root'
import type { PondEvent, PondHistory, PondInput, PondMoment, PondPump } from './pond'

/** Places in the state: stored, come in, pumped [m³]; then by source, then three figures by pump. */
const STORED = 0
const INFLOW = 1
const PUMPED = 2
const PARTS = 3

/** Events that may follow in one step; more is a pump that chatters. */
const MOST_EVENTS_PER_STEP = 1000

type State = readonly number[]

/** One pass of a pond through time; local to `pondThroughTime`. */
export class PondRun {
  time = 0
  private state: State
  private readonly sources: number
  private readonly initial: number
  private readonly running = new Set<PondPump>()
  private readonly failed = new Set<PondPump>()
  private readonly moments: PondMoment[] = []
  private readonly events: PondEvent[] = []
  private readonly reached: (number | null)[]
  private eventsHere = 0

  constructor(private readonly input: PondInput) {
    const { storage, initialLevel, pumps, inflowAt, thresholds = [] } = input
    this.initial = storage.volumeAt(initialLevel)
    this.sources = partsOf(inflowAt(0, initialLevel)).length
    const size = PARTS + this.sources + 3 * pumps.length
    this.state = Array.from({ length: size }, (_, i) => (i === STORED ? this.initial : 0))
    this.reached = thresholds.map((threshold) => (this.level >= threshold ? 0 : null))
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
    const next = crossing === null ? end : this.after(crossing)
    this.noteThresholds(taken, next)
    this.state = next
    this.time = crossing === null && length === duration - this.time ? duration : this.time + taken
    this.eventsHere = taken > 1e-9 * step ? 0 : this.eventsHere + 1
    if (this.eventsHere > MOST_EVENTS_PER_STEP) throw chatter(this.time)
    this.switchPumps()
    this.note()
  }

  history(): PondHistory {
    const { pumps, thresholds = [] } = this.input
    const highest = this.moments.reduce((a, b) => (b.level > a.level ? b : a))
    const atPumps = PARTS + this.sources
    return {
      moments: this.moments,
      events: this.events,
      inflowVolume: this.state[INFLOW]!,
      pumpedVolume: this.state[PUMPED]!,
      stored: this.state[STORED]! - this.initial,
      inflowVolumes: this.state.slice(PARTS, atPumps),
      pumps: pumps.map(({ name }, i) => ({
        pump: name,
        volume: this.state[atPumps + 3 * i]!,
        runningTime: this.state[atPumps + 3 * i + 1]!,
        energy: this.state[atPumps + 3 * i + 2]!,
      })),
      highest: { time: highest.time, level: highest.level },
      reaches: thresholds.map((level, i) => ({ level, time: this.reached[i]! })),
    }
  }

  private get level(): number {
    return this.levelOf(this.state)
  }

  private levelOf(state: State): number {
    return this.input.storage.levelAt(Math.max(0, state[STORED]!))
  }

  private rates(time: number, state: State): State {
    const { inflowAt, pumps } = this.input
    const level = this.levelOf(state)
    const parts = partsOf(inflowAt(time, level))
    const inflow = parts.reduce((sum, part) => sum + part, 0)
    const flows = pumps.map((pump) => (this.running.has(pump) ? pump.flowAt(level) : 0))
    const wanted = flows.reduce((sum, flow) => sum + flow, 0)
    // An empty sump gives no more than what runs into it.
    const pumped = state[STORED]! <= 0 ? Math.min(wanted, inflow) : wanted
    const share = wanted > 0 ? pumped / wanted : 0
    const accounts = pumps.flatMap((pump, i) => {
      if (!this.running.has(pump)) return [0, 0, 0]
      return [share * flows[i]!, 1, pump.powerAt?.(level) ?? 0]
    })
    return [inflow - pumped, inflow, pumped, ...parts, ...accounts]
  }

  private after(length: number): State {
    const add = (by: State, share: number): State =>
      this.state.map((value, i) => value + share * length * by[i]!)
    const k1 = this.rates(this.time, this.state)
    const k2 = this.rates(this.time + length / 2, add(k1, 1 / 2))
    const k3 = this.rates(this.time + length / 2, add(k2, 1 / 2))
    const k4 = this.rates(this.time + length, add(k3, 1))
    const mean = k1.map((k, i) => (k + 2 * k2[i]! + 2 * k3[i]! + k4[i]!) / 6)
    return add(mean, 1)
  }

  /** Time into the step at which the first pump starts or stops; null: none does. */
  private firstCrossing(length: number, end: State): number | null {
    const atEnd = this.levelOf(end)
    const crossings = this.input.pumps.flatMap((pump) => {
      if (this.failed.has(pump)) return []
      const isRunning = this.running.has(pump)
      const target = isRunning ? pump.stopLevel : pump.startLevel
      const side = isRunning ? -1 : 1
      return side * (atEnd - target) < 0 ? [] : [this.momentOf(target, length, atEnd)]
    })
    return crossings.length > 0 ? Math.min(...crossings) : null
  }

  /** Time into the step at which the pond stands at a level between now and the end of the step. */
  private momentOf(target: number, length: number, atEnd: number): number {
    const distance = (dt: number): number => this.levelOf(this.after(dt)) - target
    const atLow = this.level - target
    return findRoot(distance, { low: 0, high: length, atLow, atHigh: atEnd - target }, 1e-14)
  }

  private noteThresholds(taken: number, next: State): void {
    const atEnd = this.levelOf(next)
    this.input.thresholds?.forEach((threshold, i) => {
      if (this.reached[i] !== null || atEnd < threshold) return
      this.reached[i] = this.time + this.momentOf(threshold, taken, atEnd)
    })
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
    const [, inflow, pumped] = this.rates(this.time, this.state)
    this.moments.push({ time: this.time, level: this.level, inflow: inflow!, pumped: pumped! })
  }
}

function partsOf(inflow: number | readonly number[]): readonly number[] {
  return typeof inflow === 'number' ? [inflow] : inflow
}

function chatter(time: number): OutOfRangeError {
  const range = { min: 0, minExcluded: true, max: Infinity, unit: 'm' }
  const fault = rangeFault('pumps', 0, range)
  const message = `pumps: start and stop lie so close that a pump chatters at ${time} s`
  return new OutOfRangeError([{ ...fault, message }])
}
