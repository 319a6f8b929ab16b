import { describe, expect, it } from 'vitest'
import { compareOrders, gains } from '../../../shared/deployment/compare-orders'
import { deploymentPlan } from '../../../shared/deployment/deployment-plan'
import { LAYING_ORDERS } from '../../../shared/schemas/deployment'
import { ferryQuayInput, OPEN_EDGE } from './ferry-quay-input'
import { quayMoment } from './forecast-levels'

const MINUTE = 60

const minutes = (seconds: number | null) => Math.round((seconds ?? NaN) / MINUTE)

describe('Ferry Quay laid by two pairs with one blower', () => {
  const plan = deploymentPlan(ferryQuayInput())

  it('is on site at 23:20 and lays from 23:40 on', () => {
    expect(plan.onSite).toBe(quayMoment('23:20'))
    expect(plan.layingFrom).toBe(quayMoment('23:40'))
    expect(plan.mobilisation.depot).toBe('Mill Lane')
  })

  it('takes 403 crew-minutes, as an independent program has them', () => {
    expect(plan.crewTime / MINUTE).toBe(403)
  })

  it('finishes within four minutes of the independent 03:11 to 03:14', () => {
    const late = (plan.finish - quayMoment('03:14', 1)) / 60_000
    expect(Math.abs(late)).toBeLessThanOrEqual(4)
  })

  // Arrival of the water by an independent program, to the minute, where its ground is ours.
  it.each([
    [0, '03:49'],
    [10, '03:45'],
    [20, '03:26'],
    [30, '03:11'],
    [40, '01:41'],
    [50, '02:00'],
    [60, '02:11'],
    [80, '02:15'],
    [90, '02:38'],
    [110, '02:41'],
    [120, '02:49'],
    [140, '02:49'],
    [150, '03:15'],
    [160, '04:09'],
    [170, '05:27'],
  ])('has the water at ch %i at %s', (from, clock) => {
    const section = plan.sections.find((one) => one.from === from)!
    const off = (section.deadline.expected! - quayMoment(clock, 1)) / 60_000
    expect(Math.abs(off)).toBeLessThan(1)
  })

  it('is 1 min late at ch 140 from one end, as the independent program is', () => {
    expect(minutes(plan.worst.expected!.margin)).toBe(-1)
    expect(plan.worst.expected).toMatchObject({ from: 140, to: 150, position: 15 })
  })

  it('leaves 36 min outward from the slipway, and proves that no joined order leaves more', () => {
    const rows = compareOrders(ferryQuayInput())
    const of = (order: string) => rows.find((row) => row.order === order)!
    expect(rows.map(({ order }) => order)).toEqual([...LAYING_ORDERS])
    expect(of('outward').begins).toBe(40)
    expect(minutes(of('outward').margin)).toBe(36)
    expect(of('best')).toMatchObject({ isProven: true, margin: of('outward').margin })
    // An independent program: 40, with ground of 2.98 between ch 130 and 140, where we have 2.971.
    expect(minutes(of('lowest-first').margin)).toBe(37)
  })

  it('gains what an independent program found: a blower 4 to 9, a third pair 37 to 61 min', () => {
    for (const order of ['from-start', 'outward', 'lowest-first'] as const) {
      const [pair, blower] = gains(ferryQuayInput({ order }))
      for (const gain of [blower!.finish, blower!.margin!]) {
        expect(minutes(gain)).toBeGreaterThanOrEqual(4)
        expect(minutes(gain)).toBeLessThanOrEqual(9)
      }
      for (const gain of [pair!.finish, pair!.margin!]) {
        expect(minutes(gain)).toBeGreaterThanOrEqual(37)
        expect(minutes(gain)).toBeLessThanOrEqual(61)
      }
      expect([pair!.onSite, blower!.onSite]).toEqual([quayMoment('00:20', 1), quayMoment('23:40')])
      expect(pair!.isInStore && blower!.isInStore).toBe(true)
    }
  })

  it('decides at the latest moment so that exactly the wanted margin is left', () => {
    const wanted = deploymentPlan(ferryQuayInput({ wantedMargin: 15 * MINUTE, order: 'outward' }))
    const start = wanted.decideBy.expected!
    const late = ferryQuayInput({ order: 'outward' })
    const again = deploymentPlan({ ...late, settings: { ...late.settings, decidedAt: start } })
    expect(again.worst.expected!.margin).toBeCloseTo(15 * MINUTE, 2)
    // T0 = T1 − mobilisation of 70 min.
    expect(wanted.layFrom.expected! - start).toBe(70 * MINUTE * 1000)
  })

  it('judges the high band harder and the low band easier', () => {
    const { low, expected, high } = plan.worst
    expect(high!.margin).toBeLessThan(expected!.margin)
    expect(low!.margin).toBeGreaterThan(expected!.margin)
  })
})

describe('ballast at Ferry Quay before the water', () => {
  const plan = deploymentPlan(ferryQuayInput())

  it.each([
    ['turf, 0.50 m', 160, 6.9],
    ['turf, 0.70 m', 90, 9.6],
    ['turf, 1.00 m', 60, 12.8],
    ['concrete, 0.50 m', 0, 8.2],
    ['concrete, 0.70 m', 20, 11.5],
    ['concrete, 1.00 m', 40, 15.4],
  ])('needs on %s what an independent program found', (_what, from, perMetre) => {
    const section = plan.sections.find((one) => one.from === from)!
    expect(section.ballast!.perMetre).toBeCloseTo(perMetre, 1)
  })

  it('needs 102 bags where 60 are in store', () => {
    expect(plan.ballast).toMatchObject({ bags: 102, inStore: 60, bagMass: 20, requiredFactor: 1.5 })
  })

  it('needs three times as many in a gust of 14 m/s', () => {
    // An independent program: 306. It has ch 140 to 150 on asphalt; its last 2 m are turf.
    expect(deploymentPlan(ferryQuayInput({ gust: 14 })).ballast!.bags).toBe(308)
  })

  it('says nothing of ballast without a gust', () => {
    const calm = deploymentPlan(ferryQuayInput({ gust: null }))
    expect(calm.ballast).toBeNull()
    expect(calm.sections[0]!.ballast).toBeNull()
  })
})

describe('settings of a plan', () => {
  it('takes times of its own for a size, and lays bags on a weighed edge as a step', () => {
    const times = { carry: 60, unroll: 60, align: 60, fill: 60, join: 60, ballast: 60 }
    const sizeTimes = [{ diameter: 1, times }]
    const edges = OPEN_EDGE.sizes.map((run) => ({ ...run, edgeFactor: 0.5 }))
    const asked = ferryQuayInput({ sizeTimes, edgeBagTime: 45 })
    const plan = deploymentPlan({ ...asked, content: { ...OPEN_EDGE, sizes: edges } })
    const [first] = plan.sections.filter(({ barrier }) => barrier.diameter === 1)
    expect(first!.steps.map(({ step }) => step).at(-1)).toBe('edge')
    // 20 bags on 10 m at 45 s, after six steps of a minute.
    const length = first!.steps.map(({ from, to }) => (to - from) / 1000)
    expect(length).toEqual([60, 60, 60, 60, 60, 60, 900])
    expect(first!.edgeBags).toBe(20)
  })

  it('takes a pair that no depot has to come with the last that one has', () => {
    const plan = deploymentPlan(ferryQuayInput({ pairs: 4 }))
    expect(plan.pairs.map(({ depot }) => depot)).toEqual([
      ...['Mill Lane', 'Mill Lane', 'Mill Lane'],
      null,
    ])
    expect(plan.pairs[3]!.onSite).toBe(plan.pairs[2]!.onSite)
  })

  it('goes without depots by times of its own', () => {
    const asked = ferryQuayInput({ callOutTime: 600, loadTime: 600, driveTime: 600 })
    const plan = deploymentPlan({ ...asked, depots: [] })
    expect(plan.onSite - plan.decidedAt).toBe(1800 * 1000)
    expect(plan.mobilisation.depot).toBeNull()
    expect(plan.ballast).toMatchObject({ bags: null, inStore: 0 })
  })

  it('has no margin without a forecast, and says which sections nobody lays', () => {
    const asked = ferryQuayInput()
    const sizes = OPEN_EDGE.sizes.filter(({ from }) => from !== 20)
    const plan = deploymentPlan({ ...asked, content: { ...OPEN_EDGE, sizes }, levels: {} })
    expect(plan.worst).toEqual({ low: null, expected: null, high: null })
    expect(plan.decideBy.expected).toBeNull()
    expect(plan.unlaid.map(({ from }) => from)).toEqual([20, 30])
  })
})
