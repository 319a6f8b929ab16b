import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { stillWaterThrust } from '../../../shared/calc/hydrostatics/still-water-thrust'
import { tubeOverhang } from '../../../shared/calc/hydrostatics/tube-overhang'
import { expectClose } from '../../support/close-to'

const UNIT_WEIGHT = 9810

/** Overhang of the circle beyond the weld line at a height, straight from its definition. */
function overhangAt(diameter: number, strip: number, y: number): number {
  const radius = diameter / 2
  const chord = Math.sqrt(Math.max(0, radius ** 2 - (y - radius) ** 2))
  return Math.max(0, chord - strip / 2)
}

const tube = fc.record({
  diameter: fc.double({ min: 0.2, max: 3, noNaN: true }),
  strip: fc.double({ min: 0, max: 0.5, noNaN: true }),
  depth: fc.double({ min: 0, max: 1.5, noNaN: true }),
})

describe('still water', () => {
  it('adds up: two stacked panels carry the thrust and the moment of the whole', () => {
    const whole = stillWaterThrust(2, UNIT_WEIGHT)
    const upper = stillWaterThrust(1.2, UNIT_WEIGHT)
    const lower = whole.force - upper.force
    const pressureAt = (y: number): number => UNIT_WEIGHT * (2 - y)
    const moment = upper.moment + upper.force * 0.8
    const byStrips = Array.from({ length: 4000 }, (_, i) => ((i + 0.5) * 0.8) / 4000)
    const sum = byStrips.reduce((total, y) => total + pressureAt(y) * (0.8 / 4000), 0)
    const turning = byStrips.reduce((total, y) => total + pressureAt(y) * y * (0.8 / 4000), 0)
    expectClose(lower, sum, 1e-9)
    expectClose(whole.moment, moment + turning, 1e-6)
  })

  it('does not depend on the shape of the face', () => {
    // Pressure summed normal to a circle, resolved horizontally, against the vertical projection.
    for (const depth of [0.2, 0.5, 0.8, 1]) {
      const [radius, pieces] = [0.5, 200_000]
      const wet = Math.acos(1 - depth / radius)
      let sum = 0
      for (let i = 0; i < pieces; i += 1) {
        const angle = ((i + 0.5) * wet) / pieces
        const y = radius * (1 - Math.cos(angle))
        sum += UNIT_WEIGHT * (depth - y) * Math.sin(angle) * ((radius * wet) / pieces)
      }
      expectClose(sum, stillWaterThrust(depth, UNIT_WEIGHT).force, 1e-8)
    }
  })

  it('is nothing without water', () => {
    expect(stillWaterThrust(0, UNIT_WEIGHT)).toEqual({ force: 0, moment: 0 })
  })
})

describe('overhang of the tube', () => {
  it('equals quadrature of its definition, area and moment', () => {
    fc.assert(
      fc.property(tube, ({ diameter, strip: share, depth: ratio }) => {
        const strip = share * diameter
        const depth = ratio * diameter
        const top = Math.min(depth, diameter)
        const pieces = 20_000
        let [area, moment] = [0, 0]
        for (let i = 0; i < pieces; i += 1) {
          const o = overhangAt(diameter, strip, ((i + 0.5) * top) / pieces)
          area += (o * top) / pieces
          moment += (o * (strip + o / 2) * top) / pieces
        }
        const closed = tubeOverhang(diameter, strip, depth)
        expect(Math.abs(closed.area - area)).toBeLessThan(1e-6 * diameter ** 2)
        expect(Math.abs(closed.moment - moment)).toBeLessThan(1e-6 * diameter ** 3)
      }),
      { numRuns: 60 },
    )
  })

  it('lifts by the water that it displaces: the pressure under it, summed upwards', () => {
    // Water to the weld line on one side only: up from the lower quarter, down on the upper.
    for (const depth of [0.3, 0.5, 0.7, 1]) {
      const [radius, pieces] = [0.5, 200_000]
      const wet = Math.acos(1 - depth / radius)
      let up = 0
      for (let i = 0; i < pieces; i += 1) {
        const angle = ((i + 0.5) * wet) / pieces
        const y = radius * (1 - Math.cos(angle))
        up += UNIT_WEIGHT * (depth - y) * Math.cos(angle) * ((radius * wet) / pieces)
      }
      const { area } = tubeOverhang(1, 0, depth)
      expectClose(UNIT_WEIGHT * area, up, 1e-8)
    }
  })

  it('stays that of the whole tube when the water stands over the crest', () => {
    const full = tubeOverhang(0.7, 0.12, 0.7)
    expect(tubeOverhang(0.7, 0.12, 1.05)).toEqual(full)
    expectClose(tubeOverhang(0.7, 0, 0.7).area, (Math.PI * 0.35 ** 2) / 2, 1e-14)
  })

  it('is nothing below the strip', () => {
    expect(tubeOverhang(0.7, 0.35, 0.01)).toEqual({ area: 0, moment: 0 })
  })
})
