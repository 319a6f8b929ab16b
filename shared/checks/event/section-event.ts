import { gapsOf, valueAt } from '../../calc/series/time-series'
import { OutOfRangeError } from '../../errors'
import { isWorse } from '../compare'
import type { AtMoment, EventAnswer, Failure } from './event-answer'
import { eventFaults } from './event-faults'
import type { EventInput } from './event-input'
import { EventState } from './event-state'
import { eventSteps, type StretchSteps } from './event-steps'
import { emptyTrace, momentsOf, writeMoment, type EventMoment } from './event-trace'
import { limitsOf, type Limits } from './event-limits'
import { least } from './least-moment'

/** What happened to a section, its moments and the one under the deepest water. */
export interface EventHistory extends Omit<EventAnswer, keyof Limits> {
  readonly moments: readonly EventMoment[]
  readonly highest: EventMoment
}

/** Ends of a failure are found to this width [s]. */
const MOMENT_WIDTH = 0.5

/** Failures whose ends are searched; water that trembles for longer is answered to the step. */
const MOST_SEARCHED = 200

/**
 * One section through an event, a part at a time: whoever runs it shows its progress, or stops it by
 * not asking for more. The same input gives the same answer, in whatever parts it is run.
 *
 * All checks at every step; water under the skirt grows and recedes with the level where the model is
 * `developing`; air through the night; water on the dry side fed back into every check; the moments at
 * which the section begins and ceases to fail by halving. In a gap nothing is computed; after it the
 * ground counts as soaked by the higher of the levels on both sides.
 *
 * @throws OutOfRangeError with every fault of the input, see `eventFaults`.
 */
export class SectionEvent {
  /** Steps of the whole event, and those that are done. */
  readonly total: number
  private computed = 0
  private readonly stretches: readonly StretchSteps[]
  private readonly trace
  private readonly failures: Failure[] = []
  private stretch = 0
  private step = 0
  private state: EventState | null = null
  /** The state one step earlier, to look into the middle of a step. */
  private before: EventState | null = null
  private isFailing = false
  /** Highest depth before a gap [m]. */
  private depthBefore = 0

  constructor(private readonly input: EventInput) {
    const faults = eventFaults(input)
    if (faults.length > 0) throw new OutOfRangeError(faults)
    this.stretches = eventSteps(input.water, input.step, input.groundLevel)
    this.total = this.stretches.reduce((sum, { times }) => sum + times.length, 0)
    this.trace = emptyTrace(this.total)
  }

  get done(): number {
    return this.computed
  }

  /** Computes up to so many further steps; false once there are none left. */
  advance(steps: number): boolean {
    for (let i = 0; i < steps && this.computed < this.total; i += 1) this.next()
    return this.computed < this.total
  }

  /** The answer; computes what is left first. */
  answer(): EventAnswer {
    const { moments, highest, ...history } = this.history()
    return { ...history, ...limitsOf(this.input, moments, highest) }
  }

  /** What happened, without what holds and when to leave; computes what is left first. */
  history(): EventHistory {
    this.advance(this.total)
    const { input, trace, failures } = this
    const moments = momentsOf(trace)
    const worst = moments.reduce((a, b) => (isWorse(b.utilisation, a.utilisation) ? b : a))
    const highest = moments.reduce((a, b) => (b.depth > a.depth ? b : a))
    return {
      verdict: worstVerdict(moments),
      worst: { time: worst.time, check: worst.governs, utilisation: worst.utilisation },
      firstFailure: failures[0] ?? null,
      failures,
      leastSliding: least(moments, ({ sliding }) => sliding),
      leastFreeboard: least(moments, ({ freeboard }) => freeboard),
      highestLevel: this.highestLevel(),
      lowestAirPressure: least(moments, ({ airPressure }) => airPressure)!,
      gaps: gapsOf(input.water),
      trace,
      moments,
      highest,
    }
  }

  private highestLevel(): AtMoment {
    const readings = this.stretches.flatMap(({ stretch }) => stretch)
    return readings.reduce((a, b) => (b.value > a.value ? b : a))
  }

  private next(): void {
    const { stretch, times } = this.stretches[this.stretch]!
    const time = times[this.step]!
    const isFirst = this.step === 0
    if (isFirst) {
      const carried = { before: this.depthBefore, air: this.airAcross(time) }
      this.state = EventState.at(this.input, stretch, carried)
      this.before = this.state.copy()
    } else {
      this.before!.take(this.state!)
      this.state!.advance(time)
    }
    const moment = this.state!.moment()
    writeMoment(this.trace, this.computed, moment)
    this.note(moment, isFirst ? null : this.before)
    this.computed += 1
    this.step += 1
    if (this.step === times.length) this.endStretch(moment)
  }

  /** The leak does not wait for readings. */
  private airAcross(time: number) {
    const air = this.state?.airRun ?? null
    air?.advance(this.state!.time, time)
    return air
  }

  private endStretch(moment: EventMoment): void {
    this.depthBefore = moment.depth
    this.stretch += 1
    this.step = 0
    if (this.isFailing && this.stretch < this.stretches.length) {
      this.closeFailure(moment.time)
    }
  }

  private note(moment: EventMoment, before: EventState | null): void {
    const fails = moment.verdict === 'fails'
    if (fails === this.isFailing) return
    const change = before ? this.changeBetween(before, moment, fails) : moment
    if (fails) {
      this.failures.push({
        from: change.time,
        to: null,
        level: valueAt(this.input.water, change.time) ?? 0,
        check: change.governs,
      })
      this.isFailing = true
    } else {
      this.closeFailure(change.time)
    }
  }

  private closeFailure(to: number): void {
    const open = this.failures.pop()!
    this.failures.push({ ...open, to })
    this.isFailing = false
  }

  /** First moment of the new state between two steps, by halving. */
  private changeBetween(before: EventState, after: EventMoment, fails: boolean): EventMoment {
    if (this.failures.length > MOST_SEARCHED) return after
    let start = before
    let end = after
    while (end.time - start.time > MOMENT_WIDTH) {
      const middle = start.copy()
      middle.advance((start.time + end.time) / 2)
      const moment = middle.exactMoment()
      if ((moment.verdict === 'fails') === fails) end = moment
      else start = middle
    }
    return end
  }
}

/** The whole answer in one go. */
export function sectionEvent(input: EventInput): EventAnswer {
  return new SectionEvent(input).answer()
}

function worstVerdict(moments: readonly EventMoment[]) {
  const verdicts = new Set(moments.map(({ verdict }) => verdict))
  return (['fails', 'narrow'] as const).find((verdict) => verdicts.has(verdict)) ?? 'holds'
}
