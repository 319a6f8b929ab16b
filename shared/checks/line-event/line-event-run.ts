import { firstReaching, stretchesOf, type TimeSeries } from '../../calc/series/time-series'
import { OutOfRangeError, type Fault } from '../../errors'
import type { Failure } from '../event/event-answer'
import { eventFaults } from '../event/event-faults'
import type { EventInput } from '../event/event-input'
import type { EventMoment } from '../event/event-trace'
import { KeptChecks } from '../event/kept-checks'
import { SectionEvent } from '../event/section-event'
import type { HoldingProfiles } from '../line-check'
import { jobLimits } from './job-limits'
import type { JobOutcome, LeastFactor } from './job-outcome'
import type { BandSeries, LineEventSettings } from './line-event-input'
import type { EventJob } from './line-event-plan'
import { standingPond } from './standing-pond'

/** What one worker computes. */
export interface LineEventWork {
  readonly jobs: readonly EventJob[]
  readonly water: BandSeries
  readonly settings: LineEventSettings
  /** Water standing on the dry side in the scenario [m]; null: none. */
  readonly dryLevel: number | null
}

/**
 * Jobs of a line through an event, a part at a time: whoever runs it shows its progress, or stops it by
 * not asking for more. The same jobs give the same outcomes in whatever parts and shares they are run.
 */
export class LineEventRun {
  private readonly outcomes: JobOutcome[] = []
  private readonly kept = new Map<string, KeptChecks>()
  private readonly profiles: HoldingProfiles = new Map()
  private readonly ponds = new Map<TimeSeries, EventInput['pond']>()
  private current: { readonly input: EventInput; readonly event: SectionEvent } | null = null

  /** @throws OutOfRangeError with every fault of the series and settings. */
  constructor(private readonly work: LineEventWork) {
    const faults = lineEventFaults(work)
    if (faults.length > 0) throw new OutOfRangeError(faults)
  }

  /** Share that is done, 0 to 1. */
  get progress(): number {
    const { current, outcomes } = this
    const begun = current ? current.event.done / current.event.total : 0
    return this.work.jobs.length === 0 ? 1 : (outcomes.length + begun) / this.work.jobs.length
  }

  /** Computes up to so many further steps; false once there are none left. */
  advance(steps: number): boolean {
    let left = steps
    while (left > 0) {
      const { current } = this
      if (!current) {
        const job = this.work.jobs[this.outcomes.length]
        if (!job) return false
        const input = this.inputOf(job)
        this.current = { input, event: new SectionEvent(input) }
        continue
      }
      const before = current.event.done
      if (!current.event.advance(left)) this.finish(current)
      left -= Math.max(1, current.event.done - before)
    }
    return this.outcomes.length < this.work.jobs.length
  }

  /** Outcomes in the order of the jobs; computes what is left first. */
  answer(): readonly JobOutcome[] {
    while (this.advance(Number.MAX_SAFE_INTEGER));
    return this.outcomes
  }

  private finish({ input, event }: { input: EventInput; event: SectionEvent }): void {
    const job = this.work.jobs[this.outcomes.length]!
    const { moments, highest, trace, ...history } = event.history()
    const limits = jobLimits(input, moments, { highest, profiles: this.profiles })
    const { verdict, worst, leastFreeboard, lowestAirPressure } = history
    const failures = wetFailures(history.failures, input)
    this.outcomes.push({
      verdict,
      worst,
      firstFailure: failures[0] ?? null,
      failures,
      leastFactor: leastFactor(moments),
      leastFreeboard,
      lowestAirPressure,
      ...limits,
      trace: job.band === 'expected' ? trace : null,
    })
    this.current = null
  }

  private inputOf({ section, gripShare, groundLevel, band }: EventJob): EventInput {
    const { step, timeToClear, groundBefore, air } = this.work.settings
    const water = this.work.water[band]
    const pond = this.pondOf(water)
    return {
      section,
      gripShare,
      groundLevel,
      water,
      step,
      timeToClear,
      groundBefore,
      kept: this.keptFor(section, gripShare),
      ...(air ? { air } : {}),
      ...(pond ? { pond } : {}),
    }
  }

  private pondOf(water: TimeSeries): EventInput['pond'] {
    const { settings, dryLevel } = this.work
    if (settings.pond) return settings.pond
    if (dryLevel === null) return undefined
    const kept = this.ponds.get(water) ?? standingPond(water, dryLevel)
    this.ponds.set(water, kept)
    return kept
  }

  private keptFor(section: EventJob['section'], gripShare: number): KeptChecks {
    const key = JSON.stringify([gripShare, section])
    const kept = this.kept.get(key) ?? new KeptChecks()
    this.kept.set(key, kept)
    return kept
  }
}

/** Everything that keeps an event of a line from being computed: its series and its settings. */
export function lineEventFaults(work: LineEventWork): readonly Fault[] {
  const { jobs, water, settings } = work
  const seen = new Map<string, Fault>()
  for (const band of new Set(jobs.map((job) => job.band))) {
    const job = jobs.find((one) => one.band === band)!
    const { step, timeToClear, groundBefore, air, pond } = settings
    const input = {
      ...{ section: job.section, groundLevel: job.groundLevel, water: water[band] },
      ...{ step, timeToClear, groundBefore },
      ...(air ? { air } : {}),
      ...(pond ? { pond } : {}),
    }
    for (const fault of eventFaults(input)) seen.set(fault.message, fault)
  }
  return [...seen.values()]
}

/** Unsuitable ground fails whatever the figures say; here from when the water comes to it. */
function wetFailures(failures: readonly Failure[], input: EventInput): readonly Failure[] {
  const { groundLevel, water } = input
  return failures.flatMap((failure) => {
    if (failure.level > groundLevel) return [failure]
    const later = stretchesOf(water)
      .map((stretch) => stretch.filter(({ time }) => time >= failure.from))
      .flatMap((stretch) => firstReaching(stretch, groundLevel) ?? [])
    const from = later[0]
    const isOver = from === undefined || (failure.to !== null && from >= failure.to)
    return isOver ? [] : [{ ...failure, from, level: groundLevel }]
  })
}

/** The least of both factors of the friction resistance; null where nothing ever presses. */
function leastFactor(moments: readonly EventMoment[]): LeastFactor | null {
  let found: LeastFactor | null = null
  for (const { time, sliding, skirt } of moments) {
    if (sliding !== null && (!found || sliding < found.value)) {
      found = { time, value: sliding, check: 'sliding' }
    }
    if (skirt !== null && (!found || skirt < found.value)) {
      found = { time, value: skirt, check: 'skirt' }
    }
  }
  return found
}
