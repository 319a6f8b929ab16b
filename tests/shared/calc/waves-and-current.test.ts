import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { currentThrust } from '../../../shared/calc/moving-water/current-thrust'
import { debrisImpact } from '../../../shared/calc/moving-water/debris-impact'
import { debrisThrust } from '../../../shared/calc/moving-water/debris-thrust'
import { waveNumber } from '../../../shared/calc/moving-water/wave-number'
import { waveThrust } from '../../../shared/calc/moving-water/wave-thrust'
import { OutOfRangeError } from '../../../shared/errors'
import { expectClose } from '../../support/close-to'

describe('wave number', () => {
  it('solves the dispersion relation everywhere', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.5, max: 20, noNaN: true }),
        fc.double({ min: 1e-6, max: 5, noNaN: true }),
        (period, depth) => {
          const k = waveNumber(period, depth, 9.81)
          expectClose(9.81 * k * Math.tanh(k * depth), ((2 * Math.PI) / period) ** 2, 1e-12)
        },
      ),
    )
  })

  it('tends to shallow and deep water', () => {
    expectClose(waveNumber(20, 0.01, 9.81), (2 * Math.PI) / (20 * Math.sqrt(0.0981)), 1e-3)
    expectClose(waveNumber(0.5, 5, 9.81), ((2 * Math.PI) / 0.5) ** 2 / 9.81, 1e-9)
  })
})

describe('wave thrust', () => {
  const attack = {
    height: 0.1,
    period: 2,
    depth: 0.55,
    crest: 0.691,
    unitWeight: 9810,
    gravity: 9.81,
  }

  it('equals the quadrature of its pressure diagram, force and moment', () => {
    for (const change of [{}, { height: 0.3 }, { crest: 1.2 }, { crest: 0.5 }]) {
      const waves = waveThrust({ ...attack, ...change })
      const { surfacePressure: p1, groundPressure: p3, crestPressure: p4, wettedAbove } = waves
      const pressure = (y: number): number =>
        y <= 0.55 ? p3 + ((p1 - p3) * y) / 0.55 : p1 + ((p4 - p1) * (y - 0.55)) / wettedAbove
      let [force, moment] = [0, 0]
      for (const [from, to] of [
        [0, 0.55],
        [0.55, 0.55 + wettedAbove],
      ] as const) {
        const step = (to - from) / 20_000
        for (let i = 0; i < 20_000 && step > 0; i += 1) {
          const y = from + (i + 0.5) * step
          force += pressure(y) * step
          moment += pressure(y) * y * step
        }
      }
      expectClose(waves.force, force, 1e-8)
      expectClose(waves.moment, moment, 1e-8)
    }
  })

  it('adds more than half to the thrust of 0.55 m of still water at 0.10 m', () => {
    const share = waveThrust({ ...attack, crest: 0.6910692825 }).force / 1483.7625
    expect(Math.round(share * 100)).toBe(57)
  })

  it('is nothing without waves or without water', () => {
    expect(waveThrust({ ...attack, height: 0 }).force).toBe(0)
    expect(waveThrust({ ...attack, depth: 0 }).force).toBe(0)
  })
})

describe('current and debris', () => {
  it('presses evenly, at half the depth', () => {
    const current = { speed: 1, dragCoefficient: 2, depth: 0.55, unitWeight: 9810, gravity: 9.81 }
    const { force, moment } = currentThrust(current)
    expectClose(force, 1000 * 0.55, 1e-12)
    expectClose(moment / force, 0.275, 1e-12)
  })

  it('brings debris only once the water carries it, spread over one section', () => {
    const debris = { force: 3000, draught: 0.25, sectionLength: 10 }
    expect(debrisThrust({ ...debris, depth: 0.2499 }).force).toBe(0)
    expect(debrisThrust({ ...debris, depth: 0.25 })).toEqual({ force: 300, moment: 75 })
  })
})

describe('debris that is stopped', () => {
  it('takes its impulse from the time in which it stops', () => {
    // Newton's second law: 500 kg × 2 m/s in 0.2 s are 5 kN in the mean; a half sine peaks at π/2 of it.
    const { mean, peak } = debrisImpact({ mass: 500, speed: 2, stoppingTime: 0.2 })
    expect(mean).toBeCloseTo(5000, 9)
    expect(peak / mean).toBeCloseTo(Math.PI / 2, 12)
  })

  it.each([
    ['no mass', { mass: 0 }],
    ['kilometres an hour typed as metres a second', { speed: 30 }],
    ['an instant stop', { stoppingTime: 0 }],
    ['an empty field', { mass: Number.NaN }],
  ])('rejects %s', (_reason, change) => {
    const debris = { mass: 500, speed: 2, stoppingTime: 0.2, ...change }
    expect(() => debrisImpact(debris)).toThrow(OutOfRangeError)
  })
})
