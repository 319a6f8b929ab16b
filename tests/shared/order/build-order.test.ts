import { describe, expect, it } from 'vitest'
import type { HoldingProfiles } from '../../../shared/checks/line-check'
import { OutOfRangeError } from '../../../shared/errors'
import { buildOrder as build } from '../../../shared/order/build-order'
import type { OrderInput } from '../../../shared/order/order-input'
import { composeOrder } from '../../../shared/order/compose-order'
import { mostPressure } from '../../../shared/order/order-air'
import { orderStatus } from '../../../shared/order/order-status'
import { readToken, tokenFrom } from '../../../shared/order/order-token'
import { orderSchema } from '../../../shared/schemas/order'
import { ferryQuayOrder, ferryQuayPlan, floodHour, WEIGHED } from '../../support/order-input'

/** Most of these orders are of the same sections. */
const profiles: HoldingProfiles = new Map()
const buildOrder = (input: OrderInput) => build(input, profiles)

const order = buildOrder(ferryQuayOrder())
const words = composeOrder(order)

describe('an order of Ferry Quay', () => {
  it('is made again from the same input, and survives its way through JSON', () => {
    expect(buildOrder(ferryQuayOrder())).toEqual(order)
    expect(orderSchema.parse(JSON.parse(JSON.stringify(order)))).toEqual(order)
  })

  // Levels and times: an independent run of the demonstration with the rules of the Method page.
  it('leaves 0.05 m below what the line holds, at the moment when the forecast gets there', () => {
    expect(order.holdsTo!.level).toBeCloseTo(3.441, 3)
    expect(order.leave.level!).toBeCloseTo(3.391, 3)
    expect(order.leave.state).toBe('leave-before-level')
    expect(words.keys.find(({ id }) => id === 'leave')!.more).toContain('Tue 06:11')
  })

  it('knows when the water comes and what ballast there is', () => {
    expect(words.keys.find(({ id }) => id === 'water')!.value).toBe('Tue 01:41')
    expect(order.store.ballastBags).toBe(102)
    expect(words.ballast.lines.join(' ')).toContain('Only 60 are in store')
    expect(order.air.map(({ pieces }) => pieces)).toEqual([4, 9, 5])
  })

  it('goes outward from the slipway and never says a section twice', () => {
    const { sections } = order
    expect(sections.map(({ position }) => position)).toEqual(sections.map((_, i) => i + 1))
    expect(sections[0]!.from).toBe(40)
    expect(new Set(sections.map(({ from }) => from)).size).toBe(18)
    const { sections: planned } = ferryQuayPlan()
    expect(sections.map(({ from }) => from)).toEqual(planned.map(({ from }) => from))
  })

  it('names what is to be plugged: the gully, and the well that runs over', () => {
    expect(order.plugs.map(({ kind, chainage }) => [kind, chainage])).toEqual([
      ['gully', 95],
      ['well', 132],
    ])
  })
})

describe('the gauge that the crew sees', () => {
  it('reads a level less zero and correction, rounded down where it is a limit', () => {
    const gauge = { name: 'Lock', zero: 0.6, correction: -0.04 }
    const seen = buildOrder(ferryQuayOrder({ gauge }))
    // Stage 2.86 at the lock is 3.42 in the datum of the line: 0.60 + 2.86 − 0.04.
    expect(seen.waterLevel.stage).toBeCloseTo(2.86, 9)
    expect(seen.leave.stage!).toBeCloseTo(seen.leave.level! - 0.56, 9)
    const { value } = composeOrder(seen).keys.find(({ id }) => id === 'leave')!
    expect(value.replace('\u00a0', ' ')).toBe('2.83 m on Lock')
  })

  it('may be none: then levels stand in the datum alone, and somebody asks', () => {
    const blind = composeOrder(buildOrder(ferryQuayOrder({ gauge: null })))
    expect(blind.keys.find(({ id }) => id === 'leave')!.value).toBe('3.391\u00a0m QD')
    expect(blind.leave.lines.join(' ')).toContain('No gauge can be seen')
  })
})

describe('an order with less to go by', () => {
  it('has no times without a plan, and lays from the lower chainage on', () => {
    const bare = buildOrder(ferryQuayOrder({ plan: null, resting: null }))
    expect(bare.sections[0]).toMatchObject({ from: 0, start: null, margin: null })
    expect(bare.leave.at).toBeNull()
    expect(bare.forecast).toBeNull()
    const { times, rounds } = composeOrder(bare)
    expect(times.lines).toEqual([])
    expect(rounds.rows.map(({ when }) => when)).not.toContain('Level above the figure for the hour')
  })

  it('says where nothing is laid, and is refused where nothing is laid at all', () => {
    const [first, ...rest] = WEIGHED.sizes
    const gap = buildOrder(ferryQuayOrder({ content: { ...WEIGHED, sizes: rest }, plan: null }))
    expect(gap.unlaid).toEqual([{ from: first!.from, to: first!.to }])
    const sizes = [{ ...first!, from: 500, to: 600 }]
    const nothing = () => buildOrder(ferryQuayOrder({ content: { ...WEIGHED, sizes }, plan: null }))
    expect(nothing).toThrow(OutOfRangeError)
  })

  it('leaves now where the water stands above the leave level, and never where nothing holds', () => {
    const high = buildOrder(ferryQuayOrder({ content: { ...WEIGHED, levelNow: 3.4 } }))
    expect(high.leave.state).toBe('leave-now')
    const grounds = WEIGHED.grounds.map((ground) => ({ ...ground, suitable: false }))
    const none = buildOrder(ferryQuayOrder({ content: { ...WEIGHED, grounds } }))
    expect(none.leave).toMatchObject({ state: 'none', level: null, stage: null })
    expect(composeOrder(none).leave.lines[0]).toContain('no leave level')
  })

  it('prints US units to a hundredth of a foot, and the change of the clock with its offset', () => {
    const input = ferryQuayOrder()
    const head = { ...input.head, units: 'us' as const, timeZone: 'Europe/Lisbon' }
    const { keys } = composeOrder(buildOrder({ ...input, head }))
    // 3.3915 m = 11.126 ft, rounded down.
    expect(keys.find(({ id }) => id === 'leave')!.value).toContain('11.12\u00a0ft')
  })
})

describe('air', () => {
  it('stops where the fabric is used up: T = p D/2 = strength over the required factor', () => {
    // 60 kN/m with 4.0 on a tube of 1 m: p = 2 · 60 000/(4 · 1) = 30 kPa.
    expect(mostPressure({ diameter: 1, fabricStrength: 60_000 }, 'global-1.5')).toBeCloseTo(30_000)
    expect(mostPressure({ diameter: 1, fabricStrength: null }, 'global-1.5')).toBeNull()
  })

  it('never falls below ρ g h at the deepest ground of a size', () => {
    const largest = order.air.find(({ diameter }) => diameter === 1)!
    // 0.63 m at chainage 45: 1000 · 9.81 · 0.63 = 6180 Pa.
    expect(largest.least!).toBeGreaterThanOrEqual(6180)
    expect(largest.least!).toBeLessThan(largest.fill)
  })
})

describe('token and status', () => {
  it('holds 80 bits, and is read whatever its case and dashes', () => {
    const token = tokenFrom(Uint8Array.from({ length: 16 }, (_, i) => i * 7))
    expect(token).toMatch(/^(?:\w{4}-){3}\w{4}$/)
    expect(readToken(token.toLowerCase().replaceAll('-', ' '))).toBe(token)
    expect(readToken('O0I1')).toBeNull()
    expect(() => tokenFrom(new Uint8Array(12))).toThrow(RangeError)
  })

  it.each([
    [{}, 'in-force'],
    [{ expiresAt: floodHour(20) }, 'expired'],
    [{ replacedAt: 1 }, 'replaced'],
    [{ replacedAt: 1, withdrawnAt: 1 }, 'withdrawn'],
  ])('counts withdrawn before replaced before expired: %o', (changes, status) => {
    const dates = { expiresAt: floodHour(30), withdrawnAt: null, replacedAt: null, ...changes }
    expect(orderStatus(dates, floodHour(22))).toBe(status)
  })
})
