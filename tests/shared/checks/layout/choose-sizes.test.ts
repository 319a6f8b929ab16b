import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { CHANGE_MASS, chooseSizes, sizesCost } from '../../../../shared/checks/layout/choose-sizes'

const MASSES = [34, 48, 78, 101]

/** Every way to choose, one after the other: the plainest method there is. */
function bruteForce(sections: readonly { candidates: readonly number[] }[]) {
  let ways: (number | null)[][] = [[]]
  for (const { candidates } of sections) {
    const choices = candidates.length > 0 ? candidates : [null]
    ways = ways.flatMap((way) => choices.map((size) => [...way, size]))
  }
  return ways
    .map((way) => sizesCost(way, MASSES))
    .reduce((a, b) => (b.jumps < a.jumps || (b.jumps === a.jumps && b.mass < a.mass) ? b : a))
}

const sections = fc.array(
  fc.subarray([0, 1, 2, 3], { minLength: 0, maxLength: 4 }).map((candidates) => ({ candidates })),
  { minLength: 1, maxLength: 6 },
)

describe('the choice of sizes', () => {
  it('is as cheap as the cheapest of all ways there are', () => {
    fc.assert(
      fc.property(sections, (line) => {
        const chosen = chooseSizes(line, MASSES)
        chosen.forEach((size, i) => {
          const { candidates } = line[i]!
          expect(size === null ? candidates.length === 0 : candidates.includes(size)).toBe(true)
        })
        const cost = sizesCost(chosen, MASSES)
        const least = bruteForce(line)
        expect(cost.jumps).toBe(least.jumps)
        expect(cost.mass).toBeCloseTo(least.mass, 9)
      }),
      { numRuns: 300 },
    )
  })

  it('lays one heavier section rather than change twice for 14 kg', () => {
    const line = [{ candidates: [1, 2] }, { candidates: [0, 1] }, { candidates: [1, 2] }]
    expect(chooseSizes(line, MASSES)).toEqual([1, 1, 1])
    expect(sizesCost([1, 0, 1], MASSES)).toEqual({ jumps: 0, mass: 48 + 34 + 48 + 2 * CHANGE_MASS })
  })

  it('steps over no size where another way is open', () => {
    const line = [{ candidates: [0, 1] }, { candidates: [2] }]
    expect(chooseSizes(line, MASSES)).toEqual([1, 2])
    expect(chooseSizes([{ candidates: [0] }, { candidates: [2] }], MASSES)).toEqual([0, 2])
  })

  it('begins anew behind a section in which nothing fits', () => {
    expect(
      chooseSizes([{ candidates: [2] }, { candidates: [] }, { candidates: [0] }], MASSES),
    ).toEqual([2, null, 0])
    expect(chooseSizes([], MASSES)).toEqual([])
  })
})
