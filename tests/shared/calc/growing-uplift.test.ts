import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { upliftAtTime, type DepthReading } from '../../../shared/calc/uplift/changing-level'
import {
  GrowingUplift,
  type DiffusingBase,
  type EndHeads,
} from '../../../shared/calc/uplift/growing-uplift'
import { OutOfRangeError } from '../../../shared/errors'
import { cappedResultant, diffuse } from '../../support/diffusion'
import { expectClose } from '../../support/close-to'

const BASE = { base: 2.32, diffusivity: 1e-5 }
const DAY = 86_400
const DRY = { edge: 0, toe: 0, ground: 'dry', shortestStep: 300 } as const

const between = (min: number, max: number) => fc.double({ min, max, noNaN: true })

/** Straight line through readings. */
function lineThrough(readings: readonly DepthReading[]): (time: number) => number {
  return (time) => {
    const found = readings.findIndex(({ time: at }) => at >= time)
    const i = found < 0 ? readings.length - 1 : Math.max(1, found)
    const [a, b] = [readings[i - 1]!, readings[i]!]
    // Times of steps carry rounding; past the last reading there is nothing.
    const share = Math.min(1, (time - a.time) / (b.time - a.time))
    return a.depth + (b.depth - a.depth) * share
  }
}

interface Passage {
  readonly until: number
  readonly steps: number
  readonly ground?: 'dry' | 'soaked'
  readonly base?: DiffusingBase
}

/** Carries heads through equal steps. */
function carried(
  heads: { readonly edge: (time: number) => number; readonly toe: (time: number) => number },
  { until, steps, ground = 'dry', base = BASE }: Passage,
): GrowingUplift {
  const dt = until / steps
  const at = (time: number): EndHeads => ({ edge: heads.edge(time), toe: heads.toe(time) })
  const growing = new GrowingUplift(base, { ...at(0), ground, shortestStep: dt })
  for (let i = 1; i <= steps; i += 1) growing.advance(dt, at(i * dt))
  return growing
}

const nothing = (): number => 0

describe('uplift carried forward step by step', () => {
  it("agrees with Duhamel's integral on any flood, rising and falling", () => {
    fc.assert(
      fc.property(
        fc.array(between(0, 1), { minLength: 2, maxLength: 7 }),
        between(0.3, 4),
        between(-6, -4),
        between(0.1, 1),
        (depths, base, exponent, edgeFactor) => {
          const readings = depths.map((depth, i) => ({ time: i * 7200, depth }))
          const diffusivity = 10 ** exponent
          const until = readings.at(-1)!.time
          const level = lineThrough(readings)
          const growing = carried(
            { edge: (time) => edgeFactor * level(time), toe: nothing },
            { until, steps: 6 * (depths.length - 1), base: { base, diffusivity } },
          )
          const fast = growing.under(level(until))
          const slow = upliftAtTime(readings, { base, diffusivity, edgeFactor }, until)
          const whole = base * Math.max(...depths, 0.01)
          expect(Math.abs(fast.force - slow.force)).toBeLessThan(2e-6 * whole)
          expect(Math.abs(fast.moment - slow.moment)).toBeLessThan(2e-6 * whole * base)
        },
      ),
      { numRuns: 60 },
    )
  })

  it('agrees with finite differences, with water on the dry side and over part of the base', () => {
    const edge = (time: number): number => 0.3 + 0.25 * Math.sin((2 * Math.PI * time) / DAY)
    const toe = (time: number): number => 0.05 + (0.1 * time) / DAY
    for (const until of [DAY / 4, 0.7 * DAY, DAY]) {
      const fast = carried({ edge, toe }, { until, steps: 400 }).under(edge(until))
      const input = { ...BASE, edgeAt: edge, toeAt: toe, initial: () => toe(0), until }
      const head = diffuse(input)
      const slow = cappedResultant(head, BASE.base, edge(until))
      expectClose(fast.force, slow.force, 1e-4, `force at ${until}`)
      expectClose(fast.moment, slow.moment, 1e-4, `moment at ${until}`)
      const part = cappedResultant(head, BASE.base, edge(until), 1.9)
      expectClose(fast.upTo(1.9), part.force, 1e-4, `part at ${until}`)
    }
  })

  it('does not care into how many steps a straight rise is cut', () => {
    const rise = { edge: (time: number): number => (0.5 * time) / DAY, toe: nothing }
    const [one, many] = [1, 500].map((steps) => carried(rise, { until: DAY, steps }).under(0.5))
    expectClose(many!.force, one!.force, 1e-6)
    expectClose(many!.moment, one!.moment, 1e-6)
  })

  it('is the mirror of itself with the water on the other side', () => {
    const up = (time: number): number => (0.5 * time) / DAY
    const left = carried({ edge: up, toe: nothing }, { until: DAY, steps: 50 }).under(10)
    const right = carried({ edge: nothing, toe: up }, { until: DAY, steps: 50, ground: 'soaked' })
    const mirrored = right.under(10)
    expectClose(mirrored.force, left.force, 1e-12)
    expectClose(mirrored.moment, BASE.base * left.force - left.moment, 1e-12)
  })

  it('stays as it is where the ground is soaked and the water stands', () => {
    const still = { edge: () => 0.4, toe: () => 0.1 }
    const { force, moment } = carried(still, { until: DAY, steps: 5, ground: 'soaked' }).under(0.4)
    expectClose(force, 2.32 * 0.25, 1e-14)
    expectClose(moment, 2.32 ** 2 * (0.05 + 0.3 / 3), 1e-14)
  })

  it('ends as the even fall, whatever was before', () => {
    const growing = carried({ edge: () => 0.4, toe: () => 0.1 }, { until: 100 * DAY, steps: 100 })
    expectClose(growing.under(0.4).force, 2.32 * 0.25, 1e-12)
    expectClose(growing.headAt(1.16), 0.25, 1e-12)
  })

  it('never holds more than either end has seen, and vents only where the water has fallen', () => {
    fc.assert(
      fc.property(fc.array(between(0, 1), { minLength: 3, maxLength: 40 }), (depths) => {
        const growing = new GrowingUplift(BASE, { ...DRY, edge: depths[0]! })
        let most = depths[0]!
        for (const depth of depths.slice(1)) {
          growing.advance(1800, { edge: depth, toe: 0 })
          most = Math.max(most, depth)
          const { force, isVented, upTo } = growing.under(depth)
          expect(force).toBeLessThanOrEqual(BASE.base * depth * (1 + 1e-9) + 1e-12)
          expect(force).toBeGreaterThanOrEqual(-1e-12)
          expect(upTo(BASE.base)).toBeCloseTo(force, 12)
          if (isVented) expect(depth).toBeLessThan(most)
        }
      }),
      { numRuns: 50 },
    )
  })

  it('leaves the original alone when a copy goes ahead', () => {
    const growing = carried({ edge: (t) => t / DAY, toe: nothing }, { until: DAY / 2, steps: 10 })
    const before = growing.under(1).force
    const copy = growing.copy()
    copy.advance(3600, { edge: 0.9, toe: 0.2 })
    expect(growing.under(1).force).toBe(before)
    expect(copy.under(1).force).toBeGreaterThan(before)
  })

  it.each([
    ['no base', { base: 0, diffusivity: 1e-5 }, DRY],
    ['no diffusivity', { base: 2, diffusivity: 0 }, DRY],
    ['a diffusivity without end', { base: 2, diffusivity: Infinity }, DRY],
    ['no step', BASE, { ...DRY, shortestStep: 0 }],
    ['a head below nothing', BASE, { ...DRY, edge: -1 }],
    ['no number', BASE, { ...DRY, toe: Number.NaN }],
  ])('refuses %s', (_what, base, start) => {
    expect(() => new GrowingUplift(base, start)).toThrow(OutOfRangeError)
  })

  it.each([
    ['no time', 0, { edge: 0, toe: 0 }],
    ['no number', Number.NaN, { edge: 0, toe: 0 }],
    ['a head below nothing', 60, { edge: 0, toe: -0.1 }],
  ])('refuses a step of %s', (_what, duration, heads) => {
    expect(() => {
      new GrowingUplift(BASE, DRY).advance(duration, heads)
    }).toThrow(OutOfRangeError)
  })
})
