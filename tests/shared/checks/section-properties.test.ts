import fc from 'fast-check'
import { describe, expect, it } from 'vitest'
import { checkSection } from '../../../shared/checks/section-check'
import { evaluateSection } from '../../../shared/checks/evaluate-section'
import { holdingProfile } from '../../../shared/checks/holds-to'
import { justEnough } from '../../../shared/checks/just-enough'
import { CHECK_IDS } from '../../../shared/schemas/section-result'
import { sectionResultSchema } from '../../../shared/schemas/section-result'
import { sectionFaults } from '../../../shared/schemas/section-faults'
import type { SectionCase } from '../../../shared/schemas/section-case'
import { exampleSection } from '../../../shared/verification/example-section'
import { arbitrarySection } from '../../support/arbitrary-section'
import { expectClose } from '../../support/close-to'

/** Every number in a result, however deep. */
function numbersIn(value: unknown): number[] {
  if (typeof value === 'number') return [value]
  if (typeof value !== 'object' || value === null) return []
  return Object.values(value).flatMap(numbersIn)
}

describe('anywhere in the ranges of the contract', () => {
  it('gives finite figures of the promised shape, and never hangs', () => {
    fc.assert(
      fc.property(arbitrarySection, (section) => {
        expect(sectionFaults(section)).toEqual([])
        const { workings: _, ...evaluation } = evaluateSection(section)
        expect(numbersIn(evaluation).every(Number.isFinite)).toBe(true)
        const whole = { ...evaluation, justEnough: justEnough(section) }
        expect(numbersIn(whole).every(Number.isFinite)).toBe(true)
        const holdsTo = { from: null, depth: 0, check: 'sliding' as const }
        expect(sectionResultSchema.safeParse({ ...whole, holdsTo }).success).toBe(true)
      }),
      { numRuns: 4000 },
    )
  })

  it('finds where it holds in bounded time, and every edge separates holding from failing', () => {
    fc.assert(
      fc.property(arbitrarySection, (section) => {
        // Others may have the processor meanwhile: what this process used counts.
        const started = process.cpuUsage()
        const { intervals } = holdingProfile(section)
        const { user, system } = process.cpuUsage(started)
        expect((user + system) / 1000).toBeLessThan(2000)
        for (const { from, to } of intervals) {
          expect(from).toBeLessThanOrEqual(to)
          expect(verdictAt(section, to)).not.toBe('fails')
          expect(verdictAt(section, to + 2e-7)).toBe('fails')
          if (from > 0) expect(verdictAt(section, from)).not.toBe('fails')
        }
      }),
      { numRuns: 120 },
    )
  })

  it('agrees with itself: the worst check gives the verdict, and governs', () => {
    fc.assert(
      fc.property(arbitrarySection, (section) => {
        const result = evaluateSection(section)
        const checked = CHECK_IDS.map((id) => result[id]).filter(
          (check) => check !== undefined && check.verdict !== 'notChecked',
        )
        const worst = result[result.governs]!
        expect(checked.some((check) => check!.verdict === 'fails')).toBe(result.verdict === 'fails')
        for (const check of checked) {
          const isBeyond =
            worst.utilisation !== null &&
            (check!.utilisation === null || check!.utilisation > worst.utilisation)
          expect(isBeyond).toBe(false)
        }
      }),
      { numRuns: 2000 },
    )
  })

  it('never holds without a skirt', () => {
    fc.assert(
      fc.property(arbitrarySection, (section) => {
        const bare = { ...section, barrier: { ...section.barrier, skirtLength: 0 } }
        if (bare.water.depth > 0) expect(evaluateSection(bare).verdict).toBe('fails')
        expect(holdingProfile(bare).intervals).toEqual([])
      }),
      { numRuns: 150 },
    )
  })
})

function verdictAt(section: SectionCase, depth: number) {
  return evaluateSection({ ...section, water: { ...section.water, depth } }).verdict
}

describe('scaling', () => {
  it('keeps every factor when lengths grow by a and masses and pressures with them', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 0.3, max: 3, noNaN: true }),
        fc.double({ min: 0.05, max: 0.9, noNaN: true }),
        (scale, share) => {
          const small = exampleSection({ water: { depth: 0.7 * share } })
          const large = {
            ...small,
            barrier: {
              ...small.barrier,
              diameter: 0.7 * scale,
              skirtLength: 2.2 * scale,
              contactWidth: 0.12 * scale,
              mass: 4.8 * scale ** 2,
              airPressure: 15_000 * scale,
            },
            water: { ...small.water, depth: 0.7 * share * scale },
          }
          const a = evaluateSection(small)
          const b = evaluateSection(large)
          for (const id of ['sliding', 'overturning', 'flotation', 'skirt'] as const) {
            expectClose(b[id].factor!, a[id].factor!, 1e-9, id)
          }
        },
      ),
    )
  })

  it('keeps every factor when density and gravity change and mass and pressure with them', () => {
    const light = exampleSection()
    const heavy = {
      ...light,
      barrier: {
        ...light.barrier,
        mass: 4.8 * 1.1,
        airPressure: (15_000 * 1.1 * 9.75) / 9.81,
      },
      water: { ...light.water, density: 1100 },
      gravity: 9.75,
    }
    for (const id of ['sliding', 'overturning', 'flotation', 'skirt'] as const) {
      expectClose(evaluateSection(heavy)[id].factor!, evaluateSection(light)[id].factor!, 1e-9, id)
    }
  })
})

describe('direction of each influence', () => {
  const sliding = (section: SectionCase): number => evaluateSection(section).sliding.factor!

  it.each([
    ['a longer skirt', exampleSection({ barrier: { skirtLength: 2.5 } })],
    ['a rougher ground', exampleSection({ ground: { friction: 0.5 } })],
    ['a sealed edge', exampleSection({ uplift: { edgeFactor: 0 } })],
    ['shallower water', exampleSection({ water: { depth: 0.5 } })],
  ])('%s adds grip', (_what, better) => {
    expect(sliding(better)).toBeGreaterThan(sliding(exampleSection()))
  })

  it.each([
    ['a current', exampleSection({ water: { currentSpeed: 0.5 } })],
    ['waves', exampleSection({ water: { waveHeight: 0.1, wavePeriod: 2 } })],
    ['water on the dry side', exampleSection({ water: { dryDepth: 0.1 } })],
  ])('%s takes grip away', (_what, worse) => {
    expect(sliding(worse)).toBeLessThan(sliding(exampleSection()))
  })
})

describe('just enough', () => {
  it('agrees with the closed forms on level ground', () => {
    // L = [FS F/(μρg) + A_o − W_b/ρg + ηhb/2]/[h(1 − η/2)], η = 2(W − FS F/μ)/(ρghB)
    fc.assert(
      fc.property(
        fc.double({ min: 0.1, max: 0.65, noNaN: true }),
        fc.double({ min: 0.2, max: 0.9, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (depth, friction, edgeFactor) => {
          const section = exampleSection({
            water: { depth },
            ground: { friction },
            uplift: { edgeFactor },
          })
          const { thrust, vertical } = evaluateSection(section)
          const [gamma, b, base] = [9810, 0.12, 2.32]
          const needed = (1.5 * thrust.total) / friction
          const length =
            (needed / gamma +
              vertical.lift / gamma -
              vertical.self / gamma +
              (edgeFactor * depth * b) / 2) /
            (depth * (1 - edgeFactor / 2))
          const weight = vertical.waterOnSkirt + vertical.self
          const edge = (2 * (weight - needed)) / (gamma * depth * base)
          const enough = justEnough(section)
          if (length <= 15) expectClose(enough.skirtLength!, Math.max(0, length), 1e-9)
          else expect(enough.skirtLength).toBeNull()
          if (edge < 0) expect(enough.edgeFactor).toBeNull()
          else expectClose(enough.edgeFactor!, edge, 1e-9)
        },
      ),
    )
  })

  it('makes sliding just hold on a slope, in dry water and with partial factors', () => {
    const section: SectionCase = {
      ...exampleSection({
        ground: { fall: 0.03 },
        water: { depth: 0.5, dryDepth: 0.05, currentSpeed: 0.4 },
        uplift: { model: 'deep' },
      }),
      basis: 'partial-ec7',
    }
    const { skirtLength, friction, edgeFactor } = checkSection(section).justEnough
    const used = (change: Partial<SectionCase>): number =>
      evaluateSection({ ...section, ...change }).sliding.utilisation!
    expect(used({ barrier: { ...section.barrier, skirtLength: skirtLength! } })).toBeCloseTo(1, 9)
    expect(used({ ground: { ...section.ground, friction: friction! } })).toBeCloseTo(1, 9)
    expect(used({ uplift: { ...section.uplift, edgeFactor: edgeFactor! } })).toBeCloseTo(1, 9)
  })
})
