import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { BASIS_IDS, type BasisId } from '../../../shared/catalogue/check-bases'
import { checkTerms, sumOfTerms, type SummedCheck } from '../../../shared/checks/check-terms'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import type { SectionCase } from '../../../shared/schemas/section-case'

const CHECKS: readonly SummedCheck[] = ['sliding', 'overturning', 'flotation', 'skirt']

/** Everything at once: slope, dry water, current, waves and debris. */
function caseOf(
  basis: BasisId,
  change: { fall?: number; depth?: number; soft?: number | null } = {},
): SectionCase {
  const { fall = 0.04, depth = 0.42, soft = null } = change
  return parseSectionCase({
    barrier: {
      diameter: 0.7,
      skirtLength: 2.2,
      contactWidth: 0.12,
      mass: 4.8,
      airPressure: 15_000,
      fabricStrength: 60_000,
    },
    ground: { friction: 0.45, fall, undrainedStrength: soft },
    uplift: { edgeFactor: 0.8 },
    water: { depth, dryDepth: 0.06, currentSpeed: 0.8, waveHeight: 0.08, wavePeriod: 2 },
    debris: { force: 2000 },
    basis,
  })
}

function addedUp(section: SectionCase, check: SummedCheck) {
  const { demand, resistance, friction, frictionFactor, softGround } = checkTerms(section, check)
  return {
    demand: sumOfTerms(demand),
    resistance: softGround ?? (sumOfTerms(resistance) * friction) / frictionFactor,
  }
}

describe('the terms of a check', () => {
  it('add up to what the check compares, on every basis and slope', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...BASIS_IDS),
        fc.constantFrom(...CHECKS),
        fc.double({ min: -0.1, max: 0.1, noNaN: true }),
        fc.double({ min: 0.08, max: 1, noNaN: true }),
        fc.option(fc.double({ min: 1, max: 2000, noNaN: true })),
        (basis, check, fall, depth, soft) => {
          const section = caseOf(basis, { fall, depth, soft })
          const { demand, resistance } = evaluateSection(section).workings[check]
          const sums = addedUp(section, check)
          expect(sums.demand).toBeCloseTo(demand, 6)
          expect(sums.resistance).toBeCloseTo(resistance, 6)
        },
      ),
    )
  })

  it('name the lift by the water on the dry side, and the slope', () => {
    const { demand, resistance } = checkTerms(caseOf('global-1.5'), 'sliding')
    expect(demand.map(({ id }) => id)).toEqual([
      'still',
      'current',
      'wave',
      'debris',
      'dry',
      'self',
      'lift',
      'dryLift',
    ])
    expect(resistance.map(({ id, slope }) => [id, slope])).toEqual([
      ['skirtWater', null],
      ['self', 'cos'],
      ['lift', 'cos'],
      ['dryLift', 'cos'],
      ['loads', 'sin'],
      ['uplift', null],
    ])
  })

  it('leave the slope away on level ground', () => {
    const { demand, resistance } = checkTerms(caseOf('global-1.5', { fall: 0 }), 'sliding')
    expect(demand.map(({ id }) => id)).toEqual(['still', 'current', 'wave', 'debris', 'dry'])
    expect(resistance.map(({ id }) => id)).not.toContain('loads')
    expect([...demand, ...resistance].every(({ slope }) => slope === null)).toBe(true)
  })

  it('carry the partial factors of the worse combination, EN 1997-1 tables A.3 and A.4', () => {
    const { combination, demand, frictionFactor } = checkTerms(caseOf('partial-ec7'), 'sliding')
    const factorOf = (id: string) => demand.find((term) => term.id === id)!.factor
    const [permanent, variable, friction] = combination === 1 ? [1.35, 1.5, 1] : [1, 1.3, 1.25]
    expect(factorOf('still')).toBe(permanent)
    expect(factorOf('wave')).toBe(variable)
    expect(factorOf('dry')).toBe(-permanent)
    expect(frictionFactor).toBe(friction)
  })
})
