import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { holeLeak, puncture } from '../../../shared/calc/air/puncture'
import { sizeStep } from '../../../shared/calc/line/step-in-size'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { justEnough } from '../../../shared/checks/just-enough'
import { seatCheck } from '../../../shared/checks/seat-check'
import { OutOfRangeError } from '../../../shared/errors'
import type { SectionCase, UpliftModel } from '../../../shared/schemas/section-case'
import { exampleSection } from '../../../shared/verification/example-section'
import { expectClose } from '../../support/close-to'

const onClay = (undrainedStrength: number, change: Partial<SectionCase> = {}): SectionCase => {
  const section = { ...exampleSection(), ...change }
  return { ...section, ground: { ...section.ground, undrainedStrength } }
}

describe('soft ground', () => {
  // EN 1997-1:2004, 6.5.3 (from memory): R = A c_u, and 0.4 V where water can reach the interface.
  it('carries no more than c_u B', () => {
    const { workings } = evaluateSection(onClay(500))
    expectClose(workings.sliding.resistance, 500 * 2.32, 1e-12)
  })

  it('carries no more than 0.4 N, however stiff it is', () => {
    const { workings, vertical } = evaluateSection(onClay(1e6))
    expectClose(workings.sliding.resistance, 0.4 * vertical.net, 1e-12)
  })

  it('divides c_u by 1.4 in combination 2', () => {
    const basis = 'partial-ec7' as const
    const { workings } = evaluateSection(onClay(300, { basis }))
    expectClose(workings.sliding.resistance, (300 * 2.32) / 1.4, 1e-12)
    const { loadedShape: shape } = evaluateSection(onClay(300, { basis }))
    if (!shape.solved) throw new Error('stands')
    expectClose(workings.skirt.resistance, (300 * (2.2 - shape.freeSkirt)) / 1.4, 1e-12)
  })

  it('never helps, and is left alone where it is not entered', () => {
    const strength = fc.double({ min: 1, max: 1e5, noNaN: true })
    fc.assert(
      fc.property(strength, fc.double({ min: 0.05, max: 0.65, noNaN: true }), (cu, depth) => {
        const soft = onClay(cu, { water: { ...exampleSection().water, depth } })
        const firm = exampleSection({ water: { depth } })
        const [a, b] = [evaluateSection(soft).workings, evaluateSection(firm).workings]
        expect(a.sliding.resistance).toBeLessThanOrEqual(b.sliding.resistance)
        expect(a.skirt.resistance).toBeLessThanOrEqual(b.skirt.resistance)
      }),
    )
    const none = { ...exampleSection().ground, undrainedStrength: null }
    expect(evaluateSection({ ...exampleSection(), ground: none })).toEqual(
      evaluateSection(exampleSection()),
    )
  })

  it('is not made good by friction, and knows its edge', () => {
    expect(justEnough(onClay(500)).friction).toBeNull()
    const enough = justEnough(onClay(3000, { basis: 'extreme' })).edgeFactor!
    const at = { ...exampleSection().uplift, edgeFactor: enough }
    const { sliding } = evaluateSection(onClay(3000, { basis: 'extreme', uplift: at }))
    expect(sliding.utilisation!).toBeLessThanOrEqual(1 + 1e-9)
    expect(justEnough(onClay(10)).edgeFactor).toBeNull()
  })
})

describe('void pressure under the lifted skirt', () => {
  it('is far from what the seat bears with a long skirt, and beyond it with a short one', () => {
    const long = seatCheck(exampleSection())!
    // Derived: the seat is lost at 2481.125576 Pa.
    expect(long.limit!).toBeCloseTo(2481.125576, 4)
    expect(long.givesWay).toBe(false)
    const short = seatCheck(exampleSection({ barrier: { skirtLength: 0.3 } }))!
    expect(short.atPeel).toBeGreaterThan(short.limitWithWeight!)
    expect(short.givesWay).toBe(true)
  })

  it('is none without water, without uplift, or where nothing stands', () => {
    expect(seatCheck(exampleSection({ water: { depth: 0 } }))).toBeNull()
    expect(seatCheck(exampleSection({ water: { depth: 0.9 } }))).toBeNull()
    expect(seatCheck(exampleSection({ uplift: { model: 'none' } }))!.atPeel).toBe(0)
    const bare = { barrier: { skirtLength: 0 }, water: { depth: 0 } }
    expect(seatCheck(exampleSection(bare))).toBeNull()
  })

  it('falls evenly to the dry toe, as the uplift does', () => {
    // By hand: ρ g (h_d + (η h − h_d)(1 − L_f/B)) with the flat skirt L_f = L − free skirt.
    const section = exampleSection({ water: { dryDepth: 0.1 }, uplift: { edgeFactor: 0.8 } })
    const { loadedShape: shape } = evaluateSection(section)
    if (!shape.solved) throw new Error('stands')
    const left = 1 - (2.2 - shape.freeSkirt) / 2.32
    expectClose(seatCheck(section)!.atPeel, 9810 * (0.1 + (0.8 * 0.55 - 0.1) * left), 1e-12)
  })

  it('counts the own weight: it rests on the same seat as p × contact', () => {
    const { limit, limitWithWeight } = seatCheck(exampleSection())!
    const { loadedShape: shape } = evaluateSection(exampleSection())
    if (!shape.solved) throw new Error('stands')
    expectClose(limitWithWeight! / limit! - 1, (4.8 * 9.81) / (15_000 * shape.contact), 1e-12)
    // In a film of water a weightless tube bears nothing, and its weight everything.
    const film = seatCheck(exampleSection({ water: { depth: 0.01 } }))!
    expect(film.atPeel).toBeGreaterThan(film.limit!)
    expect(film.limitWithWeight).toBeNull()
    expect(film.givesWay).toBe(false)
  })

  it('never takes the seat of a section on level, dry ground that meets its checks', () => {
    const share = fc.double({ min: 0, max: 1, noNaN: true })
    const drawn = fc.tuple(share, share, share, share, share, share, share, share)
    const model = fc.constantFrom<UpliftModel>('linear', 'developing')
    fc.assert(
      fc.property(drawn, model, ([a, b, c, d, e, f, g, h], name) => {
        const diameter = 0.3 + 1.2 * a
        const drawnSection = exampleSection({
          barrier: {
            diameter,
            skirtLength: diameter * (0.3 + 5 * b),
            contactWidth: 0.3 * diameter * c,
            mass: 2 + 7 * diameter ** 2 * (0.5 + d),
            airPressure: 5000 + 40_000 * e,
          },
          ground: { friction: 0.2 + 0.7 * f },
          uplift: { model: name, edgeFactor: g, diffusivity: 10 ** (3 * c - 6), time: 1e5 * d },
          water: { depth: diameter * (0.005 + 0.995 * h) },
        })
        const section = { ...drawnSection, requiredFreeboard: 0 }
        if (evaluateSection(section).verdict === 'fails') return
        expect(seatCheck(section)?.givesWay ?? false).toBe(false)
      }),
      { numRuns: 500 },
    )
  })
})

describe('one section goes soft', () => {
  const line = [0.3, 0.55, 0.4].map((depth) => ({ depth, length: 10 }))

  it('alone where the air is isolated, with all where it is linked', () => {
    const alone = puncture(line, 1, 'isolated', 9.81)
    expect(alone.standing).toEqual([true, false, true])
    // Derived by hand: (2/3)^1.5 √g h^1.5 and (8/27) √g h^1.5 for 10 m under 0.55 m.
    expectClose(alone.steady, 6.954111494, 1e-9)
    expectClose(alone.firstRush, 3.785338839, 1e-9)
    const linked = puncture(line, 1, 'linked', 9.81)
    expect(linked.standing).toEqual([false, false, false])
    expect(linked.steady).toBeGreaterThan(alone.steady)
    expect(() => puncture(line, 3, 'linked', 9.81)).toThrow(OutOfRangeError)
  })

  it('through a hole that leaks with its area', () => {
    expectClose(holeLeak(2e-4, 15_000), 2 * holeLeak(1e-4, 15_000), 1e-12)
    // Orifice by hand: 1 cm² at 15 kPa, 0.61 · 1e-4 · √(2 · 15 000 · 1.148/1.225) = 0.01023 m³/s free air.
    expectClose(holeLeak(1e-4, 15_000) * Math.sqrt(15_000), 0.01023, 1e-3)
  })
})

it('steps one size at a joint, and counts the lower crest', () => {
  const step = { diameters: [1, 0.7], crestLevels: [3.9, 3.6] } as const
  const one = sizeStep({ ...step, places: [2, 1] })
  expect(one).toMatchObject({ isAllowed: true, crestLevel: 3.6 })
  expectClose(one.area, Math.PI * 0.1275, 1e-12)
  expect(sizeStep({ ...step, places: [2, 0] }).isAllowed).toBe(false)
  expect(() => sizeStep({ ...step, places: [0, 1], diameters: [0, 1] })).toThrow(OutOfRangeError)
})
