import { describe, expect, it } from 'vitest'
import { pondThroughTime, type PondInput } from '../../../shared/calc/ponding/pond'
import { pondInputOf } from '../../../shared/calc/ponding/pond-from-case'
import { stageStorage } from '../../../shared/calc/ponding/stage-storage'
import { pumpDuty } from '../../../shared/calc/pumping/pump-duty'
import { OutOfRangeError } from '../../../shared/errors'
import { pondingCaseSchema } from '../../../shared/schemas/ponding-case'
import { expectClose } from '../../support/close-to'

const caseOf = (change: object) =>
  pondingCaseSchema.parse({ area: 1000, inflow: 0.05, duration: 3600, initialLevel: 0, ...change })

/** 1000 m² with upright sides and 0.1 m³/s: 0.1 mm a second. */
const basin = (change: Partial<PondInput> = {}): PondInput => ({
  storage: stageStorage([{ level: 0, area: 1000 }]),
  inflowAt: () => 0.1,
  pumps: [],
  initialLevel: 0,
  duration: 3600,
  step: 60,
  ...change,
})

function faultsOf(run: () => unknown): readonly string[] {
  try {
    run()
  } catch (error) {
    if (error instanceof OutOfRangeError) return error.faults.map(({ message }) => message)
    throw error
  }
  return []
}

describe('a pond from a case as it is sent', () => {
  const run = (change: object) => pondThroughTime(pondInputOf(caseOf(change)))

  it('rises by inflow over area, also from below the zero of its levels', () => {
    expectClose(run({}).highest.level, 0.18, 1e-9)
    expectClose(run({ initialLevel: -2 }).highest.level, -1.82, 1e-9)
    expectClose(run({ initialLevel: 1.5 }).highest.level, 1.68, 1e-9)
  })

  it('follows an inflow that changes, and a table of areas', () => {
    // By hand: 0.1 t/3600 m³/s over the hour are 180 m³; areas from 0 to 400 m² hold 200 z².
    const inflow = [
      [0, 0],
      [3600, 0.1],
    ]
    const table = [
      [0, 0],
      [1, 400],
    ]
    const { inflowVolume, highest } = run({ inflow, area: undefined, areaTable: table })
    expectClose(inflowVolume, 180, 1e-9)
    expectClose(highest.level, Math.sqrt(180 / 200), 1e-6)
  })

  it('starts and stops its one pump, and has none without a flow', () => {
    // By hand: 0.1 m are there after 2000 s; then 0.05 m³/s less each second.
    const pumped = run({ pump: 0.1, startLevel: 0.1, stopLevel: 0.05 })
    expect(pumped.events[0]).toMatchObject({ pump: 'pump', what: 'starts' })
    expectClose(pumped.events[0]!.time, 2000, 1e-9)
    expectClose(pumped.events[1]!.time, 3000, 1e-9)
    expectClose(pumped.pumpedVolume, 100, 1e-9)
    expect(run({ pump: 0 }).pumps).toEqual([])
  })

  it('takes pumps with a flow of their own or with curve and hose, and loses them in time', () => {
    const system = {
      viscosity: 1.3e-6,
      gravity: 9.81,
      pumps: 1,
      hose: { diameter: 0.1, length: 40, roughness: 1e-5, minorLoss: 3 },
      pumpCurve: [
        [0, 16],
        [0.012, 13],
        [0.025, 6],
      ] as [number, number][],
    }
    const lasting = { startLevel: -0.5, stopLevel: -1, failsAt: 600 }
    const { pumps, events } = run({
      pumps: [
        { name: 'plain', flow: 0.02, ...lasting },
        { name: 'curve', system, outletLevel: 3, startLevel: -0.5, stopLevel: -1 },
      ],
    })
    expectClose(pumps[0]!.volume, 0.02 * 600, 1e-9)
    expectClose(pumps[0]!.runningTime, 600, 1e-9)
    expect(events.filter(({ what }) => what === 'fails')).toEqual([
      { time: 600, pump: 'plain', what: 'fails' },
    ])
    // The pond rises by a few centimetres only: the flow is that of 3 m of static head.
    const { flow } = pumpDuty({ ...system, staticHead: 3 })
    expectClose(pumps[1]!.volume / 3600, flow, 0.01)
  })
})

describe('a run of the pond', () => {
  it('tells a threshold at which it begins, on which it ends, and one that it misses', () => {
    const { reaches } = pondThroughTime(
      basin({ initialLevel: 0.1, thresholds: [0.05, 0.1, 0.2, 0.46, 0.47] }),
    )
    const times = reaches.map(({ time }) => time)
    expect(times.slice(0, 2)).toEqual([0, 0])
    expectClose(times[2]!, 1000, 1e-9)
    expectClose(times[3]!, 3600, 1e-9)
    expect(times[4]).toBeNull()
  })

  it('names the highest pond by its first moment, and ends on its duration', () => {
    const level = pondThroughTime(basin({ inflowAt: () => 0, initialLevel: 0.3 }))
    expect(level.highest).toEqual({ time: 0, level: 0.3 })
    expect(pondThroughTime(basin({ step: 7 })).moments.at(-1)!.time).toBe(3600)
    expect(pondThroughTime(basin({ step: 1e6 })).moments).toHaveLength(2)
  })

  it('counts flow, time and energy of each pump by itself', () => {
    const pump = (name: string, flow: number, power: number) => ({
      name,
      startLevel: 0.1,
      stopLevel: 0,
      flowAt: () => flow,
      powerAt: () => power,
    })
    const { pumps, inflowVolumes } = pondThroughTime(
      basin({
        inflowAt: () => [0.06, 0.04],
        initialLevel: 0.2,
        pumps: [pump('a', 0.02, 1000), pump('b', 0.03, 2000)],
      }),
    )
    expect(inflowVolumes[0]).toBeCloseTo(216, 9)
    expect(inflowVolumes[1]).toBeCloseTo(144, 9)
    expect(pumps.map(({ pump: name }) => name)).toEqual(['a', 'b'])
    for (const [i, [flow, power]] of [
      [0.02, 1000],
      [0.03, 2000],
    ].entries()) {
      expectClose(pumps[i]!.volume, flow! * 3600, 1e-9)
      expectClose(pumps[i]!.runningTime, 3600, 1e-9)
      expectClose(pumps[i]!.energy, power! * 3600, 1e-9)
    }
  })

  it('gives an empty sump no more than what runs into it', () => {
    const pump = { name: 'a', startLevel: 0, stopLevel: -1, flowAt: () => 0.5 }
    const { pumpedVolume, stored } = pondThroughTime(basin({ pumps: [pump] }))
    expectClose(pumpedVolume, 360, 1e-6)
    expect(Math.abs(stored)).toBeLessThan(1e-6)
  })
})

describe('a pond that cannot be', () => {
  const pump = { name: 'a', startLevel: 1, stopLevel: 1, flowAt: () => 1 }

  it.each([
    [
      'start and stop at one level',
      { pumps: [pump] },
      'pumps[0].stopLevel: 1 is not allowed; it must be -Infinity to below 1 m',
    ],
    ['no duration', { duration: 0 }, 'duration: 0 is not allowed; it must be above 0 s'],
    ['no end', { duration: Infinity }, 'duration: Infinity is not allowed; it must be above 0 s'],
    ['no step', { step: 0 }, 'step: 0 is not allowed; it must be above 0 s'],
    [
      'more than a million steps',
      { step: 0.0035 },
      'step: 0.0035 is not allowed; it must be above 0.0036 s',
    ],
    [
      'no level',
      { initialLevel: NaN },
      'initialLevel: NaN is not allowed; it must be -Infinity or more m',
    ],
    ['a threshold that is none', { thresholds: [1, NaN] }, 'thresholds[1]: NaN is not allowed'],
  ])('has %s', (_what, change, message) => {
    const faults = faultsOf(() => pondThroughTime(basin(change)))
    expect(faults).toHaveLength(1)
    expect(faults[0]!.slice(0, 30)).toBe(message.slice(0, 30))
  })

  it('may have a million steps, and no fewer levels than one', () => {
    expect(faultsOf(() => stageStorage([]))).toEqual([
      'storage: 0 is not allowed; it must be 1 rows or more',
    ])
  })

  it('has a table whose levels rise, and an area at the top', () => {
    const flat = [
      { level: 1, area: 10 },
      { level: 1, area: 20 },
    ]
    expect(faultsOf(() => stageStorage(flat))).toEqual([
      'storage[1].level: 1 is not allowed; it must be above 1 m',
    ])
    expect(faultsOf(() => stageStorage([{ level: NaN, area: 1 }]))[0]).toContain('storage[0].level')
    expect(faultsOf(() => stageStorage([{ level: 0, area: 0 }]))).toEqual([
      'storage[0].area: 0 is not allowed; it must be above 0 m²',
    ])
    const lower = [
      { level: 0, area: -1 },
      { level: 1, area: 5 },
    ]
    expect(faultsOf(() => stageStorage(lower))).toEqual([
      'storage[0].area: -1 is not allowed; it must be 0 m² or more',
    ])
    expect(
      faultsOf(() =>
        stageStorage([
          { level: 0, area: 0 },
          { level: 1, area: 5 },
        ]),
      ),
    ).toEqual([])
  })

  it('chatters where start and stop cannot be told apart', () => {
    const close = { name: 'a', startLevel: 0.5, stopLevel: 0.5 - 1e-13, flowAt: () => 1 }
    const [fault] = faultsOf(() => pondThroughTime(basin({ pumps: [close], initialLevel: 0.5 })))
    expect(fault).toMatch(/^pumps: start and stop lie so close that a pump chatters at \d/)
  })
})

it('gives volume and level of a table back to each other', () => {
  // By hand: 100 m² at 0, 300 m² at 1 m, upright above: 200 m³ to 1 m, 350 m³ to 1.5 m.
  const storage = stageStorage([
    { level: 0, area: 100 },
    { level: 1, area: 300 },
  ])
  expect(storage.lowest).toBe(0)
  expectClose(storage.volumeAt(1), 200, 1e-12)
  expectClose(storage.volumeAt(1.5), 350, 1e-12)
  expectClose(storage.volumeAt(0.5), 75, 1e-12)
  expect(storage.volumeAt(-1)).toBe(0)
  for (const level of [0, 0.2, 0.5, 1, 1.2]) {
    expectClose(storage.levelAt(storage.volumeAt(level)), level, 1e-12)
  }
  const cone = stageStorage([
    { level: 0, area: 0 },
    { level: 1, area: 10 },
  ])
  expect(cone.levelAt(0)).toBe(0)
})
