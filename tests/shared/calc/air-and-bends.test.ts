import { describe, expect, it } from 'vitest'
import {
  compressorDuty,
  leakCoefficient,
  leakedPressure,
  timeToPressure,
} from '../../../shared/calc/air/linked-air'
import { minimumAirPressure } from '../../../shared/calc/air/minimum-air-pressure'
import { bend, stepArea } from '../../../shared/calc/line/bend'
import { edgeBallast } from '../../../shared/calc/moving-water/edge-ballast'
import { OutOfRangeError } from '../../../shared/errors'
import { expectClose } from '../../support/close-to'

const AIR = { volume: 38.48, leak: 2e-5 }

/** Explicit steps of V dp/dt = p_atm (Q − C √p): slow and independent. */
function march(from: number, flow: number, until: (p: number, time: number) => boolean) {
  const dt = 0.05
  let [p, time] = [from, 0]
  const rate = (pressure: number): number =>
    (101_325 * (flow - AIR.leak * Math.sqrt(Math.max(0, pressure)))) / AIR.volume
  while (!until(p, time)) {
    p += dt * rate(p + (dt / 2) * rate(p))
    time += dt
  }
  return { p, time }
}

describe('linked air', () => {
  it('falls as marched in small steps', () => {
    const { p } = march(15_000, 0, (_p, time) => time >= 3600)
    expectClose(leakedPressure(AIR, 15_000, 3600), p, 1e-4)
    expectClose(timeToPressure(AIR, 15_000, p), 3600, 1e-4)
  })

  it('gives its leak from a measured drop, and back', () => {
    const to = leakedPressure(AIR, 15_000, 1800)
    expectClose(leakCoefficient({ volume: 38.48, from: 15_000, to, duration: 1800 }), 2e-5, 1e-12)
  })

  it('is empty at last, and stays so', () => {
    expect(leakedPressure(AIR, 15_000, 1e6)).toBe(0)
    expect(timeToPressure({ ...AIR, leak: 0 }, 15_000, 5000)).toBe(Infinity)
    expect(timeToPressure(AIR, 5000, 15_000)).toBe(0)
  })

  it('keeps a compressor busy for a share of the time', () => {
    const compressor = { flow: 0.004, startPressure: 12_000, stopPressure: 15_000 }
    const duty = compressorDuty(AIR, compressor)
    const on = march(12_000, 0.004, (p) => p >= 15_000).time
    const off = march(15_000, 0, (p) => p <= 12_000).time
    expectClose(duty.onTime!, on, 1e-3)
    expectClose(duty.offTime, off, 1e-3)
    expectClose(duty.share!, on / (on + off), 1e-3)
    expectClose(duty.leastFlow, 2e-5 * Math.sqrt(15_000), 1e-12)
  })

  it('says where a compressor never gets there, and needs none without a leak', () => {
    const weak = { flow: 0.002, startPressure: 12_000, stopPressure: 15_000 }
    expect(compressorDuty(AIR, weak)).toMatchObject({ share: null, onTime: null })
    const tight = compressorDuty({ ...AIR, leak: 0 }, weak)
    expect(tight.share).toBe(0)
    expect(tight.offTime).toBe(Infinity)
    // Boyle, by hand: V Δp/p_atm of free air at 2 l/s.
    expectClose(tight.onTime!, (38.48 * 3000) / 101_325 / 0.002, 1e-12)
    // Just the least flow never gets there.
    const least = { ...weak, flow: tight.leastFlow }
    expect(compressorDuty({ ...AIR, leak: 0 }, { ...least, flow: 0 }).share).toBeNull()
    expect(() => compressorDuty(AIR, { ...weak, startPressure: 15_000 })).toThrow(OutOfRangeError)
  })

  it.each([
    ['a pressure that rises', { volume: 1, from: 10, to: 11, duration: 1 }],
    ['no time', { volume: 1, from: 10, to: 9, duration: 0 }],
    ['no volume', { volume: 0, from: 10, to: 9, duration: 1 }],
  ])('refuses %s', (_what, drop) => {
    expect(() => leakCoefficient(drop)).toThrow(OutOfRangeError)
  })
})

it('has no air pressure that is enough where water and freeboard reach over the tube', () => {
  // The crest of a tube of 0.70 m never stands higher than 0.70 m.
  const tube = { diameter: 0.7, wettedSkirt: 2.2, depth: 0.65, unitWeight: 9810 }
  const { forCrest, forSeal, least } = minimumAirPressure({ ...tube, freeboard: 0.1 })
  expect([forCrest, least]).toEqual([null, null])
  expectClose(forSeal, 9810 * 0.65, 1e-12)
  expect(minimumAirPressure({ ...tube, depth: 0.3, freeboard: 0.1 }).least).toBe(9810 * 0.3)
})

describe('bends and edges', () => {
  const joint = {
    diameter: 0.7,
    skirtLength: 2.2,
    sectionLength: 10,
    largestTurn: Math.PI / 4,
  }

  it('opens the skirt only where the line turns away from the water', () => {
    const away = bend({ ...joint, angle: Math.PI / 2 })
    expect(away.closures).toBe(2)
    expectClose(away.missingSkirt, 0.5 * 2.2 ** 2 * (Math.PI / 2), 1e-12)
    expectClose(away.lostShare, (0.5 * 2.2 * (Math.PI / 2)) / 20, 1e-12)
    expectClose(away.outerGap, 1.4 * Math.sin(Math.PI / 8), 1e-12)
    const towards = bend({ ...joint, angle: -Math.PI / 2 })
    expect(towards).toMatchObject({ missingSkirt: 0, lostShare: 0, closures: 2 })
  })

  it('takes half a degree more than the limit in one closure', () => {
    const degrees = (angle: number) => (angle * Math.PI) / 180
    expect(bend({ ...joint, angle: degrees(45.4) }).closures).toBe(1)
    expect(bend({ ...joint, angle: degrees(45.6) }).closures).toBe(2)
    expect(bend({ ...joint, angle: 0 })).toMatchObject({ closures: 1, outerGap: 0 })
  })

  it('leaves a ring to close at a step in size', () => {
    expectClose(stepArea(1, 0.7), Math.PI * 0.1275, 1e-12)
  })

  it('asks for ballast with the square of the speed', () => {
    const edge = { density: 1000, ballastDensity: 2000, gravity: 9.81 }
    const slow = edgeBallast({ ...edge, speed: 0.5 })
    expectClose(slow, (0.5 * 1000 * 0.25 * 0.3) / (9.81 * 0.5), 1e-12)
    expectClose(edgeBallast({ ...edge, speed: 1 }), 4 * slow, 1e-12)
  })
})
