import { expect, it } from 'vitest'
import { erfc } from '../../shared/calc/numerics/erfc'
import { grownPressure } from '../../shared/calc/uplift/base-pressure'
import { GrowingUplift } from '../../shared/calc/uplift/growing-uplift'
import { evaluateState } from '../../shared/checks/evaluate-section'
import { sectionState } from '../../shared/checks/section-state'
import { exampleSection } from '../../shared/verification/example-section'
import extra from '../golden/extra.json'
import { expectClose, expectPrinted } from '../support/close-to'

// Worked figures of the method, each by two independent routes (derived, not published).
const expected = (id: string) =>
  extra.find((entry) => entry.id === id)!.expected as unknown as Record<string, number>

const BASE = { base: 2.32, diffusivity: 1e-5 }
const DAY = 86_400

it('slides as worked out where the level drops at once', () => {
  const figures = expected('falling-level')
  const start = { edge: 0.55, toe: 0, ground: 'dry', shortestStep: 1 } as const
  const growing = new GrowingUplift(BASE, start)
  growing.advance(DAY, { edge: 0.55, toe: 0 })
  expectPrinted(9810 * growing.under(0.55).force, figures.upliftUncapped!)
  growing.jump({ edge: 0.3, toe: 0 })
  const under = growing.under(0.3)
  const fallen = exampleSection({ water: { depth: 0.3 } })
  const state = sectionState(fallen, ({ unitWeight }) => grownPressure(under, under, unitWeight))
  const { vertical, thrust, sliding } = evaluateState(state)
  // 256 modes leave 5e-6 of it in the very moment of a drop; Duhamel's integral has all digits.
  expectClose(vertical.uplift, figures.uplift!, 6e-6)
  expectClose(vertical.net, figures.net!, 2e-5)
  expectPrinted(thrust.total, figures.thrust!)
  expectClose(sliding.factor!, figures.sliding!, 2e-5)
})

it('lags behind a ramp as worked out', () => {
  const growing = new GrowingUplift(BASE, { edge: 0, toe: 0, ground: 'dry', shortestStep: DAY })
  growing.advance(DAY, { edge: 0.55, toe: 0 })
  expectPrinted(growing.under(0.55).force / (0.55 * 2.32), expected('developing-ramp').ratio!)
})

it('fails below the friction that the chance of sliding is worked out from', () => {
  // Friction normal, mean 0.45, standard deviation 0.07; failure is a factor below 1.
  const figures = expected('chance-friction-only')
  const { demand, resistance } = evaluateState(sectionState(exampleSection())).workings.sliding
  const threshold = (0.45 * demand) / resistance
  const chance = (friction: number): number => {
    const beta = (0.45 - friction) / 0.07
    return beta < 0 ? 1 - erfc(-beta / Math.SQRT2) / 2 : erfc(beta / Math.SQRT2) / 2
  }
  expectPrinted(threshold, figures.threshold!)
  expectPrinted(chance(threshold), figures.Pf!)
  expectPrinted(chance(1.5 * threshold), figures.PfIfRequired1_5!)
  expect(figures.beta).toBeCloseTo((0.45 - threshold) / 0.07, 9)
})
