import { describe, expect, it } from 'vitest'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { atTemperature, leastAirPressure, windBefore } from '../../../src/quick-check/before-water'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES, type Choices } from '../../../src/quick-check/choices'
import { evaluateSection } from '../../../shared/checks/evaluate-section'

function section(values: Partial<FieldValues> = {}, choices: Partial<Choices> = {}) {
  return sectionCase({
    values: { ...INITIAL_VALUES, ...values },
    choices: { ...INITIAL_CHOICES, ...choices },
  })
}

describe('wind before the water', () => {
  it('needs the ballast that brings sliding to the factor of the basis', () => {
    const at = section()
    const { force, ballast } = windBefore(at, 12)
    const weight = (at.barrier.mass + ballast) * at.gravity
    expect((at.ground.friction * weight) / force).toBeCloseTo(1.5, 9)
  })

  it('takes 1.5 where the basis has partial factors', () => {
    const partial = windBefore(section({}, { basis: 'partial-ec7' }), 12)
    expect(partial.ballast).toBe(windBefore(section(), 12).ballast)
  })

  it('needs none without wind', () => {
    expect(windBefore(section(), 0)).toMatchObject({ force: 0, ballast: 0 })
  })
})

describe('air at another temperature', () => {
  it('loses about 5 kPa of 15 kPa in 12 K', () => {
    expect(atTemperature(section(), 12, 0).airPressure).toBeCloseTo(10_100, -2)
  })

  it('changes nothing at the temperature at which it was filled', () => {
    const { airPressure, evaluation } = atTemperature(section(), 12, 12)
    expect(airPressure).toBeCloseTo(15_000, 6)
    expect(evaluation!.freeboard.available).toBeCloseTo(
      evaluateSection(section()).freeboard.available!,
      9,
    )
  })

  it('leaves a limp tube without figures', () => {
    expect(atTemperature(section({ airPressure: 2000 }), 30, -20).evaluation).toBeNull()
  })
})

describe('least air pressure', () => {
  it('just gives crest and freeboard, or just keeps the seat closed', () => {
    const at = section({ depth: 0.55 })
    const { forCrest, forSeal, least } = leastAirPressure(at)!
    expect(forSeal).toBeCloseTo(9810 * 0.55, 6)
    expect(least).toBe(Math.max(forCrest!, forSeal))
    const barrier = { ...at.barrier, airPressure: forCrest! }
    expect(evaluateSection({ ...at, barrier }).freeboard.available).toBeCloseTo(0.1, 6)
  })

  it('is not asked for without water or without a skirt', () => {
    expect(leastAirPressure(section({ depth: 0 }))).toBeNull()
    expect(leastAirPressure(section({ skirtLength: 0 }))).toBeNull()
  })
})
