import { describe, expect, it } from 'vitest'
import { holdingProfile, holdsToAt } from '../../../shared/checks/holds-to'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES } from '../../../src/quick-check/choices'
import { statedHeight } from '../../../src/quick-check/stated-height'

function stated(values: Partial<FieldValues> = {}) {
  const section = sectionCase({
    values: { ...INITIAL_VALUES, ...values },
    choices: INITIAL_CHOICES,
  })
  return statedHeight(
    values.statedHeight === undefined ? 0.7 : values.statedHeight,
    section,
    holdsToAt(holdingProfile(section), section.water.depth),
  )
}

describe('where the stated height goes', () => {
  it('adds up to the height on the bag', () => {
    const { depth, sag, freeboard, allowance, spare } = stated()!
    expect(depth + sag + freeboard + allowance + spare).toBeCloseTo(0.7, 9)
    expect(depth).toBeCloseTo(0.4896, 4)
    expect(freeboard).toBe(0.1)
    expect(sag).toBeGreaterThan(0)
    expect(spare).toBeGreaterThan(0.05)
  })

  it('leaves nothing to spare where the freeboard governs', () => {
    const { spare, check } = stated({ edgeFactor: 0 })!
    expect(check).toBe('freeboard')
    expect(spare).toBeLessThan(1e-6)
  })

  it('takes waves off as well', () => {
    expect(stated({ waveHeight: 0.05, wavePeriod: 2 })!.allowance).toBeCloseTo(0.05, 6)
  })

  it('says nothing where nothing is stated, and zero where nothing can be relied on', () => {
    expect(stated({ statedHeight: null })).toBeNull()
    expect(stated({ skirtLength: 0 })!.depth).toBe(0)
  })
})
