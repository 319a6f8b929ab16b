import { describe, expect, it } from 'vitest'
import { drySideThroughTime, type DrySide } from '../../../shared/calc/dry-side/dry-side'
import { inflowOf } from '../../../shared/calc/dry-side/inflow'
import type { InflowSource } from '../../../shared/calc/dry-side/inflow-source'
import { pondPump, type DryPump } from '../../../shared/calc/dry-side/pond-pumps'
import { ifOneIsPlugged } from '../../../shared/calc/dry-side/what-if'
import { pumpDuty } from '../../../shared/calc/pumping/pump-duty'
import { expectClose } from '../../support/close-to'

const HOUR = 3600
const PUMP: DryPump = {
  name: 'A',
  startLevel: 0.5,
  stopLevel: 0.2,
  outletLevel: 4,
  efficiency: 0.5,
  system: {
    viscosity: 1.3e-6,
    gravity: 9.81,
    pumps: 1,
    hose: { diameter: 0.075, length: 40, roughness: 1e-5, minorLoss: 3 },
    pumpCurve: [
      [0, 18],
      [0.007, 14.5],
      [0.014, 5],
    ],
  },
}
const spring = (name: string, flow: number, above = 0): InflowSource => ({
  kind: 'spring',
  name,
  flow,
  above,
})

/** A basin of 1000 m², dry at first; the water stands at 2 m. */
function basin(sources: readonly InflowSource[], change: Partial<DrySide> = {}): DrySide {
  return {
    sources,
    water: [
      { time: 10 * HOUR, value: 2 },
      { time: 20 * HOUR, value: 2 },
    ],
    storage: [
      { level: 0, area: 1000 },
      { level: 1, area: 1000 },
    ],
    pumps: [],
    initialLevel: 0,
    from: 10 * HOUR,
    duration: 5 * HOUR,
    step: 300,
    gravity: 9.81,
    ...change,
  }
}

describe('a pump on the dry side', () => {
  const pump = pondPump(PUMP, 0, 1.5)
  const dutyAt = (level: number) => pumpDuty({ ...PUMP.system, staticHead: 4 - level })

  it.each([-0.4, 0, 0.013, 0.7501, 1.4999, 1.5, 2.6])(
    'delivers its duty at a pond level of %s m',
    (level) => {
      expectClose(pump.flowAt(level), dutyAt(level).flow, 1e-6)
    },
  )

  it('takes the power of ρ g Q H/η there, and none is asked for without an efficiency', () => {
    const { flow, head } = dutyAt(0.4)
    expectClose(pump.powerAt!(0.4), (1000 * 9.81 * flow * head) / 0.5, 1e-12)
    const { efficiency: _, ...plain } = PUMP
    expect('powerAt' in pondPump(plain, 0, 1)).toBe(false)
    expect('failsAt' in pondPump(PUMP, 0, 1)).toBe(false)
    expect(pondPump({ ...PUMP, failsAt: 60 }, 0, 1).failsAt).toBe(60)
  })
})

describe('a basin under one inflow', () => {
  // By hand: 0.1 m³/s on 1000 m² are 0.36 m an hour.
  it('tells its levels by the hours of the case, each moment once', () => {
    const { pond, highest, reaches, sources } = drySideThroughTime(
      basin([spring('a', 0.1)], { thresholds: [0.9, 2.5] }),
    )
    expect(pond[0]).toEqual({ time: 10 * HOUR, value: 0 })
    const last = pond.at(-1)!
    expect(last.time).toBe(15 * HOUR)
    expectClose(last.value, 1.8, 1e-9)
    expect(highest.time).toBe(15 * HOUR)
    expectClose(highest.level, 1.8, 1e-9)
    expectClose(reaches[0]!.time!, 12.5 * HOUR, 1e-6)
    expect(reaches[1]).toEqual({ level: 2.5, time: null })
    expectClose(sources[0]!.volume, 1800, 1e-9)
    expect(sources[0]!.peak).toEqual({ time: 10 * HOUR, flow: 0.1 })
    for (let i = 1; i < pond.length; i += 1) {
      expect(pond[i]!.time).toBeGreaterThan(pond[i - 1]!.time)
    }
  })

  it('starts and stops its pump at the moments of the case', () => {
    const { events, pumps } = drySideThroughTime(
      basin([spring('a', 0.01)], { pumps: [PUMP], initialLevel: 0.49, duration: 10 * HOUR }),
    )
    const [start] = events
    // 10 mm on 1000 m² by 10 l/s: 1000 s.
    expectClose(start!.time, 10 * HOUR + 1000, 1e-9)
    expect(pumps[0]!.volume).toBeGreaterThan(0)
  })

  it('loses a pump at the hour of the case', () => {
    const running = { pumps: [{ ...PUMP, failsAt: 11 * HOUR }], initialLevel: 0.6 }
    const { pumps } = drySideThroughTime(basin([spring('a', 0.01)], running))
    expectClose(pumps[0]!.runningTime, HOUR, 1e-9)
  })
})

describe('water that is not known', () => {
  const weir = { kind: 'open-end', name: 'e', width: 1, sill: 2 } as const
  const volume = (readings: readonly (readonly [number, number | null])[]) =>
    drySideThroughTime(
      basin([weir], {
        water: readings.map(([hour, value]) => ({ time: hour * HOUR, value })),
        storage: [{ level: 0, area: 1e6 }],
        duration: HOUR,
      }),
    ).inflowVolume
  /** By hand: (2/3)^1.5 √g H^1.5 for an hour. */
  const over = (head: number) => (2 / 3) ** 1.5 * Math.sqrt(9.81) * head ** 1.5 * HOUR

  it('is the higher of both sides in a gap', () => {
    expectClose(
      volume([
        [9, 2.1],
        [10.5, null],
        [12, 2.3],
      ]),
      over(0.3),
      1e-9,
    )
    expectClose(
      volume([
        [9, 2.3],
        [10.5, null],
        [12, 2.1],
      ]),
      over(0.3),
      1e-9,
    )
  })

  it('is the nearest outside the readings', () => {
    expectClose(
      volume([
        [12, 2.2],
        [13, 2.9],
      ]),
      over(0.2),
      1e-9,
    )
    expectClose(
      volume([
        [7, 2.9],
        [9, 2.2],
      ]),
      over(0.2),
      1e-9,
    )
  })
})

describe('ways to the dry side', () => {
  const at = (waterLevel: number) => ({ time: 0, waterLevel, pondLevel: 0, gravity: 9.81 })

  it('wakes a spring above its level, not at it', () => {
    expect(inflowOf(spring('s', 0.1, 2), at(2))).toBe(0)
    expect(inflowOf(spring('s', 0.1, 2), at(2.01))).toBe(0.1)
  })

  it('throws waves over a crest by the height between them', () => {
    const crest = { kind: 'over-crest', name: 'o', crestLevel: 2.1, length: 10, waveHeight: 0.1 }
    // EurOtop 2018, eq. 7.1 (from memory), figure derived: 0.2234 l/s per m at R_c = H = 0.10 m.
    expect(inflowOf(crest as InflowSource, at(2)) * 100).toBeCloseTo(0.2234, 4)
  })
})

describe('which plug helps most', () => {
  it('is what keeps the threshold longest, then the lowest pond; rain comes anyhow', () => {
    const rain: InflowSource = { kind: 'brook', name: 'brook', flow: [{ time: 0, value: 0.02 }] }
    const sources = [
      spring('little', 0.02),
      rain,
      spring('much', 0.06),
      { ...spring('shut', 0.5), isPlugged: true },
      spring('middle', 0.04),
    ]
    // By hand: 0.14 m³/s in all; without much 0.08, middle 0.10, little 0.12 m³/s; 1.5 m are 1500 m³.
    const answers = ifOneIsPlugged(basin(sources), 1.5)
    expect(answers.map(({ source }) => source)).toEqual(['much', 'middle', 'little'])
    expect(answers[0]!.reaches).toBeNull()
    expectClose(answers[0]!.highest.level, 0.08 * 5 * 3.6, 1e-9)
    expectClose(answers[1]!.reaches!, 10 * HOUR + 15_000, 1e-6)
    expectClose(answers[2]!.reaches!, 10 * HOUR + 12_500, 1e-6)
    // Where the threshold is never reached, the lower pond is better.
    expect(ifOneIsPlugged(basin(sources), 9).map(({ source }) => source)).toEqual([
      'much',
      'middle',
      'little',
    ])
  })
})
