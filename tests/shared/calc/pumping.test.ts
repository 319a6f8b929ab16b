import { describe, expect, it } from 'vitest'
import { frictionFactor } from '../../../shared/calc/pumping/friction-factor'
import { hoseLoss } from '../../../shared/calc/pumping/hose'
import { fitPumpCurve, pumpHead } from '../../../shared/calc/pumping/pump-curve'
import { pumpDuty, type PumpSystem } from '../../../shared/calc/pumping/pump-duty'
import {
  cycleTime,
  fuelNeeded,
  pumpEnergy,
  pumpPower,
} from '../../../shared/calc/pumping/pump-power'
import { suctionHeadAvailable, suctionHeadMargin } from '../../../shared/calc/pumping/suction-head'
import { expectClose } from '../../support/close-to'

describe('friction in a hose', () => {
  it('is that of Hagen and Poiseuille below a Reynolds number of 2000', () => {
    // White, Fluid Mechanics, ch. 6: Δp = 128 μ L Q/(π d⁴); here as head.
    const hose = { diameter: 0.05, length: 40, roughness: 1e-4, minorLoss: 0 }
    const flow = 5e-5
    const loss = hoseLoss({ hose, viscosity: 1.3e-6, gravity: 9.81 }, flow)
    expectClose(loss, (128 * 1.3e-6 * 40 * flow) / (Math.PI * 9.81 * 0.05 ** 4), 1e-12)
  })

  it.each([
    [2000, 0],
    [2000, 0.05],
    [4e3, 0.001],
    [1e5, 0],
    [1e6, 1e-4],
    [1e8, 0.02],
  ])('closes the equation of Colebrook at Re %s and ε/D %s', (reynolds, rough) => {
    const x = 1 / Math.sqrt(frictionFactor(reynolds, rough))
    expectClose(x, -2 * Math.log10(rough / 3.7 + (2.51 * x) / reynolds), 1e-13)
  })
})

/** A hose that loses 6000 Q² in its fittings alone. */
const area = (Math.PI * 0.1 ** 2) / 4
const FITTINGS: PumpSystem = {
  staticHead: 6,
  viscosity: 1.3e-6,
  gravity: 9.81,
  hose: { diameter: 0.1, length: 0, roughness: 0, minorLoss: 6000 * 2 * 9.81 * area ** 2 },
  pumpCurve: [
    [0, 20],
    [0.04, 0.8],
  ],
  pumps: 1,
}

describe('a pump on its system', () => {
  it('runs along a line through two points', () => {
    // By hand: 20 − 480 Q = 6 + 6000 Q².
    const flow = (-480 + Math.sqrt(480 ** 2 + 4 * 6000 * 14)) / 12_000
    const duty = pumpDuty(FITTINGS)
    expect(duty.state).toBe('duty')
    expectClose(duty.flow, flow, 1e-12)
    expectClose(duty.head, 20 - 480 * flow, 1e-12)
    // Two on the one hose: 20 − 240 Q = 6 + 6000 Q².
    const both = (-240 + Math.sqrt(240 ** 2 + 4 * 6000 * 14)) / 12_000
    expectClose(pumpDuty({ ...FITTINGS, pumps: 2 }).flow, both, 1e-12)
  })

  it('goes through three points and as near as it can to more', () => {
    // 20 − 12000 Q²; a fifth point off the curve by d, at the middle of five, moves it by least squares.
    const on = [0, 0.01, 0.02, 0.03, 0.04].map((flow) => [flow, 20 - 12_000 * flow ** 2] as const)
    const curve = fitPumpCurve(on.slice(0, 3))
    expectClose(pumpHead(curve, 0.015), 20 - 12_000 * 0.015 ** 2, 1e-12)
    const off = on.map(([flow, head], i) => [flow, head + (i === 2 ? 0.35 : 0)] as const)
    // Smoothing of five points by a parabola: weights −3, 12, 17, 12, −3 over 35 at the middle
    // (Savitzky & Golay 1964, from memory).
    expectClose(pumpHead(fitPumpCurve(off), 0.02), 20 - 4.8 + (0.35 * 17) / 35, 1e-11)
  })

  it('does not pump where its shut-off head just reaches the outlet', () => {
    expect(pumpDuty({ ...FITTINGS, staticHead: 20 })).toEqual({
      state: 'does-not-pump',
      flow: 0,
      head: 20,
    })
  })

  it('has its duty point on the last point of the curve, and runs out beyond it', () => {
    // 6000 × 0.04² = 9.6 m: the system needs 15.6 m at the last point.
    const ending = (head: number) =>
      pumpDuty({
        ...FITTINGS,
        pumpCurve: [
          [0, 20],
          [0.04, head],
        ],
      })
    expect(ending(15.59).state).toBe('duty')
    expectClose(ending(15.59).flow, 0.04, 1e-3)
    const out = ending(15.7)
    expect(out).toMatchObject({ state: 'runs-out', flow: 0.04 })
    expectClose(out.head, 15.6, 1e-12)
    expectClose(out.headLeft!, 0.1, 1e-9)
  })
})

describe('what a pump needs', () => {
  const work = { flow: 0.05, head: 10, efficiency: 0.7, density: 1000, gravity: 9.81 }

  it('is energy for as long as it runs, and fuel', () => {
    // 4.905 kW of water, 7.007 kW at the shaft (derived); in an hour 25.2 MJ.
    expectClose(pumpEnergy(pumpPower(work), 3600), (4905 / 0.7) * 3600, 1e-12)
    expectClose(fuelNeeded(2.5 / 3600, 7200), 5, 1e-12)
  })

  it('starts least often where half its flow comes in, and not at all outside', () => {
    // MIL-HDBK-1005/9A: V 500, D 100 at Q/D 0.25, 0.5, 0.75.
    expect(cycleTime(500, 100, 50)).toBeCloseTo(20, 12)
    expect(cycleTime(500, 100, 25)).toBeCloseTo(26.667, 3)
    expect(cycleTime(500, 100, 75)).toBeCloseTo(26.667, 3)
    for (const inflow of [-1, 0, 100, 120]) expect(cycleTime(500, 100, inflow)).toBeNull()
  })

  it('is suction head to spare', () => {
    const suction = {
      altitude: 0,
      temperature: 20,
      suctionLift: 3,
      suctionLoss: 0.5,
      gravity: 9.81,
    }
    // Derived: 6.608 m are there.
    expect(suctionHeadAvailable(suction)).toBeCloseTo(6.608, 3)
    expect(suctionHeadMargin(suction, 4)).toBeCloseTo(2.608, 3)
  })
})
