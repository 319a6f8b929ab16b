import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { drySideThroughTime, type DrySide } from '../../../shared/calc/dry-side/dry-side'
import { inflowOf } from '../../../shared/calc/dry-side/inflow'
import type { InflowSource } from '../../../shared/calc/dry-side/inflow-source'
import { ifOneIsPlugged, ifPumpStops } from '../../../shared/calc/dry-side/what-if'
import { groundSeepage } from '../../../shared/calc/ground/ground-seepage'
import { pondThroughTime } from '../../../shared/calc/ponding/pond'
import { stageStorage } from '../../../shared/calc/ponding/stage-storage'
import { OutOfRangeError } from '../../../shared/errors'
import { expectClose } from '../../support/close-to'
import { seepageByDifferences } from '../../support/seepage-grid'

const HOUR = 3600
const SILL = 2.72

/** An invented tide: 2.34 m at 22:00, crest 3.42 m at 07:00. */
const FLOOD = [
  [22, 2.34],
  [23, 2.43],
  [24, 2.54],
  [25, 2.68],
  [26, 2.84],
  [27, 3],
  [28, 3.16],
  [29, 3.29],
  [30, 3.38],
  [30.5, 3.41],
  [31, 3.42],
  [31.5, 3.42],
  [32, 3.4],
  [33, 3.34],
  [34, 3.25],
  [36, 3.06],
] as const
const GULLY: InflowSource = {
  kind: 'opening',
  name: 'gully',
  area: (Math.PI * 0.15 ** 2) / 4,
  invert: 2.62,
  coefficient: 0.6,
}
const WELL: InflowSource = { kind: 'spring', name: 'well', flow: 0.0006, above: 2.7 }
const RAIN: InflowSource = {
  kind: 'rain',
  name: 'rain',
  coefficient: 0.75,
  area: 3200,
  intensity: [{ time: 23 * HOUR, value: 6e-3 / HOUR }],
}
const hose = (diameter: number, length: number) => ({
  diameter,
  length,
  roughness: 1e-5,
  minorLoss: 3,
})
const system = { viscosity: 1.3063e-6, gravity: 9.81, pumps: 1 }
const PUMP_A = {
  name: 'A',
  startLevel: 2.52,
  stopLevel: 2.1,
  outletLevel: 4.4,
  efficiency: 0.45,
  system: {
    ...system,
    hose: hose(0.075, 40),
    pumpCurve: [
      [0, 18],
      [0.007, 14.5],
      [0.014, 5],
    ] as const,
  },
}
const PUMP_B = {
  name: 'B',
  startLevel: 2.58,
  stopLevel: 2.3,
  outletLevel: 4.4,
  system: {
    ...system,
    hose: hose(0.05, 20),
    pumpCurve: [
      [0, 9],
      [0.003, 7.5],
      [0.0065, 3.5],
    ] as const,
  },
}
const QUAY: DrySide = {
  sources: [GULLY, WELL, RAIN],
  water: FLOOD.map(([hour, value]) => ({ time: hour * HOUR, value })),
  storage: [
    { level: 2, area: 0 },
    { level: 2.5, area: 15 },
    { level: 2.58, area: 60 },
    { level: 2.66, area: 240 },
    { level: 2.75, area: 620 },
    { level: 2.85, area: 1150 },
  ],
  pumps: [PUMP_A, PUMP_B],
  initialLevel: 2.1,
  from: 22 * HOUR,
  duration: 12 * HOUR,
  step: 120,
  gravity: 9.81,
  thresholds: [SILL],
}
const plugged = { ...GULLY, isPlugged: true }
const hourOf = (time: number | null): number => (time ?? NaN) / HOUR

describe('water on the dry side, by source', () => {
  it('follows from the head over the higher of its outlet and the pond', () => {
    const at = (waterLevel: number, pondLevel = 2.5) =>
      inflowOf(GULLY, { time: 0, waterLevel, pondLevel, gravity: 9.81 })
    // C_d A √(2 g h) by hand: 22 l/s at 2.84 m, 42 l/s at 3.42 m.
    expect(at(2.84)).toBeCloseTo(0.022, 4)
    expect(at(3.42)).toBeCloseTo(0.042, 4)
    expect(at(2.5)).toBe(0)
    expect(at(3.42, 3.42)).toBe(0)
    expect(at(3, 2.8)).toBeCloseTo(0.6 * GULLY.area * Math.sqrt(2 * 9.81 * 0.2), 12)
  })

  it('lets a round end flow freely, and drown without a step', () => {
    const end: InflowSource = { kind: 'open-end', name: 'end', width: 2, sill: 1 }
    const at = (pondLevel: number) =>
      inflowOf(end, { time: 0, waterLevel: 1.3, pondLevel, gravity: 9.81 })
    expectClose(at(0), 2 * (2 / 3) ** 1.5 * Math.sqrt(9.81) * 0.3 ** 1.5, 1e-12)
    expectClose(at(1.2 + 1e-9), at(1.2 - 1e-9), 1e-6)
    expect(at(1.3)).toBe(0)
  })

  it('never is below nothing, and nothing where it is plugged', () => {
    const ways: InflowSource[] = [
      GULLY,
      WELL,
      RAIN,
      {
        kind: 'seepage',
        name: 's',
        permeability: 1e-4,
        layerThickness: 2,
        baseWidth: 2.3,
        length: 50,
        groundLevel: 2.9,
      },
      {
        kind: 'creases',
        name: 'c',
        height: 1e-3,
        path: 2.2,
        length: 10,
        viscosity: 1.3e-6,
        groundLevel: 2.9,
      },
      { kind: 'joint', name: 'j', flowPerHead: 1e-4, groundLevel: 2.9 },
      { kind: 'open-end', name: 'e', width: 1, sill: 2.9 },
      { kind: 'over-crest', name: 'o', crestLevel: 3.4, length: 10, waveHeight: 0.1 },
      { kind: 'brook', name: 'b', flow: [{ time: 0, value: 0.01 }] },
    ]
    const level = fc.double({ min: 1, max: 5, noNaN: true })
    fc.assert(
      fc.property(level, level, fc.constantFrom(...ways), (waterLevel, pondLevel, way) => {
        const moment = { time: 0, waterLevel, pondLevel, gravity: 9.81 }
        const flow = inflowOf(way, moment)
        expect(flow).toBeGreaterThanOrEqual(0)
        expect(Number.isFinite(flow)).toBe(true)
        expect(inflowOf({ ...way, isPlugged: true }, moment)).toBe(0)
        const higher = inflowOf(way, { ...moment, waterLevel: waterLevel + 0.1 })
        expect(higher).toBeGreaterThanOrEqual(flow - 1e-15)
      }),
    )
  })
})

describe('the pond of an invented quay', () => {
  it('reaches the sill at 02:48 through an open gully, whatever both pumps do', () => {
    // Target of an independent run: 02:48.
    const { reaches, imbalance, inflowVolume, sources } = drySideThroughTime(QUAY)
    expect(Math.abs(hourOf(reaches[0]!.time) - (26 + 48 / 60))).toBeLessThan(0.15)
    expect(Math.abs(imbalance)).toBeLessThan(1e-9 * inflowVolume)
    expectClose(
      sources.reduce((sum, { volume }) => sum + volume, 0),
      inflowVolume,
      1e-12,
    )
    expect(sources.find(({ name }) => name === 'gully')!.peak.flow).toBeGreaterThan(0.03)
  })

  it('stays at the start of the first pump once the gully is plugged', () => {
    const { highest, reaches, pumps } = drySideThroughTime({
      ...QUAY,
      sources: [plugged, WELL, RAIN],
    })
    expect(reaches[0]!.time).toBeNull()
    expect(highest.level).toBeCloseTo(2.52, 6)
    const [a, b] = pumps
    expect(b!.volume).toBe(0)
    // 12.7 l/s at 7.1 m over the wall, worked from curve and hose: ρ g Q H / η for as long as it ran.
    expectClose(a!.volume / a!.runningTime, 0.0127, 0.02)
    expectClose(a!.energy, (1000 * 9.81 * 0.0127 * 7.1 * a!.runningTime) / 0.45, 0.02)
  })

  it('says what happens when a pump stops at any hour', () => {
    const alone = { ...QUAY, sources: [plugged, WELL, RAIN], pumps: [PUMP_A] }
    const outcomes = ifPumpStops(alone, 'A', [26 * HOUR, 29 * HOUR], SILL)
    const [early, late] = outcomes.map(({ reaches }) => reaches!)
    expect(early!).toBeLessThan(late!)
    expect(late! - 29 * HOUR).toBeGreaterThan(HOUR)
    const standby = ifPumpStops({ ...alone, pumps: [PUMP_A, PUMP_B] }, 'A', [29 * HOUR], SILL)
    expect(standby[0]!.reaches).toBeNull()
  })

  it('finds the plug that helps most', () => {
    const [best] = ifOneIsPlugged(QUAY, SILL)
    expect(best).toMatchObject({ source: 'gully', reaches: null })
  })

  it('does not care how fine its steps are', () => {
    const [coarse, fine] = [120, 30].map((step) => drySideThroughTime({ ...QUAY, step }))
    expectClose(coarse!.reaches[0]!.time!, fine!.reaches[0]!.time!, 1e-5)
    expectClose(coarse!.inflowVolume, fine!.inflowVolume, 3e-4)
  })

  it('takes the higher of both sides across a gap', () => {
    const water = QUAY.water.map((reading) =>
      reading.time === 28 * HOUR ? { ...reading, value: null } : reading,
    )
    const known = drySideThroughTime(QUAY)
    expect(drySideThroughTime({ ...QUAY, water }).inflowVolume).toBeGreaterThan(known.inflowVolume)
  })

  it('refuses water of which nothing is known', () => {
    expect(() => drySideThroughTime({ ...QUAY, water: [{ time: 0, value: null }] })).toThrow(
      OutOfRangeError,
    )
  })
})

it('ponds as marched in small explicit steps', () => {
  const storage = stageStorage([
    { level: 0, area: 100 },
    { level: 1, area: 300 },
  ])
  const inflowAt = (time: number): number => 0.01 * (1 + Math.sin(time / 1800))
  const history = pondThroughTime({
    storage,
    inflowAt,
    pumps: [],
    initialLevel: 0.1,
    duration: 7200,
    step: 120,
  })
  let volume = storage.volumeAt(0.1)
  for (let time = 0; time < 7200; time += 0.5) volume += 0.5 * inflowAt(time + 0.25)
  expectClose(history.moments.at(-1)!.level, storage.levelAt(volume), 1e-7)
})

describe('seepage under a flat base', () => {
  it.each([0.5, 1, 2, 4])('agrees with finite differences at B/T %s', (ratio) => {
    const exact = groundSeepage({ permeability: 1, head: 1, baseWidth: ratio, layerThickness: 1 })
    expectClose(seepageByDifferences(ratio), exact, 6e-3)
  })

  it('grows with head, permeability and layer, and falls with the base', () => {
    const positive = fc.double({ min: 0.01, max: 50, noNaN: true })
    fc.assert(
      fc.property(positive, positive, positive, (head, baseWidth, layerThickness) => {
        const ground = { permeability: 1e-5, head, baseWidth, layerThickness }
        const q = groundSeepage(ground)
        expect(q).toBeGreaterThan(0)
        expectClose(groundSeepage({ ...ground, head: 2 * head }), 2 * q, 1e-12)
        expect(groundSeepage({ ...ground, baseWidth: 1.1 * baseWidth })).toBeLessThan(q)
        expect(groundSeepage({ ...ground, layerThickness: 1.1 * layerThickness })).toBeGreaterThan(
          q,
        )
      }),
    )
  })
})
