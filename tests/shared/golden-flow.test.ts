import { describe, expect, it } from 'vitest'
import { filling } from '../../shared/calc/air/filling'
import { gapFlow } from '../../shared/calc/ground/gap-flow'
import { groundSeepage } from '../../shared/calc/ground/ground-seepage'
import { pipingScreen } from '../../shared/calc/ground/piping-screen'
import { loadedShape } from '../../shared/calc/loaded-shape/loaded-shape'
import { seatPressure } from '../../shared/calc/loaded-shape/seat-pressure'
import { breachFlow } from '../../shared/calc/moving-water/breach-flow'
import { overflow, overtopping } from '../../shared/calc/moving-water/overtopping'
import { waveGrowth } from '../../shared/calc/moving-water/wave-growth'
import { pondThroughTime } from '../../shared/calc/ponding/pond'
import { stageStorage } from '../../shared/calc/ponding/stage-storage'
import { pumpDuty, type PumpSystem } from '../../shared/calc/pumping/pump-duty'
import { suctionHeadAvailable } from '../../shared/calc/pumping/suction-head'
import {
  atmosphereAt,
  vapourPressure,
  waterDensity,
} from '../../shared/calc/water/water-properties'
import { OutOfRangeError } from '../../shared/errors'
import extra from '../golden/extra.json'
import flows from '../golden/flow.json'
import { expectClose, expectPrinted } from '../support/close-to'

// Worked figures of the method, each by two independent routes (derived, not published). The suction
// head was corrected in its last digit: it had been worked out from a rounded density.
type Figures = Record<string, unknown>
function block(id: string): { input: Figures; expected: Figures } {
  const found = extra.find((entry) => entry.id === id)
  if (!found) throw new Error(`no block ${id}`)
  return found as unknown as { input: Figures; expected: Figures }
}

function expectFigures(actual: Record<string, number>, expected: Figures): void {
  for (const [name, value] of Object.entries(actual)) {
    expectPrinted(value, expected[name] as number, name)
  }
}

describe('worked flows', () => {
  it.each(flows.map((flow, i) => [`${i}: ${flow.case.command}`, flow] as const))(
    '%s',
    (_title, { case: input, expected }) => {
      if (input.command === 'seepage') {
        const seepage = input as unknown as Parameters<typeof groundSeepage>[0]
        expectClose(groundSeepage(seepage), expected.perMetre!, 1e-9)
        return
      }
      const duty = pumpDuty({ pumps: 1, ...input } as unknown as PumpSystem)
      expect(duty.state).toBe(expected.state)
      expectClose(duty.flow, expected.flow!, 1e-6)
      expectClose(duty.head, expected.head!, 1e-6)
    },
  )
})

describe('waves from wind, and what comes over', () => {
  it.each(['a', 'b', 'c'])('grow on the fetch: case %s', (name) => {
    const { input, expected } = block('spm')
    const fetch = input[name] as { fetch: number; windSpeed: number; depth: number }
    const { adjustedWind, height, period } = waveGrowth({ ...fetch, gravity: 9.81 })
    expectFigures({ UA: adjustedWind, Hs: height, Ts: period }, expected[name] as Figures)
  })

  it.each(['a', 'b'])('overtop: case %s', (name) => {
    const { input, expected } = block('eurotop')
    const { Hm0, Rc } = input[name] as { Hm0: number; Rc: number }
    const waves = { height: Hm0, crestFreeboard: Rc, gravity: 9.81 }
    const figures = { mean: overtopping(waves), design: overtopping(waves, 'design') }
    expectFigures(figures, expected[name] as Figures)
  })

  it('overflow, and rush through a section that has gone soft', () => {
    expectFigures({ ideal: overflow(0.05, 9.81) }, block('overflow').expected)
    const { steady, firstRush } = breachFlow(0.55, 10, 9.81)
    expectFigures({ weir: steady, damBreak: firstRush }, block('breach').expected)
  })

  it('refuse a wind that is no wind', () => {
    const fetch = { fetch: 500, depth: 1, gravity: 9.81 }
    expect(() => waveGrowth({ ...fetch, windSpeed: 0 })).toThrow(OutOfRangeError)
    expect(() => waveGrowth({ ...fetch, windSpeed: Number.NaN })).toThrow(OutOfRangeError)
  })
})

describe('water that finds its way', () => {
  it.each(Object.entries(block('gap-flow').expected))('under a gap of %s m', (width, figures) => {
    const gap = { head: 0.55, path: 2.2, viscosity: 1.3063e-6, gravity: 9.81 }
    const { laminar, reynolds, orifice, perMetre } = gapFlow({ ...gap, width: Number(width) })
    expectFigures({ laminar, reynolds, orifice, smaller: perMetre }, figures as Figures)
  })

  it('is screened for piping', () => {
    const { exitGradient, bligh, lane } = pipingScreen(0.55, 2.32)
    const figures = { averageExitGradient: exitGradient, bligh: bligh!, lane: lane! }
    expectFigures(figures, block('piping').expected)
    expect(pipingScreen(0, 2.32)).toEqual({ exitGradient: 0, bligh: null, lane: null })
  })
})

it.each(Object.entries(block('seat-loss').expected))('loses its seat: %s', (key, figures) => {
  const [diameter, airPressure, depth] = [...key.matchAll(/[\d.]+/g)].map(Number) as [
    number,
    number,
    number,
  ]
  const tube = { diameter, airPressure, depth, unitWeight: 9810 }
  const shape = loadedShape({ ...tube, wettedSkirt: 10 })
  if (!shape.solved) throw new Error('stands')
  const { ratio, pressure } = seatPressure({ shape, ...tube })!
  expectFigures({ ratio, pressure }, figures as Figures)
})

it('fills a section', () => {
  const { input, expected } = block('filling')
  const { diameter, length, airPressure, blower } = input as Record<string, number>
  const { volume, freeAir, time } = filling({
    diameter: diameter!,
    sectionLength: length!,
    airPressure: airPressure!,
    blowerFlow: blower!,
  })
  expectFigures({ volume, freeAir, time }, expected)
})

it('has suction head to spare', () => {
  const { input, expected } = block('npsh')
  const suction = input as unknown as Parameters<typeof suctionHeadAvailable>[0]
  expectFigures(
    {
      atmosphere: atmosphereAt(500),
      vapourPressure: vapourPressure(10),
      density: waterDensity(10),
      npshAvailable: suctionHeadAvailable(suction),
    },
    expected,
  )
})

describe('ponding', () => {
  const pump = { name: 'A', startLevel: 0.1, stopLevel: 0.04, flowAt: () => 0.02 }
  const flat = stageStorage([{ level: 0, area: 800 }])

  it('starts and stops its pump at the right moments, and closes its balance', () => {
    const history = pondThroughTime({
      storage: flat,
      inflowAt: () => 0.012,
      pumps: [pump],
      initialLevel: 0,
      duration: 21_600,
      step: 300,
    })
    const [firstStart, firstStop, secondStart] = history.events.map(({ time }) => time)
    const { inflowVolume, pumpedVolume, stored } = history
    expectFigures(
      {
        firstStart: firstStart!,
        firstStop: firstStop!,
        secondStart: secondStart!,
        levelAtEnd: history.moments.at(-1)!.level,
        inflowVolume,
        pumpedVolume,
        stored,
      },
      block('ponding').expected,
    )
    expect(Math.abs(inflowVolume - pumpedVolume - stored)).toBeLessThan(1e-9 * inflowVolume)
  })

  it('rises on a growing surface', () => {
    const growing = stageStorage([
      { level: 0, area: 200 },
      { level: 0.5, area: 2200 },
    ])
    const { stored, moments } = pondThroughTime({
      storage: growing,
      inflowAt: () => 0.01,
      pumps: [],
      initialLevel: 0,
      duration: 10_800,
      step: 600,
    })
    const { expected } = block('ponding-stage')
    expectClose(stored, expected.volume as number, 1e-12)
    expectPrinted(moments.at(-1)!.level, expected.level as number)
  })

  it('rises at once when the pump fails', () => {
    const { events, highest } = pondThroughTime({
      storage: flat,
      inflowAt: () => 0.012,
      pumps: [{ ...pump, failsAt: 9000 }],
      initialLevel: 0,
      duration: 21_600,
      step: 300,
    })
    expect(events.map(({ what, time }) => [what, Math.round(time)])).toEqual([
      ['starts', 6667],
      ['fails', 9000],
    ])
    // 80 m³ at the start of the pump, less 0.008 m³/s until it fails, plus 0.012 m³/s until the end.
    const volume = 0.1 * 800 - 0.008 * (9000 - 6666.666_666_7) + 0.012 * (21_600 - 9000)
    expect(highest.level).toBeCloseTo(volume / 800, 9)
  })

  it('pumps no more than what runs into an empty sump', () => {
    const { moments } = pondThroughTime({
      storage: flat,
      inflowAt: () => 0.001,
      pumps: [{ ...pump, startLevel: 0, stopLevel: -1 }],
      initialLevel: 0,
      duration: 3600,
      step: 60,
    })
    expect(moments.every(({ level }) => Math.abs(level) < 1e-9)).toBe(true)
  })

  it.each([
    ['a stop above the start', { pumps: [{ ...pump, stopLevel: 0.2 }] }],
    ['no time', { duration: 0 }],
    ['no step', { step: Number.NaN }],
  ])('refuses %s', (_what, change) => {
    const input = {
      storage: flat,
      inflowAt: () => 0,
      pumps: [pump],
      initialLevel: 0,
      duration: 60,
      step: 10,
    }
    expect(() => pondThroughTime({ ...input, ...change })).toThrow(OutOfRangeError)
  })

  it.each([
    ['no rows', []],
    [
      'levels that fall',
      [
        { level: 1, area: 1 },
        { level: 0, area: 2 },
      ],
    ],
    [
      'no surface at the top',
      [
        { level: 0, area: 1 },
        { level: 1, area: 0 },
      ],
    ],
    ['a surface below nothing', [{ level: 0, area: -1 }]],
  ])('refuses a table with %s', (_what, table) => {
    expect(() => stageStorage(table)).toThrow(OutOfRangeError)
  })

  it("has levels and volumes that are each other's inverse", () => {
    const storage = stageStorage([
      { level: 2, area: 0 },
      { level: 2.5, area: 15 },
      { level: 2.58, area: 60 },
      { level: 2.66, area: 240 },
      { level: 2.75, area: 620 },
      { level: 2.85, area: 1150 },
    ])
    for (const level of [2, 2.001, 2.3, 2.5, 2.6, 2.72, 2.85, 3]) {
      expect(storage.levelAt(storage.volumeAt(level))).toBeCloseTo(level, 12)
    }
    expect(storage.volumeAt(1.5)).toBe(0)
    expect(storage.volumeAt(2.72)).toBeCloseTo(40.75, 1)
  })
})
