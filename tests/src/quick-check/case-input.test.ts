import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { sectionFaults } from '../../../shared/schemas/section-faults'
import { sectionCaseSchema } from '../../../shared/schemas/section-case'
import { INITIAL_VALUES } from '../../../src/quick-check/address'
import {
  changeForDepth,
  changeForMode,
  depthNow,
  sectionCase,
  waterDepth,
  waterLevel,
  type CaseInput,
} from '../../../src/quick-check/case-input'
import { INITIAL_CHOICES, WATER_MODES } from '../../../src/quick-check/choices'
import { fieldFaults } from '../../../src/quick-check/field-faults'
import { FIELD_IDS, fieldOf } from '../../../src/quick-check/fields'

type Changes = Partial<{
  values: Partial<CaseInput['values']>
  choices: Partial<CaseInput['choices']>
}>

function input({ values, choices }: Changes = {}): CaseInput {
  return {
    values: { ...INITIAL_VALUES, ...values },
    choices: { ...INITIAL_CHOICES, ...choices },
  }
}

describe('the case behind the form', () => {
  it('is by default a tube of 0.70 m on turf in 0.42 m of water with an open edge', () => {
    const section = sectionCase(input())
    expect(section.water.depth).toBe(0.42)
    expect(section.barrier.diameter).toBe(0.7)
    expect(section.uplift).toMatchObject({ model: 'linear', edgeFactor: 1 })
    expect(sectionCaseSchema.safeParse(section).success).toBe(true)
    expect(sectionFaults(section)).toEqual([])
  })

  it('takes the depth as level less ground', () => {
    const at = input({
      choices: { waterMode: 'level' },
      values: { level: 3.42, groundLevel: 2.87 },
    })
    expect(waterDepth(at)).toBe(0.55)
  })

  it('takes a gauge reading from its zero to the site', () => {
    // Stage 2.86 on a gauge with zero 0.60, site 0.04 m lower: level 3.42.
    const at = input({
      choices: { waterMode: 'gauge' },
      values: { stage: 2.86, gaugeZero: 0.6, gaugeCorrection: -0.04, groundLevel: 2.87 },
    })
    expect(waterLevel(at)).toBeCloseTo(3.42, 12)
    expect(waterDepth(at)).toBe(0.55)
  })

  it.each(WATER_MODES)('moves the water in the way in which it is entered: %s', (waterMode) => {
    const at = input({ choices: { waterMode } })
    const moved = { ...at, values: { ...at.values, ...changeForDepth(at, 0.613) } }
    expect(waterDepth(moved)).toBeCloseTo(0.613, 9)
  })

  it('keeps the water, and the water now, when it is entered in another way', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...WATER_MODES),
        fc.constantFrom(...WATER_MODES),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (from, to, depth) => {
          const start = input({ choices: { waterMode: from }, values: { waterNow: 1 } })
          const values = { ...start.values, ...changeForDepth(start, depth) }
          const before = { ...start, values }
          const after = {
            values: { ...values, ...changeForMode(before, to) },
            choices: { ...before.choices, waterMode: to },
          }
          expect(waterDepth(after)).toBeCloseTo(waterDepth(before), 6)
          expect(depthNow(after)).toBeCloseTo(depthNow(before)!, 6)
        },
      ),
    )
  })
})

describe('faults of the form', () => {
  it('are found exactly where the contract of a section finds them', () => {
    const withPath = FIELD_IDS.filter((id) => fieldOf(id).path)
    const byPath = new Map(withPath.map((id) => [fieldOf(id).path as string, id]))
    const wild = fc.oneof(
      fc.constantFrom(-1, 0, 0.001, 0.5, 1, 2, 5, 11, 1000, 1e6, Infinity),
      fc.double({ noNaN: true }),
    )
    fc.assert(
      fc.property(
        fc.constantFrom(...withPath),
        wild,
        fc.constantFrom('linear' as const, 'developing' as const),
        (id, value, upliftModel) => {
          const at = input({ values: { [id]: value }, choices: { upliftModel } })
          const isUnused = upliftModel === 'linear' && (id === 'diffusivity' || id === 'upliftTime')
          const expected = sectionFaults(sectionCase(at)).map(({ path }) => byPath.get(path))
          const found = fieldFaults(at, 'section').map(({ field }) => field)
          expect(new Set(found)).toEqual(new Set(isUnused ? [] : expected))
        },
      ),
    )
  })

  it('give a level the range of the depth above the ground', () => {
    const at = input({ choices: { waterMode: 'level' }, values: { level: 5, groundLevel: 2.87 } })
    expect(fieldFaults(at, 'section')).toMatchObject([
      { field: 'level', reason: 'range', range: { min: 2.87, max: 3.92 } },
    ])
  })

  it('leave the section alone when only what comes before the water is wrong', () => {
    const at = input({ values: { windGust: 90 } })
    expect(fieldFaults(at, 'section')).toEqual([])
    expect(fieldFaults(at, 'before')).toMatchObject([{ field: 'windGust', reason: 'range' }])
  })
})
