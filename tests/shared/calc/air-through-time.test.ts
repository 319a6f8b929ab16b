import { describe, expect, it } from 'vitest'
import { AirRun } from '../../../shared/calc/air/air-through-time'
import { leakedPressure } from '../../../shared/calc/air/linked-air'
import { pressureAtTemperature } from '../../../shared/calc/air/pressure-at-temperature'
import { OutOfRangeError } from '../../../shared/errors'
import { expectClose } from '../../support/close-to'

const HOUR = 3600
const NIGHT = [
  { time: 0, value: 20 },
  { time: 8 * HOUR, value: 4 },
]
const FILLED = { airPressure: 15_000, filledAt: 20 }

describe('air through a night', () => {
  it('follows Gay-Lussac where nothing leaks', () => {
    const run = new AirRun({ ...FILLED, temperature: NIGHT })
    run.advance(0, 8 * HOUR)
    expectClose(run.pressureAt(8 * HOUR), pressureAtTemperature({ ...FILLED, now: 4 }), 1e-14)
  })

  it('leaks as at constant temperature where that is constant', () => {
    const leak = { volume: 38.48, coefficient: 2e-6 }
    const run = new AirRun({ ...FILLED, temperature: [NIGHT[0]!], leak })
    for (let hour = 0; hour < 8; hour += 1) run.advance(hour * HOUR, (hour + 1) * HOUR)
    const alone = leakedPressure({ volume: 38.48, leak: 2e-6 }, 15_000, 8 * HOUR)
    expectClose(run.pressureAt(8 * HOUR), alone, 1e-12)
  })

  it('leaks and cools at once as marched in small steps', () => {
    const leak = { volume: 38.48, coefficient: 5e-7 }
    const run = new AirRun({ ...FILLED, temperature: NIGHT, leak })
    run.advance(0, 8 * HOUR)
    let amount = 116_325
    const pressure = (time: number): number =>
      amount * ((293.15 - (16 * time) / (8 * HOUR)) / 293.15) - 101_325
    for (let time = 0; time < 8 * HOUR; time += 1) {
      amount -= (101_325 * 5e-7 * Math.sqrt(pressure(time + 0.5))) / 38.48
    }
    expectClose(run.pressureAt(8 * HOUR), pressure(8 * HOUR), 1e-4)
  })

  it('is limp at last and stays so, and a compressor that is strong enough keeps its pressure', () => {
    const leak = { volume: 3.85, coefficient: 4e-5 }
    const alone = new AirRun({ ...FILLED, temperature: NIGHT, leak })
    alone.advance(0, HOUR)
    expect(alone.pressureAt(HOUR)).toBe(0)
    const compressor = { flow: 0.01, startPressure: 12_000 }
    const kept = new AirRun({ ...FILLED, temperature: NIGHT, leak: { ...leak, compressor } })
    kept.advance(0, 8 * HOUR)
    expectClose(kept.pressureAt(8 * HOUR), 12_000, 1e-9)
    const weak = { flow: 0.001, startPressure: 12_000 }
    const lost = new AirRun({ ...FILLED, temperature: NIGHT, leak: { ...leak, compressor: weak } })
    lost.advance(0, 8 * HOUR)
    // Where the leak takes what the compressor gives: C √p = Q, p = 625 Pa.
    expect(Math.abs(lost.pressureAt(8 * HOUR) - 625)).toBeLessThan(40)
  })

  it('leaves the original alone when a copy leaks', () => {
    const leak = { volume: 38.48, coefficient: 2e-6 }
    const run = new AirRun({ ...FILLED, temperature: NIGHT, leak })
    run.copy().advance(0, HOUR)
    expect(run.pressureAt(0)).toBe(15_000)
  })

  it.each([
    ['no temperature', { temperature: [] }],
    ['no volume', { leak: { volume: 0, coefficient: 1 } }],
    ['a leak below nothing', { leak: { volume: 1, coefficient: -1 } }],
    ['air filled in an oven', { filledAt: 200 }],
    [
      'no flow',
      { leak: { volume: 1, coefficient: 1, compressor: { flow: NaN, startPressure: 1 } } },
    ],
  ])('refuses %s', (_what, change) => {
    expect(() => new AirRun({ ...FILLED, temperature: NIGHT, ...change })).toThrow(OutOfRangeError)
  })
})
