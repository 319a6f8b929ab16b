import { describe, expect, it } from 'vitest'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import { sectionCase, type FieldValues } from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES } from '../../../src/quick-check/choices'
import { hourNotes } from '../../../src/quick-check/hour-notes'

function notes(change: Partial<FieldValues>): readonly string[] {
  const values = { ...INITIAL_VALUES, ...change }
  const section = sectionCase({ values, choices: INITIAL_CHOICES })
  return hourNotes(section, evaluateSection(section), values).map(({ key }) => key)
}

describe('what the coldest and the hottest hour make of an answer', () => {
  it('says nothing where the answer stands in both', () => {
    expect(notes({ filledAt: 12, coldest: 11, hottest: 13 })).toEqual([])
  })

  it('says that a tube filled in the sun is limp at night', () => {
    // Constant volume: (15 + 101.325) kPa × 258.15/313.15 − 101.325 < 0 (Gay-Lussac).
    expect(notes({ filledAt: 40, coldest: -15 })).toEqual(['quickCheck.hours.cold.limp'])
  })

  it('tells a tube that gives way from one whose freeboard is used up', () => {
    const low = { airPressure: 5_500, edgeFactor: 0, filledAt: 12, coldest: 0 }
    expect(notes(low)).toEqual(['quickCheck.hours.cold.down'])
    const spare = { filledAt: 12, coldest: 0, edgeFactor: 0, depth: 0.587 }
    expect(notes(spare)).toEqual(['quickCheck.hours.cold.fails'])
  })

  it('says that the seat may open below ρ g h', () => {
    // 1000 × 9.81 × 0.42 = 4120 Pa; 7 kPa at 12 °C are 3201 Pa at 2 °C (Gay-Lussac).
    expect(notes({ airPressure: 7_000, filledAt: 12, coldest: 2 })).toEqual([
      'quickCheck.hours.cold.soft',
    ])
  })

  it('says that the fabric is strained in the sun', () => {
    const weak = { fabricStrength: 24_000, filledAt: 12, coldest: 12, hottest: 45 }
    expect(notes(weak)).toEqual(['quickCheck.hours.hot.fabric'])
  })

  it('says nothing beside an answer that does not hold as it is', () => {
    expect(notes({ depth: 0.6, filledAt: 40, coldest: -15 })).toEqual([])
  })
})
