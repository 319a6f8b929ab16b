import { describe, expect, it } from 'vitest'
import { holdingProfile, holdsToAt } from '../../../shared/checks/holds-to'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES, type Choices } from '../../../src/quick-check/choices'
import { statedHeight, statedWords } from '../../../src/quick-check/stated-height'

function stated(values: Partial<FieldValues> = {}, choices: Partial<Choices> = {}) {
  const section = sectionCase({
    values: { ...INITIAL_VALUES, ...values },
    choices: { ...INITIAL_CHOICES, ...choices },
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

  it('says what really gives way: friction alone, or the water under the skirt', () => {
    const key = (held: ReturnType<typeof stated>) => statedWords(held!).parts.at(-1)!.key
    expect(key(stated())).toBe('quickCheck.stated.spare.slidingOnWater')
    const dry = stated({ friction: 0.1 }, { upliftModel: 'none' })
    expect(dry).toMatchObject({ check: 'sliding', hasUplift: false })
    expect(key(dry)).toBe('quickCheck.stated.spare.sliding')
    expect(key(stated({ friction: 0.1, edgeFactor: 0 }))).toBe('quickCheck.stated.spare.sliding')
  })

  it('adds up where the label and the tube differ', () => {
    const over = stated({ statedHeight: 0.75 })!
    const { depth, label, sag, freeboard, allowance, spare } = over
    expect(label).toBeCloseTo(0.05, 12)
    expect(depth + label + sag + freeboard + allowance + spare).toBeCloseTo(0.75, 9)
    expect(statedWords(over).parts[0]!.key).toBe('quickCheck.stated.labelOver')
    expect(statedWords(stated({ statedHeight: 0.6 })!).parts[0]!.key).toBe(
      'quickCheck.stated.labelUnder',
    )
  })

  it('names both ends where it holds only between two depths', () => {
    const between = stated({ dryDepth: 0.1, edgeFactor: 0.5 })!
    expect(between.from).toBeGreaterThan(0.1)
    expect(between.depth).toBeGreaterThan(between.from)
    expect(statedWords(between).answer.key).toBe('quickCheck.stated.answerBetween')
    expect(statedWords(stated()!).answer.key).toBe('quickCheck.stated.answer')
  })

  it('takes waves off as well', () => {
    expect(stated({ waveHeight: 0.05, wavePeriod: 2 })!.allowance).toBeCloseTo(0.05, 6)
  })

  it('says nothing where nothing is stated, and zero where nothing can be relied on', () => {
    expect(stated({ statedHeight: null })).toBeNull()
    expect(stated({ skirtLength: 0 })!.depth).toBe(0)
  })
})
