import { describe, expect, it } from 'vitest'
import { LOW_ROAD_MARKS } from '../../../server/demo/ferry-quay-marks'
import { LOW_ROAD_STATIONS, OFF_THE_GRAVEL_STATIONS } from '../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from '../../../server/demo/ferry-quay-scenarios'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { momentsOf } from '../../../shared/checks/event/event-trace'
import { sectionEvent } from '../../../shared/checks/event/section-event'
import { eventTimes } from '../../../shared/checks/line-event/event-times'
import type { JobOutcome } from '../../../shared/checks/line-event/job-outcome'
import { caseAtMoment, sectionsAt, traceAt } from '../../../shared/checks/line-event/line-at-moment'
import { lineEvent, sharesOf, workOf } from '../../../shared/checks/line-event/line-event'
import { lineEventAnswer } from '../../../shared/checks/line-event/line-event-answer'
import type { LineEventInput } from '../../../shared/checks/line-event/line-event-input'
import { planLineEvent } from '../../../shared/checks/line-event/line-event-plan'
import { LineEventRun } from '../../../shared/checks/line-event/line-event-run'
import { standingPond } from '../../../shared/checks/line-event/standing-pond'
import { expectClose } from '../../support/close-to'
import { clock, coldNight, flood } from '../../support/flood'

const HOUR = 3600
const SURVEY = { stations: OFF_THE_GRAVEL_STATIONS, sectionLength: 10, marks: LOW_ROAD_MARKS }
const AS_LAID = LOW_ROAD_SCENARIOS[1]!.content
const SETTINGS = {
  step: 900,
  timeToClear: 1200,
  groundBefore: 'soaked',
  air: null,
  pond: null,
} as const

function event(change: Partial<LineEventInput> = {}): LineEventInput {
  return { survey: SURVEY, content: AS_LAID, water: flood(), settings: SETTINGS, ...change }
}

/** Low road between two turns, where the ground lies at 2.87. */
const LOW_ROAD = {
  ...SURVEY,
  stations: LOW_ROAD_STATIONS.filter(({ chainage }) => chainage >= 60 && chainage <= 80),
}

const at = (answer: ReturnType<typeof lineEvent>, chainage: number) =>
  answer.sections.find(({ from }) => from === chainage)!

describe('a line through an event', () => {
  const answer = lineEvent(event())

  // An independent program for the same rules: 3.353 QD and about 05:42 at ch 40; bends not counted.
  it('says by place and hour when the barrier is left at Ferry Quay', () => {
    const { leave, firstFailure } = at(answer, 40).outcomes!.expected
    expect(Math.floor(leave.level! * 1000) / 1000).toBe(3.353)
    expect(clock(leave.time)).toBe('05:42')
    expect(firstFailure).toMatchObject({ check: 'sliding' })
    expect(Math.floor(firstFailure!.level * 1000) / 1000).toBe(3.403)
    // Skirt missing at the turn of 90 degrees: ch 50 comes first, see docs/ferry-quay.md.
    const { expected } = answer.bands
    expect(answer.sections[expected.first!.section]!.from).toBe(50)
    expect(clock(expected.leave!.time)).toBe('05:30')
  })

  // The same source: leave at 06:11 with the edges weighed, limited by ch 10 at 3.441 QD.
  it('leaves later with the edges weighed, and still before the crest', () => {
    const weighed = {
      ...AS_LAID,
      sizes: AS_LAID.sizes.map((run) =>
        run.from >= 40 && run.from < 150 ? { ...run, edgeFactor: 0.5 } : run,
      ),
    }
    const { expected } = lineEvent(event({ content: weighed })).bands
    expect(expected.first).toBeNull()
    expect(answer.sections[expected.leave!.section]!.from).toBe(10)
    expect(expected.leave!.level).toBeCloseTo(3.391, 3)
    expect(clock(expected.leave!.time)).toBe('06:11')
  })

  it('fails earlier and is left earlier the higher the water', () => {
    const { low, expected, high } = answer.bands
    expect([low.verdict, expected.verdict, high.verdict]).toEqual(['holds', 'fails', 'fails'])
    expect(high.failing).toBeGreaterThan(expected.failing)
    expect(high.first!.failure.from).toBeLessThan(expected.first!.failure.from)
    expect(high.leave!.time).toBeLessThan(expected.leave!.time!)
    expect(low.leave!.time).toBeNull()
  })

  it('says of each section what the event of that section alone says', () => {
    for (const chainage of [0, 50, 120]) {
      const { shown, gripShare, outcomes, lowest } = at(answer, chainage)
      const alone = sectionEvent({
        section: shown!.section,
        gripShare,
        groundLevel: lowest.groundLevel,
        water: flood().high,
        step: 900,
      })
      const { firstFailure, leave, holdsToLevel, leastFactor } = outcomes!.high
      expect(firstFailure?.check).toBe(alone.firstFailure?.check)
      expect(Math.abs((firstFailure?.from ?? 0) - (alone.firstFailure?.from ?? 0))).toBeLessThan(5)
      expect(Math.abs((leave.time ?? 0) - (alone.leave.time ?? 0))).toBeLessThan(5)
      expect(Math.abs(holdsToLevel! - alone.holdsToLevel!)).toBeLessThan(2e-4)
      const pulls = momentsOf(alone.trace).flatMap(({ skirt }) => skirt ?? [])
      const least = Math.min(alone.leastSliding!.value, ...pulls)
      expect(Math.abs(leastFactor!.value / least - 1)).toBeLessThan(1e-3)
    }
  })

  it('gives the same in shares and parts as in one go', () => {
    const input = event()
    const plan = planLineEvent(input)
    const outcomes: JobOutcome[] = []
    for (const share of sharesOf(plan, 2)) {
      const run = new LineEventRun(
        workOf(
          input,
          share.map((i) => plan.jobs[i]!),
        ),
      )
      const seen: number[] = []
      while (run.advance(37)) seen.push(run.progress)
      expect(seen.every((value, i) => value >= (seen[i - 1] ?? 0) && value <= 1)).toBe(true)
      run.answer().forEach((outcome, n) => (outcomes[share[n]!] = outcome))
    }
    expect(lineEventAnswer(plan, outcomes, input.water)).toEqual(answer)
  })

  it('computes equal sections once, and says the same of them as one by one', () => {
    const plan = planLineEvent(event())
    // Ch 90 to 100 and 100 to 110 are one size on one ground to 0.1 mm.
    const [a, b] = [at(answer, 90), at(answer, 100)]
    expect(a.pieces[0]!.firstJob).toBe(b.pieces[0]!.firstJob)
    const pieces = plan.sections.flatMap((section) => section.pieces).length
    expect(plan.jobs.length).toBeLessThan(3 * pieces)
    const single = { ...SURVEY, stations: OFF_THE_GRAVEL_STATIONS.filter((s) => s.chainage >= 100) }
    const alone = at(lineEvent(event({ survey: { ...single, marks: [] } })), 100)
    expect(alone.outcomes).toEqual(b.outcomes)
  })
})

describe('the night, the ground and the pond', () => {
  it('shows the cold in pressure and freeboard, and how little it changes', () => {
    const content = LOW_ROAD_SCENARIOS[0]!.content
    const cold = lineEvent(
      event({ survey: LOW_ROAD, content, settings: { ...SETTINGS, air: coldNight() } }),
    )
    const warm = lineEvent(event({ survey: LOW_ROAD, content }))
    const [a, b] = [at(cold, 60), at(warm, 60)].map(({ outcomes }) => outcomes!.expected)
    // 15.0 kPa at 12 degrees are 10.1 kPa at 0; crest 691 to 686 mm by an independent program.
    expect(a!.lowestAirPressure.value / 1000).toBeCloseTo(10.1, 1)
    const crest = (answer: typeof cold) =>
      sectionsAt(answer, 31 * HOUR).find(({ from }) => from === 60)!.crestLevel! - 2.87
    expect(crest(warm)).toBeCloseTo(0.691, 3)
    expect(crest(cold)).toBeCloseTo(0.686, 3)
    expect(b!.leastFreeboard!.value - a!.leastFreeboard!.value).toBeCloseTo(0.005, 3)
  })

  it('lets water under the skirt grow: the 0.70 m tube then holds Low road', () => {
    const asked = LOW_ROAD_SCENARIOS[0]!.content
    const open = at(lineEvent(event({ survey: LOW_ROAD, content: asked })), 60).outcomes!.expected
    expect(open.leastFactor!.value).toBeCloseTo(1.33, 2)
    expect(Math.floor(open.holdsToLevel! * 1000) / 1000).toBe(3.359)
    const uplift = { ...asked.uplift, model: 'developing', diffusivity: 1e-5 } as const
    const line = lineEvent(event({ survey: LOW_ROAD, content: { ...asked, uplift } }))
    const growing = at(line, 60).outcomes!.expected
    // An independent run of the method gave 2.59.
    expect(growing.firstFailure).toBeNull()
    expect(growing.leastFactor!.value).toBeCloseTo(2.59, 1)
    // The cross-section of a moment presses as the event does.
    const shown = at(line, 60).shown!
    const moment = traceAt(shown.trace, 31 * HOUR)!
    const drawn = evaluateSection(caseAtMoment(shown, moment))
    expectClose(drawn.vertical.uplift, moment.uplift, 1e-6)
    expectClose(drawn.sliding.factor!, moment.sliding!, 1e-6)
  })

  it('lets gravel fail from when the water comes to it, and nothing where nothing is laid', () => {
    const content = { ...AS_LAID, sizes: AS_LAID.sizes.filter(({ from }) => from !== 160) }
    const survey = { ...SURVEY, stations: LOW_ROAD_STATIONS }
    const answer = lineEvent(event({ survey, content }))
    const gravel = at(answer, 140).outcomes!.expected
    expect(gravel.firstFailure!.check).toBe('ground')
    expect(gravel.firstFailure!.level).toBeCloseTo(2.97, 6)
    const bare = at(answer, 170)
    expect(bare).toMatchObject({ gap: 'no-size', outcomes: null, shown: null, pieces: [] })
    expect(answer.bands.expected.notChecked).toBe(2)
    expect(sectionsAt(answer, 31 * HOUR).at(-1)).toMatchObject({ verdict: 'notChecked' })
  })

  it('has water on the dry side only while the flood stands as high', () => {
    const wet = lineEvent(event({ content: { ...AS_LAID, dryLevel: 2.95 } }))
    const [a, b] = [at(wet, 50), at(lineEvent(event()), 50)].map(
      ({ outcomes }) => outcomes!.expected,
    )
    expect(a!.firstFailure!.from).toBeGreaterThan(26 * HOUR)
    expect(a!.firstFailure!.from).toBeLessThan(b!.firstFailure!.from)
    const pond = standingPond(flood().expected, 2.95)
    expect(Math.max(...pond.map(({ value }) => value))).toBe(2.95)
  })
})

describe('gaps and what cannot be computed', () => {
  const broken = flood().expected.map((reading) =>
    reading.time === 27 * HOUR ? { ...reading, value: null } : reading,
  )

  it('computes nothing in a gap and says so', () => {
    const water = { low: broken, expected: broken, high: broken }
    const answer = lineEvent(event({ water }))
    expect(answer.gaps).toEqual([{ from: 26.5 * HOUR, to: 27.5 * HOUR }])
    expect(answer.hasBand).toBe(false)
    expect(answer.bands.low).toEqual(answer.bands.expected)
    expect(sectionsAt(answer, 27 * HOUR).every(({ verdict }) => verdict === 'notChecked')).toBe(
      true,
    )
    expect(eventTimes(water, 900).some(({ time }) => time === 27 * HOUR)).toBe(false)
  })

  it('names every fault before anything is computed', () => {
    const air = { filledAt: 12, temperature: [{ time: 0, value: 90 }] }
    const run = () => lineEvent(event({ settings: { ...SETTINGS, air, step: 0 } }))
    expect(run).toThrow(/air\.readings\[0\]\.temperature: 90 is not allowed/)
    expect(run).toThrow(/step: 0 is not allowed; it must be 1 to 10800 s/)
  })
})
