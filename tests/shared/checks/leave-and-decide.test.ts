import { describe, expect, it } from 'vitest'
import { BARRIERS } from '../../../shared/catalogue/barriers'
import { compare, verdictOf } from '../../../shared/checks/compare'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { holdingProfile, holdsToAt } from '../../../shared/checks/holds-to'
import { leaveLevel } from '../../../shared/checks/leave-level'
import { whatDecides } from '../../../shared/checks/what-decides'
import type { SectionCase } from '../../../shared/schemas/section-case'
import { formatNumber } from '../../../shared/units'
import { exampleSection } from '../../../shared/verification/example-section'

describe('comparison of demand and resistance', () => {
  it.each([
    [{ demand: 10, resistance: 20 }, 1.5, { factor: 2, utilisation: 0.75, verdict: 'holds' }],
    [{ demand: 10, resistance: 16 }, 1.5, { factor: 1.6, utilisation: 0.9375, verdict: 'narrow' }],
    [{ demand: 10, resistance: 10 }, 1.5, { factor: 1, utilisation: 1.5, verdict: 'fails' }],
    [{ demand: 10, resistance: -5 }, 1.5, { factor: -0.5, utilisation: null, verdict: 'fails' }],
    [{ demand: 10, resistance: 0 }, 1.5, { factor: 0, utilisation: null, verdict: 'fails' }],
    [{ demand: 0, resistance: 0 }, 1.5, { factor: null, utilisation: 0, verdict: 'holds' }],
    [{ demand: -3, resistance: 5 }, 1.5, { factor: null, utilisation: 0, verdict: 'holds' }],
    [{ demand: -3, resistance: -5 }, 1.5, { factor: null, utilisation: null, verdict: 'fails' }],
    [{ demand: 10, resistance: 20 }, null, { factor: 2, utilisation: null, verdict: 'notChecked' }],
  ] as const)('%o, required %s', (pair, required, expected) => {
    expect(compare(pair, required)).toEqual({ ...expected, required })
  })

  it('is narrow above 90 % and up to 100 %', () => {
    expect([0.9, 0.9000001, 1, 1.0000001].map(verdictOf)).toEqual([
      'holds',
      'narrow',
      'narrow',
      'fails',
    ])
  })
})

describe('leave level', () => {
  const known = { holdsToDepth: 0.49, depth: 0.42, rateOfRise: null, timeToClear: 1200 }

  it('lies at least 0.05 m below what holds', () => {
    expect(leaveLevel(known)).toEqual({ depth: 0.44, margin: 0.05, state: 'leave-at' })
    const slow = leaveLevel({ ...known, rateOfRise: 0.13 / 3600 })
    expect(slow.margin).toBe(0.05)
  })

  it('lies lower where the water rises fast', () => {
    const { depth, margin } = leaveLevel({ ...known, rateOfRise: 0.3 / 3600 })
    expect(margin).toBeCloseTo(0.1, 12)
    expect(depth).toBeCloseTo(0.39, 12)
  })

  it('says when the level checked holds but must be left before it', () => {
    expect(leaveLevel({ ...known, depth: 0.46 }).state).toBe('leave-before-level')
    expect(leaveLevel({ ...known, depth: 0.55 }).state).toBe('leave-at')
  })

  it('says leave now once the water stands above it', () => {
    expect(leaveLevel({ ...known, depthNow: 0.45 }).state).toBe('leave-now')
    expect(leaveLevel({ ...known, depthNow: 0.4 }).state).toBe('leave-at')
  })

  it('lies below the ground where clearing takes longer than the water needs', () => {
    // 2 m/h for 20 min is 0.667 m: more than the 0.49 m that hold.
    const { depth, margin } = leaveLevel({ ...known, rateOfRise: 2 / 3600 })
    expect(margin).toBeCloseTo(2 / 3, 12)
    expect(depth).toBeCloseTo(0.49 - 2 / 3, 12)
    expect(leaveLevel({ ...known, rateOfRise: 2 / 3600, depthNow: -0.1 }).state).toBe('leave-now')
  })

  it('is not there where nothing holds, or only higher water does', () => {
    const none = { depth: null, state: 'none' }
    expect(leaveLevel({ ...known, holdsToDepth: 0 })).toMatchObject(none)
    expect(leaveLevel({ ...known, holdsFrom: 0.43 })).toMatchObject(none)
    expect(leaveLevel({ ...known, holdsFrom: 0.45, depth: 0.46 })).toMatchObject(none)
    expect(leaveLevel({ ...known, holdsFrom: 0.2 }).state).toBe('leave-at')
  })
})

describe('what decides', () => {
  const section = exampleSection()
  const alternatives = whatDecides(section, BARRIERS[2]!)
  const holdsTo = (id: string): number =>
    alternatives.find((alternative) => alternative.id === id)!.holdsTo.depth

  it('leaves out what is chosen', () => {
    const ids = alternatives.map(({ id }) => id)
    expect(ids).not.toContain('edge-open')
    expect(ids).not.toContain('basis-global-1.5')
    expect(ids).toContain('edge-sealed')
    expect(ids).toContain('next-size')
  })

  it('gives each the depth to which it would hold', () => {
    // Derived, two programs, rounded down: sealed 0.588, unusual 0.563, friction 0.25 0.285 m.
    const shown = (id: string): string => formatNumber(holdsTo(id), 3, 'down')
    expect(shown('edge-sealed')).toBe('0.588')
    expect(shown('basis-unusual')).toBe('0.563')
    expect(shown('friction-slippery')).toBe('0.285')
    expect(holdsTo('next-size')).toBeGreaterThan(holdsToAt(holdingProfile(section), 0.55).depth)
  })

  it('counts a weighed edge as the case says, half open where it says nothing', () => {
    const edgeOf = (of: SectionCase) =>
      whatDecides(of, null).find(({ id }) => id === 'edge-weighed')!.section.uplift.edgeFactor
    const own = { ...section, uplift: { ...section.uplift, weighedEdgeFactor: 0.3 } }
    expect(edgeOf(section)).toBe(0.5)
    expect(edgeOf(own)).toBe(0.3)
  })

  it('leaves no group out where the choice is the most favourable, or the ground slippery', () => {
    const sealed = exampleSection({ uplift: { model: 'none' }, ground: { friction: 0.2 } })
    const others = whatDecides(sealed, null)
    const find = (id: string) => others.find((other) => other.id === id)!
    expect(find('edge-open').section.uplift).toMatchObject({ model: 'linear', edgeFactor: 1 })
    expect(find('edge-weighed').section.uplift).toMatchObject({ model: 'linear', edgeFactor: 0.5 })
    expect(find('friction-slippery').section.ground.friction).toBe(0.1)
  })
})

describe('ground that does not suit', () => {
  it('fails whatever the figures say', () => {
    const section = exampleSection({ water: { depth: 0.2 }, ground: { suitable: false } })
    const { verdict, governs, ground } = evaluateSection(section)
    expect({ verdict, governs }).toEqual({ verdict: 'fails', governs: 'ground' })
    expect(ground?.verdict).toBe('fails')
    expect(holdsToAt(holdingProfile(section), 0.2)).toEqual({
      from: null,
      depth: 0,
      check: 'ground',
    })
  })
})
