import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { erfc } from '../../../shared/calc/numerics/erfc'
import {
  developingMean,
  developingMoment,
  developingPartial,
  developingShare,
} from '../../../shared/calc/uplift/developing-uplift'
import { upliftForce, upliftUnderSkirt } from '../../../shared/calc/uplift/uplift-force'
import {
  upliftMoments,
  upliftShare,
  upliftSharePartial,
} from '../../../shared/calc/uplift/uplift-share'
import { UPLIFT_MODELS } from '../../../shared/schemas/section-case'
import { expectClose, expectPrinted } from '../../support/close-to'

const assumption = (model: (typeof UPLIFT_MODELS)[number], time = 86_400) => ({
  model,
  edgeFactor: 1,
  diffusivity: 1e-5,
  time,
})

/** Integral over the base by the midpoint rule on a mesh graded towards both ends. */
function overBase(f: (x: number) => number, to: number, pieces = 20_000): number {
  let sum = 0
  for (let i = 0; i < pieces; i += 1) {
    const t = (i + 0.5) / pieces
    sum += (f(to * (3 * t ** 2 - 2 * t ** 3)) * to * 6 * t * (1 - t)) / pieces
  }
  return sum
}

describe('pressure under the base', () => {
  it.each(UPLIFT_MODELS)('%s: mean, moment and partial equal quadrature of the share', (model) => {
    const base = 2.32
    for (const time of [1000, 20_000, 86_400, 400_000]) {
      const uplift = assumption(model, time)
      const share = (x: number): number => upliftShare(uplift, base, x)
      const { mean, moment } = upliftMoments(uplift, base)
      expect(mean * base).toBeCloseTo(overBase(share, base), 7)
      const lever = (x: number): number => share(x) * (base - x)
      expect(moment * base ** 2).toBeCloseTo(overBase(lever, base), 7)
      expect(upliftSharePartial(uplift, base, 1.9)).toBeCloseTo(overBase(share, 1.9), 7)
      expect(upliftSharePartial(uplift, base, base)).toBeCloseTo(mean * base, 9)
    }
  })

  it('falls from the wet edge to the dry toe', () => {
    for (const model of ['linear', 'deep', 'developing'] as const) {
      expect(upliftShare(assumption(model), 2, 0)).toBeCloseTo(1, 12)
      expect(upliftShare(assumption(model), 2, 2)).toBeCloseTo(0, 12)
    }
  })

  it('of deep sand at the quarter points is that of the conformal map', () => {
    // Derived: 0.6667, 0.5, 0.3333 against 0.75, 0.5, 0.25 on the line of creep.
    const deep = [0.25, 0.5, 0.75].map((xi) => upliftShare(assumption('deep'), 1, xi))
    for (const [i, printed] of [0.6667, 0.5, 0.3333].entries()) expectPrinted(deep[i]!, printed)
    // Centroid 3B/8 from the wet edge: moment over mean is 5/8 from the toe.
    const { mean, moment } = upliftMoments(assumption('deep'), 1)
    expect(moment / mean).toBeCloseTo(5 / 8, 14)
  })

  it('grows as tabulated', () => {
    // Derived: U/(u₀B) and arm/B at c t/B².
    const rows = [
      [0.01, 0.112838, 0.911377],
      [0.05, 0.252044, 0.802691],
      [0.1, 0.348941, 0.736016],
      [0.5, 0.497085, 0.667644],
    ] as const
    for (const [tau, ratio, arm] of rows) {
      expectPrinted(developingMean(tau), ratio)
      expectPrinted(developingMoment(tau) / developingMean(tau), arm)
    }
    // c = 1e-5 m²/s, B 2.3 m, 24 h.
    expectPrinted(developingMean((1e-5 * 86_400) / 2.3 ** 2), 0.41915)
  })

  it('passes smoothly from the early solution to the series', () => {
    const [before, after] = [0.01 - 1e-13, 0.01 + 1e-13]
    expectClose(developingMean(before), developingMean(after), 1e-10)
    expectClose(developingMoment(before), developingMoment(after), 1e-10)
    for (const xi of [0, 0.05, 0.2, 0.9]) {
      expect(developingShare(before, xi)).toBeCloseTo(developingShare(after, xi), 10)
      expect(developingPartial(before, xi)).toBeCloseTo(developingPartial(after, xi), 10)
    }
  })

  it('ends as the even fall, and starts as nothing', () => {
    expect(developingMean(50)).toBe(0.5)
    expect(developingMoment(50)).toBeCloseTo(1 / 3, 15)
    expect([developingMean(0), developingMoment(0), developingShare(0, 0.3)]).toEqual([0, 0, 0])
    expect(developingPartial(0, 0.3)).toBe(0)
  })
})

describe('resultant of the uplift', () => {
  const input = { edgeDepth: 0.55, dryDepth: 0.1, base: 2.32, unitWeight: 9810 }

  it('takes water on the dry side into account', () => {
    const pressure = (x: number): number =>
      9810 * (0.1 + 0.45 * upliftShare(assumption('linear'), 2.32, x))
    const { force, moment } = upliftForce({ ...input, uplift: assumption('linear') })
    expectClose(force, overBase(pressure, 2.32), 1e-8)
    expectClose(
      moment,
      overBase((x) => pressure(x) * (2.32 - x), 2.32),
      1e-8,
    )
    const under = upliftUnderSkirt({ ...input, uplift: assumption('linear') }, 1.5)
    expectClose(under, overBase(pressure, 1.5), 1e-8)
  })

  it('is nothing under a sealed base, or under none', () => {
    const nothing = { force: 0, moment: 0 }
    expect(upliftForce({ ...input, uplift: assumption('none') })).toEqual(nothing)
    expect(upliftForce({ ...input, base: 0, uplift: assumption('linear') })).toEqual(nothing)
    expect(upliftUnderSkirt({ ...input, uplift: assumption('none') }, 1)).toBe(0)
  })
})

describe('erfc', () => {
  it('agrees with tabulated values', () => {
    // Abramowitz & Stegun, table 7.1 (from memory): erf 0.5, 1.0, 2.0.
    expectPrinted(1 - erfc(0.5), 0.5204998778)
    expectPrinted(1 - erfc(1), 0.8427007929)
    expectPrinted(1 - erfc(2), 0.995322265)
    expect(erfc(0)).toBe(1)
    expect(erfc(30)).toBe(0)
  })

  it('joins series and fraction, and has the right slope', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.01, max: 5, noNaN: true }), (x) => {
        const slope = (erfc(x + 1e-6) - erfc(x - 1e-6)) / 2e-6
        expect(slope).toBeCloseTo((-2 / Math.sqrt(Math.PI)) * Math.exp(-(x ** 2)), 8)
      }),
    )
    expectClose(erfc(2 - 1e-12), erfc(2 + 1e-12), 1e-10)
  })
})
