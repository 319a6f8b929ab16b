import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { freeSkirt } from '../../../shared/calc/loaded-shape/free-skirt'
import { loadedOutline, type Point } from '../../../shared/calc/loaded-shape/loaded-outline'
import { loadedShape, type StandingShape } from '../../../shared/calc/loaded-shape/loaded-shape'
import { weldAngles } from '../../../shared/calc/loaded-shape/membrane'
import { seatAngle, surfaceAngle } from '../../../shared/calc/loaded-shape/skin-length'
import { expectClose } from '../../support/close-to'

const UNIT_WEIGHT = 9810

/** Diameter, pressure ratio p/(ρgD) and depth ratio h/D of tubes that may or may not stand. */
const tube = fc.record({
  diameter: fc.double({ min: 0.2, max: 3, noNaN: true }),
  pressure: fc.double({ min: 0.1, max: 20, noNaN: true }),
  depth: fc.double({ min: 0.01, max: 1, noNaN: true }),
})

function solve(diameter: number, pressureRatio: number, depthRatio: number) {
  const airPressure = pressureRatio * UNIT_WEIGHT * diameter
  const depth = depthRatio * diameter
  const shape = loadedShape({
    diameter,
    airPressure,
    wettedSkirt: 20 * diameter,
    depth,
    unitWeight: UNIT_WEIGHT,
  })
  return { shape, airPressure, depth, unitWeight: UNIT_WEIGHT }
}

/** Midpoint rule on a graded mesh: slow, simple and independent of the product's quadrature. */
function integrate(f: (x: number) => number, from: number, to: number, pieces = 20_000): number {
  let sum = 0
  for (let i = 0; i < pieces; i += 1) {
    // Quadratic grading at both ends: s = 3t² − 2t³.
    const t = (i + 0.5) / pieces
    const x = from + (to - from) * (3 * t ** 2 - 2 * t ** 3)
    sum += (f(x) * (to - from) * 6 * t * (1 - t)) / pieces
  }
  return sum
}

describe('balances of the loaded shape', () => {
  it('rests on its contact with just the water that stands on it, within 1e-8', () => {
    fc.assert(
      fc.property(tube, ({ diameter, pressure, depth: ratio }) => {
        const { shape, airPressure, depth } = solve(diameter, pressure, ratio)
        fc.pre(shape.solved)
        const radius = shape.crest / 2
        const { onTube } = waterOnTube(shape, airPressure, depth)
        const kappa = UNIT_WEIGHT / (2 * airPressure)
        const { sinPhi } = weldAngles({ depth, perimeter: 0, kappa }, radius, shape.weldHeight)
        const carried = onTube + shape.skirtTension * sinPhi
        const scale = UNIT_WEIGHT * depth * diameter
        expect(Math.abs(airPressure * shape.contact - carried) / scale).toBeLessThan(1e-8)
      }),
      { numRuns: 60 },
    )
  })

  it('balances horizontally: tension of both skins against thrust and skirt, an identity', () => {
    fc.assert(
      fc.property(tube, ({ diameter, pressure, depth: ratio }) => {
        const { shape, airPressure, depth } = solve(diameter, pressure, ratio)
        fc.pre(shape.solved)
        const { skinTension: tension, weldHeight, skirtTension } = shape
        const wet = depth - weldHeight
        // Weld line: T cos β_A + T cos α = T_s cos φ, with the angles of the method.
        const cosBeta = -1 + (airPressure * weldHeight + (UNIT_WEIGHT * wet ** 2) / 2) / tension
        const cosAlpha = 1 - (airPressure * weldHeight) / tension
        const pull = skirtTension * (wet / depth) ** 2
        expect(tension * (cosBeta + cosAlpha)).toBeCloseTo(pull, 6)
        // Whole tube: the skirt carries the whole thrust.
        expectClose(skirtTension, (UNIT_WEIGHT * depth ** 2) / 2, 1e-12)
      }),
    )
  })

  it('uses up exactly the skin that there is', () => {
    for (const [diameter, pressure, ratio] of [
      [0.7, 2.18, 0.786],
      [1, 0.815, 0.9],
      [0.7, 0.291, 0.643],
      [2, 10, 0.3],
    ] as const) {
      const { shape, airPressure, depth } = solve(diameter, pressure, ratio)
      if (!shape.solved) throw new Error('stands')
      const radius = shape.crest / 2
      const { length } = waterOnTube(shape, airPressure, depth)
      const alpha = seatAngle(shape.weldHeight, radius)
      const beta = surfaceAngle(depth, radius)
      const whole = radius * (alpha + beta + Math.PI) + length + shape.contact
      expectClose(whole, Math.PI * diameter, 1e-8)
    }
  })

  /** Vertical water load on the wet skin and the length of it, by the slow rule. */
  function waterOnTube(shape: StandingShape, airPressure: number, depth: number) {
    const { skinTension: tension, weldHeight } = shape
    const cosine = (y: number): number => {
      const u = depth - y
      const risen = airPressure * depth - airPressure * u + (UNIT_WEIGHT * u ** 2) / 2
      return -1 + risen / tension
    }
    const perSine = (y: number): number => 1 / Math.sqrt(1 - cosine(y) ** 2)
    const load = (y: number): number => UNIT_WEIGHT * (depth - y) * cosine(y) * perSine(y)
    return {
      onTube: integrate(load, weldHeight, depth),
      length: integrate(perSine, weldHeight, depth),
    }
  }
})

describe('free skirt', () => {
  it('agrees with slow quadrature', () => {
    for (const [depth, weld] of [
      [0.55, 0.0779],
      [0.9, 0.0555],
      [0.01, 0.009],
    ] as const) {
      const cosine = (y: number): number => (1 - y / depth) ** 2
      const sine = (y: number): number => Math.sqrt(1 - cosine(y) ** 2)
      const { length, run } = freeSkirt(depth, weld)
      expectClose(
        length,
        integrate((y) => 1 / sine(y), 0, weld),
        1e-7,
      )
      expectClose(
        run,
        integrate((y) => cosine(y) / sine(y), 0, weld),
        1e-7,
      )
    }
  })
})

describe('limits', () => {
  it('tends to the unloaded circle as the water falls', () => {
    const { shape } = solve(0.7, 2, 1e-5)
    expect(shape.solved && shape.crest).toBeCloseTo(0.7, 9)
    expect(solve(0.7, 2, 0).shape).toEqual({
      solved: true,
      crest: 0.7,
      contact: 0,
      skinTension: (2 * UNIT_WEIGHT * 0.7 * 0.7) / 2,
      skirtTension: 0,
      weldHeight: 0,
      freeSkirt: 0,
    })
  })

  it('rises with the pressure towards the diameter', () => {
    const crests = [0.5, 1, 2, 5, 20].map((pressure) => {
      const { shape } = solve(1, pressure, 0.6)
      return shape.solved ? shape.crest : 0
    })
    expect([...crests].sort((a, b) => a - b)).toEqual(crests)
    expect(crests.at(-1)).toBeLessThan(1)
  })

  it('sags monotonically as the water rises, on the standing branch', () => {
    fc.assert(
      fc.property(tube, fc.double({ min: 0.01, max: 0.99, noNaN: true }), (drawn, share) => {
        const higher = solve(drawn.diameter, drawn.pressure, drawn.depth).shape
        const lower = solve(drawn.diameter, drawn.pressure, drawn.depth * share).shape
        fc.pre(higher.solved)
        expect(lower.solved).toBe(true)
        if (lower.solved && higher.solved) {
          expect(higher.crest).toBeLessThanOrEqual(lower.crest + 1e-12)
        }
      }),
      { numRuns: 400 },
    )
  })

  it('says why nothing stands', () => {
    const input = { diameter: 0.7, airPressure: 15_000, unitWeight: UNIT_WEIGHT }
    const reason = (depth: number, wettedSkirt: number, airPressure = 15_000) => {
      const shape = loadedShape({ ...input, airPressure, depth, wettedSkirt })
      return shape.solved ? 'stands' : shape.reason
    }
    expect(reason(0.3, 0)).toBe('no-skirt')
    expect(reason(0.7, 2)).toBe('overtopped')
    expect(reason(0.69, 2)).toBe('overtopped')
    expect(reason(0.5, 2, 2000)).toBe('gives-way')
    expect(reason(0.5, 0.1)).toBe('gives-way')
    expect(reason(0.5, 2)).toBe('stands')
  })
})

describe('outline', () => {
  it('closes: every curve ends where the next begins', () => {
    fc.assert(
      fc.property(tube, ({ diameter, pressure, depth: ratio }) => {
        const { shape, ...rest } = solve(diameter, pressure, ratio)
        fc.pre(shape.solved)
        const outline = loadedOutline({ shape, ...rest })
        const { freeSkirt: skirt, wetSkin, crown, drySkin, underside, contact, weld } = outline
        const meets = (a: Point, b: Point): void => {
          expect(Math.hypot(a.x - b.x, a.y - b.y)).toBeLessThan(1e-9 * diameter)
        }
        meets(skirt.at(-1)!, weld)
        meets(wetSkin[0]!, weld)
        meets(wetSkin.at(-1)!, crown[0]!)
        meets(crown.at(-1)!, drySkin[0]!)
        meets(drySkin.at(-1)!, contact[1])
        meets(underside[0]!, weld)
        meets(underside.at(-1)!, contact[0])
        expectClose(contact[1].x - contact[0].x, shape.contact, 1e-7 + 1e-12 / shape.contact)
      }),
      { numRuns: 60 },
    )
  })
})
