import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { layInOrder, type LayingJob } from '../../../shared/deployment/laying-run'

const MINUTE = 60
const job = (before: number, fill: number, after: number): LayingJob => ({
  before: before * MINUTE,
  fill: fill * MINUTE,
  after: after * MINUTE,
})
const places = (jobs: readonly unknown[]) => jobs.map((_, i) => i)

const jobs = fc.array(
  fc.record({
    before: fc.integer({ min: 0, max: 900 }),
    fill: fc.integer({ min: 1, max: 600 }),
    after: fc.integer({ min: 0, max: 900 }),
  }),
  { minLength: 1, maxLength: 25 },
)
const force = fc.record({
  pairs: fc.array(fc.integer({ min: 0, max: 3600 }), { minLength: 1, maxLength: 4 }),
  blowers: fc.array(fc.integer({ min: 0, max: 3600 }), { minLength: 1, maxLength: 3 }),
})

describe('sections laid by pairs with blowers', () => {
  it('comes to a schedule by hand: two pairs, one blower', () => {
    // Derived by hand: 8 min before, 4 min fill, 5 min after. Both want the blower at 8; the second
    // waits until 12. The first is free at 17, wants it at 25, the second is free at 21.
    const laid = layInOrder([0, 1, 2, 3], Array(4).fill(job(8, 4, 5)), {
      pairs: [0, 0],
      blowers: [0],
    })
    expect(laid.map(({ finish }) => finish / MINUTE)).toEqual([17, 21, 34, 38])
    expect(laid.map(({ waited }) => waited / MINUTE)).toEqual([0, 4, 0, 0])
    expect(laid.map(({ pair }) => pair)).toEqual([0, 1, 0, 1])
  })

  it('lets a section that is begun later have the blower first where it wants it earlier', () => {
    const laid = layInOrder([0, 1], [job(30, 4, 0), job(5, 4, 0)], { pairs: [0, 0], blowers: [0] })
    expect(laid.map(({ fillFrom }) => fillFrom / MINUTE)).toEqual([30, 5])
  })

  it('waits for a blower that comes later than the pairs', () => {
    const [laid] = layInOrder([0], [job(8, 4, 5)], { pairs: [0], blowers: [20 * MINUTE] })
    expect(laid).toMatchObject({ fillFrom: 20 * MINUTE, waited: 12 * MINUTE })
  })

  it('keeps the crew-minutes: each pair works without a gap but for the blower', () => {
    fc.assert(
      fc.property(jobs, force, (all, with_) => {
        const laid = layInOrder(places(all), all, with_)
        const busy = laid.reduce((sum, { start, finish }) => sum + finish - start, 0)
        const waited = laid.reduce((sum, one) => sum + one.waited, 0)
        const work = all.reduce((sum, { before, fill, after }) => sum + before + fill + after, 0)
        expect(busy - waited).toBe(work)
        with_.pairs.forEach((from, pair) => {
          const mine = laid.filter((one) => one.pair === pair).sort((a, b) => a.start - b.start)
          mine.forEach(({ start }, i) => expect(start).toBe(mine[i - 1]?.finish ?? from))
        })
      }),
    )
  })

  it('makes nothing wait but filling, and never two on one blower', () => {
    fc.assert(
      fc.property(jobs, force, (all, with_) => {
        const laid = layInOrder(places(all), all, with_)
        for (const { job: at, start, fillFrom, fillTo, finish, waited } of laid) {
          expect(fillFrom).toBe(start + all[at]!.before + waited)
          expect(fillTo).toBe(fillFrom + all[at]!.fill)
          expect(finish).toBe(fillTo + all[at]!.after)
        }
        with_.blowers.forEach((from, blower) => {
          const mine = laid.filter((one) => one.blower === blower)
          mine.sort((a, b) => a.fillFrom - b.fillFrom)
          mine.forEach(({ fillFrom }, i) =>
            expect(fillFrom).toBeGreaterThanOrEqual(mine[i - 1]?.fillTo ?? from),
          )
        })
      }),
    )
  })

  it('takes sections in their order, each as soon as a pair is free', () => {
    fc.assert(
      fc.property(jobs, force, (all, with_) => {
        const starts = layInOrder(places(all), all, with_).map(({ start }) => start)
        expect(starts).toEqual([...starts].sort((a, b) => a - b))
      }),
    )
  })

  it('is never later with one more pair where sections are equal and each pair has its blower', () => {
    fc.assert(
      fc.property(
        fc.integer({ min: 1, max: 30 }),
        fc.integer({ min: 1, max: 6 }),
        (count, pairs) => {
          const all = Array<LayingJob>(count).fill(job(8, 4, 5))
          const end = (n: number) =>
            Math.max(
              ...layInOrder(places(all), all, {
                pairs: Array(n).fill(0),
                blowers: Array(n).fill(0),
              }).map(({ finish }) => finish),
            )
          expect(end(pairs + 1)).toBeLessThanOrEqual(end(pairs))
        },
      ),
    )
  })

  it('can be later with one more pair: whoever comes first may take the blower from the long work', () => {
    // Found by search: the known anomaly of lists handed out in order, R. L. Graham, "Bounds on
    // Multiprocessing Timing Anomalies", 1969 (from memory). The page therefore computes every gain.
    const all = [job(1, 4, 5), job(7, 3, 16), job(2, 5, 15), job(3, 9, 8)]
    const end = (pairs: number) =>
      Math.max(
        ...layInOrder(places(all), all, { pairs: Array(pairs).fill(0), blowers: [0] }).map(
          ({ finish }) => finish / MINUTE,
        ),
      )
    expect([end(3), end(4)]).toEqual([30, 38])
  })
})
