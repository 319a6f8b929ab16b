import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { bestJoinedOrder } from '../../../shared/deployment/best-joined-order'
import {
  fromOneEnd,
  isJoined,
  lowestFirst,
  outward,
  type OrderedSection,
} from '../../../shared/deployment/laying-orders'
import { layInOrder, type LayingForce, type LayingJob } from '../../../shared/deployment/laying-run'
import { leastMargin } from '../../../shared/deployment/worst-margin'

const at = (deadline: number, lowestGround = 0): OrderedSection => ({ deadline, lowestGround })

describe('orders of laying', () => {
  it('goes from either end', () => {
    expect(fromOneEnd(3, 'start')).toEqual([0, 1, 2])
    expect(fromOneEnd(3, 'end')).toEqual([2, 1, 0])
  })

  it('goes outward to the neighbour that the water reaches first', () => {
    expect(outward([at(9), at(4), at(1), at(5), at(3)], 2)).toEqual([2, 1, 3, 4, 0])
  })

  it('takes the lower of two neighbours with one deadline', () => {
    expect(outward([at(Infinity, 3.2), at(1), at(Infinity, 3.1)], 1)).toEqual([1, 2, 0])
    expect(outward([at(Infinity, 3.0), at(1), at(Infinity, 3.1)], 1)).toEqual([1, 0, 2])
  })

  it('takes the lowest ground first, joined or not', () => {
    const order = lowestFirst([{ lowestGround: 2 }, { lowestGround: 3 }, { lowestGround: 1 }])
    expect(order).toEqual([2, 0, 1])
    expect(isJoined(order)).toBe(false)
    expect(isJoined([1, 0, 2])).toBe(true)
  })
})

const cases = fc
  .array(
    fc.record({
      before: fc.integer({ min: 0, max: 20 }),
      fill: fc.integer({ min: 1, max: 12 }),
      after: fc.integer({ min: 0, max: 20 }),
      deadline: fc.integer({ min: 0, max: 200 }),
      lowestGround: fc.integer({ min: 0, max: 9 }),
    }),
    { minLength: 1, maxLength: 7 },
  )
  .chain((sections) =>
    fc.record({
      sections: fc.constant(sections),
      force: fc.record({
        pairs: fc.array(fc.integer({ min: 0, max: 40 }), { minLength: 1, maxLength: 3 }),
        blowers: fc.array(fc.integer({ min: 0, max: 40 }), { minLength: 1, maxLength: 2 }),
      }),
    }),
  )

/** Every joined order: from each section on, at the lower or at the higher end. */
function allJoined(count: number): number[][] {
  const grow = (order: readonly number[]): number[][] => {
    const [low, high] = [Math.min(...order), Math.max(...order)]
    if (order.length === count) return [[...order]]
    return [
      ...(low > 0 ? grow([...order, low - 1]) : []),
      ...(high < count - 1 ? grow([...order, high + 1]) : []),
    ]
  }
  return fromOneEnd(count, 'start').flatMap((first) => grow([first]))
}

function marginOf(
  order: readonly number[],
  jobs: readonly LayingJob[],
  parts: { readonly sections: readonly OrderedSection[]; readonly force: LayingForce },
): number {
  const deadlines = parts.sections.map(({ deadline }) => deadline)
  return leastMargin(layInOrder(order, jobs, parts.force), deadlines)!.margin
}

describe('the best joined order', () => {
  it('is as good as the best of all joined orders, tried one by one', () => {
    fc.assert(
      fc.property(cases, ({ sections, force }) => {
        const found = bestJoinedOrder({ sections, jobs: sections, force })
        const best = Math.max(
          ...allJoined(sections.length).map((order) =>
            marginOf(order, sections, { sections, force }),
          ),
        )
        expect(found.isProven).toBe(true)
        expect(found.margin).toBeCloseTo(best, 9)
        expect(isJoined(found.order)).toBe(true)
        expect(marginOf(found.order, sections, { sections, force })).toBeCloseTo(best, 9)
      }),
      { numRuns: 60 },
    )
  })

  it('takes any order where the water comes nowhere', () => {
    const sections = [at(Infinity), at(Infinity)]
    const jobs = [
      { before: 1, fill: 1, after: 1 },
      { before: 1, fill: 1, after: 1 },
    ]
    const found = bestJoinedOrder({ sections, jobs, force: { pairs: [0], blowers: [0] } })
    expect(found).toMatchObject({ margin: Infinity, isProven: true })
  })

  it('says of a long line that it is the best found, and is no worse than outward', () => {
    const jobs = Array.from({ length: 450 }, (_, i) => ({ before: 5, fill: 1 + (i % 7), after: 4 }))
    const sections = jobs.map((_, i) => at(2000 + ((i * 37) % 450) * 5))
    const force = { pairs: [0, 0], blowers: [0] }
    const found = bestJoinedOrder({ sections, jobs, force })
    const first = sections.findIndex(
      ({ deadline }) => deadline === Math.min(...sections.map((section) => section.deadline)),
    )
    expect(found.isProven).toBe(false)
    expect(found.margin).toBeGreaterThanOrEqual(
      marginOf(outward(sections, first), jobs, { sections, force }),
    )
  })
})
