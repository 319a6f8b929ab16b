import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { findRoot } from '../../../shared/calc/numerics/find-root'
import { gaussLegendre } from '../../../shared/calc/numerics/gauss-legendre'
import { expectClose } from '../../support/close-to'

describe('findRoot', () => {
  const solve = (f: (x: number) => number, low: number, high: number): number =>
    findRoot(f, { low, high, atLow: f(low), atHigh: f(high) })

  it.each([
    ['cos x − x', (x: number) => Math.cos(x) - x, 0, 1, 0.7390851332151607],
    ['x³ − 2', (x: number) => x ** 3 - 2, 0, 2, Math.cbrt(2)],
    ['a steep step', (x: number) => Math.atan(1e6 * (x - 0.3)), 0, 1, 0.3],
    ['a flat triple root', (x: number) => (x - 0.4) ** 3, 0, 1, 0.4],
    ['a falling line', (x: number) => 1 - 4 * x, 0, 1, 0.25],
  ])('finds the root of %s', (_name, f, low, high, root) => {
    expectClose(solve(f, low, high), root, 1e-5)
    expect(Math.abs(f(solve(f, low, high)))).toBeLessThan(1e-9)
  })

  const counted = (f: (x: number) => number, low: number, high: number, tolerance?: number) => {
    let count = 0
    const root = findRoot(
      (x) => {
        count += 1
        return f(x)
      },
      { low, high, atLow: f(low), atHigh: f(high) },
      tolerance,
    )
    return { root, count }
  }

  // Chandrupatla 1997 gives fewer evaluations than Brent's method on smooth functions (from memory);
  // halving takes 50 to the last digit. These counts are a regression, not validation.
  it.each([
    ['cos x − x', (x: number) => Math.cos(x) - x, 0, 1, 6],
    ['x³ − 2', (x: number) => x ** 3 - 2, 0, 2, 7],
    ['eˣ − 5', (x: number) => Math.exp(x) - 5, 0, 3, 8],
    ['x⁹ − 0.001', (x: number) => x ** 9 - 1e-3, 0, 1, 10],
    ['ln x − 1', (x: number) => Math.log(x) - 1, 1, 9, 7],
    ['x³ + 2x + 5', (x: number) => x ** 3 + 2 * x + 5, -2, 0, 7],
    ['a line', (x: number) => 1 - 4 * x, 0, 1, 2],
    ['a root in the middle', (x: number) => x - 0.5, 0, 1, 1],
  ])('interpolates where the function is smooth: %s', (_name, f, low, high, most) => {
    const { root, count } = counted(f, low, high)
    expect(count).toBeLessThanOrEqual(most)
    expect(Math.abs(f(root))).toBeLessThan(5e-15)
  })

  it('halves where it is not, and ends within the tolerance that is asked for', () => {
    const jump = (x: number) => (x < 0.3 ? -1 : 1)
    for (const [tolerance, most] of [
      [1e-15, 52],
      [1e-6, 22],
      [1e-3, 12],
    ] as const) {
      const { root, count } = counted(jump, 0, 1, tolerance)
      expect(count).toBeLessThanOrEqual(most)
      expect(Math.abs(root - 0.3)).toBeLessThanOrEqual(2 * tolerance)
      const smooth = counted((x) => x ** 3 - 2, 0, 2, tolerance)
      expect(Math.abs(smooth.root / Math.cbrt(2) - 1)).toBeLessThanOrEqual(2 * tolerance)
    }
    expect(counted((x) => Math.cos(x) - x, 0, 1, 1e-3).count).toBeLessThanOrEqual(4)
  })

  it('stays inside the bracket and ends, even at a jump', () => {
    fc.assert(
      fc.property(fc.double({ min: 0.001, max: 0.999, noNaN: true }), (jump) => {
        const root = solve((x) => (x < jump ? -1 : 1), 0, 1)
        expectClose(root, jump, 1e-12)
      }),
    )
  })
})

describe('gaussLegendre', () => {
  it('integrates polynomials up to degree 2n − 1 exactly', () => {
    for (const points of [3, 8, 24]) {
      const rule = gaussLegendre(points)
      expectClose(
        rule.reduce((sum, { weight }) => sum + weight, 0),
        1,
        1e-14,
      )
      const degree = 2 * points - 1
      const integral = rule.reduce((sum, { at, weight }) => sum + weight * at ** degree, 0)
      expectClose(integral, 1 / (degree + 1), 1e-13)
    }
  })
})
