import { cpus } from 'node:os'
import { loadedShape } from '../../shared/calc/loaded-shape/loaded-shape'
import { horizontalLoads } from '../../shared/calc/section/horizontal-loads'
import { sectionGeometry } from '../../shared/calc/section/section-geometry'
import { verticalLoads } from '../../shared/calc/section/vertical-loads'
import { compare } from '../../shared/checks/compare'
import { evaluateSection } from '../../shared/checks/evaluate-section'
import { SectionEvent } from '../../shared/checks/event/section-event'
import { sharesOf, workOf } from '../../shared/checks/line-event/line-event'
import { planLineEvent } from '../../shared/checks/line-event/line-event-plan'
import { LineEventRun } from '../../shared/checks/line-event/line-event-run'
import { globalPairs } from '../../shared/checks/global-checks'
import { holdingProfile } from '../../shared/checks/holds-to'
import { sectionState } from '../../shared/checks/section-state'
import { GROUNDS } from '../../shared/catalogue/grounds'
import { scenarioContentSchema, type ScenarioBarrier } from '../../shared/schemas/scenario'
import type { SectionCase } from '../../shared/schemas/section-case'
import { bestLayout } from '../../shared/checks/layout/best-layout'
import { exampleSection } from '../../shared/verification/example-section'

interface Task {
  readonly name: string
  /** Upper bound of the median [µs]; null: printed only. */
  readonly gate: number | null
  readonly run: (i: number) => unknown
}

/** Keeps results alive, so that the compiler cannot drop the work. */
let sink: unknown

/** Depths a little apart, so that no call repeats the one before it. */
const sections: readonly SectionCase[] = Array.from({ length: 97 }, (_, i) =>
  exampleSection({ water: { depth: 0.2 + 0.004 * i } }),
)
const sectionAt = (i: number): SectionCase => sections[i % sections.length]!
const first = sectionState(sectionAt(0))

/** Five tubes that grow with their diameter. */
const fiveTubes: readonly ScenarioBarrier[] = [0.5, 0.6, 0.7, 0.85, 1].map((diameter) => ({
  diameter,
  skirtLength: 3.1 * diameter,
  contactWidth: 0.17 * diameter,
  mass: 7.2 * diameter,
  airPressure: 12_000 + 8000 * (diameter - 0.4),
  sectionLength: 10,
  fabricStrength: 60_000,
  name: String(diameter),
  statedHeight: diameter,
  catalogueId: String(diameter),
  catalogueRevision: 1,
}))

const lineContent = scenarioContentSchema.parse({
  waterLevel: 3.42,
  place: 0,
  sizes: [{ from: 0, to: 20_000, barrier: fiveTubes[0] }],
  grounds: GROUNDS.map(({ id, friction }) => ({ surface: id, friction })),
})

/** 20 km of waves in the ground, on three surfaces. */
function longLine(shift: number) {
  const stations = Array.from({ length: 2001 }, (_, i) => ({
    chainage: 10 * i,
    x: null,
    y: null,
    groundLevel: 2.8 + 0.4 * Math.sin((i + shift) / 7) + 0.05 * Math.cos(1.3 * i),
    surface: ['turf', 'concrete', 'asphalt'][Math.floor(i / 40) % 3]!,
    clearWidth: null,
    note: '',
  }))
  return { stations, sectionLength: 10 }
}

/** Everything but the loaded shape: loads, moments, ratios. */
function rigidCheck(section: SectionCase): readonly unknown[] {
  const geometry = sectionGeometry(section)
  const state = {
    ...first,
    section,
    geometry,
    horizontal: horizontalLoads(section, section.barrier.diameter),
    vertical: verticalLoads(section, geometry),
  }
  const { sliding, overturning, flotation } = globalPairs(state)
  return [compare(sliding, 1.5), compare(overturning, 1.5), compare(flotation, 1.2)]
}

/** A tide of 24 h in 1000 steps: rising, falling, with water under the skirt that grows and recedes. */
function eventStep(): () => unknown {
  const section = exampleSection({ uplift: { model: 'developing', diffusivity: 1e-5 } })
  const water = Array.from({ length: 49 }, (_, i) => ({
    time: 1800 * i,
    value: 0.3 - 0.25 * Math.cos((Math.PI * i) / 24),
  }))
  const input = { section, groundLevel: 0, water, step: 86_400 / 1000 }
  let event = new SectionEvent(input)
  return () => {
    if (!event.advance(1)) event = new SectionEvent(input)
    return event
  }
}

/** 500 sections, each with its own depth; what one costs. */
function lineSection(): (i: number) => unknown {
  const line = Array.from({ length: 500 }, (_, i) =>
    exampleSection({ water: { depth: 0.1 + 0.001 * i } }),
  )
  return (i) => evaluateSection(line[i % line.length]!)
}

/** Two days with a tide of 1.0 m, and its band. */
const tide = (shift: number) =>
  Array.from({ length: 97 }, (_, i) => ({
    time: 1800 * i,
    value: 2.4 + shift + 0.5 * (1 - Math.cos((Math.PI * i) / 48)),
  }))

/** 500 sections of three sizes, no two on one ground, through 1000 steps of low, expected and high. */
function lineThroughTime() {
  const { stations } = longLine(0)
  const laid = stations.slice(0, 500).map(({ chainage, groundLevel }, i) => {
    const depth = 3.42 - Math.min(groundLevel, stations[i + 1]!.groundLevel)
    const barrier = fiveTubes[depth < 0.35 ? 0 : depth < 0.55 ? 2 : 4]!
    return { from: chainage, to: chainage + 10, barrier, edgeFactor: null }
  })
  return {
    survey: { stations: stations.slice(0, 501), sectionLength: 10 },
    content: { ...lineContent, sizes: laid },
    water: { low: tide(-0.12), expected: tide(0), high: tide(0.12) },
    settings: {
      ...{ step: (48 * 3600) / 1000, timeToClear: 1200, groundBefore: 'soaked' as const },
      ...{ air: null, pond: null },
    },
  }
}

/** What the busier of two workers takes: processor time, as somebody else may use this machine. */
function busierWorker(): number {
  const input = lineThroughTime()
  const plan = planLineEvent(input)
  const taken = sharesOf(plan, 2).map((share) => {
    const before = process.cpuUsage()
    const jobs = share.map((i) => plan.jobs[i]!)
    sink = new LineEventRun(workOf(input, jobs)).answer()
    const { user, system } = process.cpuUsage(before)
    return (user + system) / 1e6
  })
  return Math.max(...taken)
}

/** Upper bound of one worker's share of a line through an event [s]. */
const LINE_EVENT_GATE = 6

const TASKS: readonly Task[] = [
  {
    name: 'loaded shape alone',
    gate: 21,
    run: (i) =>
      loadedShape({
        diameter: 0.7,
        airPressure: 15_000,
        wettedSkirt: 2.2,
        depth: sectionAt(i).water.depth,
        unitWeight: 9810,
      }),
  },
  { name: 'rigid check', gate: 5, run: (i) => rigidCheck(sectionAt(i)) },
  { name: 'check with loaded shape', gate: 30, run: (i) => evaluateSection(sectionAt(i)) },
  {
    name: 'best layout, 2000 sections, 5 sizes',
    gate: 200_000,
    run: (i) => bestLayout(longLine(i), lineContent, fiveTubes),
  },
  { name: 'step of a 1000-step event, growing uplift', gate: 90, run: eventStep() },
  { name: 'section of a 500-section line', gate: 90, run: lineSection() },
  { name: 'holds-to, whole profile', gate: null, run: (i) => holdingProfile(sectionAt(i)) },
]

/** Median time of one call over 41 batches, after a warm-up [µs]. */
function medianMicroseconds(run: (i: number) => unknown): number {
  const batch = batchSize(run)
  const times: number[] = []
  for (let round = 0; round < 41; round += 1) {
    const started = performance.now()
    for (let i = 0; i < batch; i += 1) sink = run(round * batch + i)
    times.push(((performance.now() - started) / batch) * 1000)
  }
  return times.sort((a, b) => a - b)[20]!
}

/** Calls that fill about 20 ms, found while warming up. */
function batchSize(run: (i: number) => unknown): number {
  let calls = 0
  const started = performance.now()
  while (performance.now() - started < 300) {
    sink = run(calls)
    calls += 1
  }
  return Math.max(1, Math.round(calls / 15))
}

console.log(
  `${cpus().length} × ${cpus()[0]?.model ?? 'unknown processor'}, Node ${process.version}`,
)
let isOver = false
for (const { name, gate, run } of TASKS) {
  const median = medianMicroseconds(run)
  const bound = gate === null ? '' : `, gate ${gate} µs`
  const failed = gate !== null && median > gate
  isOver ||= failed
  console.log(`${failed ? 'OVER ' : 'ok   '}${name}: ${median.toFixed(2)} µs${bound}`)
}
const share = [busierWorker(), busierWorker(), busierWorker()].sort((a, b) => a - b)[1]!
const isLate = share > LINE_EVENT_GATE
isOver ||= isLate
console.log(
  `${isLate ? 'OVER ' : 'ok   '}500 sections × 1000 steps × 3 bands, busier of two workers: ` +
    `${share.toFixed(2)} s of processor, gate ${LINE_EVENT_GATE} s`,
)
if (sink === undefined || isOver) process.exitCode = 1
