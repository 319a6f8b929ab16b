import { describe, expect, it } from 'vitest'
import { checkSection } from '../../../shared/checks/section-check'
import { deriveSection, type DerivationOptions } from '../../../shared/derivation/derive-section'
import { DerivationDisagreementError } from '../../../shared/derivation/disagreement'
import type { Derivation, DerivationLine } from '../../../shared/derivation/line'
import { verifyDerivation } from '../../../shared/derivation/verify-derivation'
import { writeLine } from '../../../shared/derivation/written-line'
import { parseSectionCase } from '../../../shared/schemas/parse-section-case'
import type { SectionCaseInput } from '../../../shared/schemas/section-case'
import { derivationTexts } from '../../../shared/texts/derivation.en'
import goldens from '../../golden/section.json'

const OPTIONS = { groundLevel: 2.87, leave: { rateOfRise: 1e-4, timeToClear: 1200 } }

function derive(input: unknown, options: DerivationOptions = OPTIONS): Derivation {
  const section = parseSectionCase(input)
  return deriveSection(section, checkSection(section), options)
}

const golden = goldens.map(({ case: input }, i) => [`case ${i}`, input] as const)

/** Waves, current, debris, water on both sides, on a slope. */
const LOADED: SectionCaseInput = {
  barrier: {
    ...{ diameter: 0.7, skirtLength: 2.2, contactWidth: 0.12, mass: 4.8 },
    ...{ airPressure: 15_000, fabricStrength: 60_000 },
  },
  ground: { friction: 0.45, fall: 0.02, permeability: 1e-5, layerThickness: 2 },
  uplift: { edgeFactor: 0.5 },
  water: { depth: 0.4, dryDepth: 0.03, currentSpeed: 0.6, waveHeight: 0.04, wavePeriod: 1.5 },
  debris: { force: 400 },
}
/** Partial factors, uplift that grows, soft ground, beside a bend. */
const PARTIAL: SectionCaseInput = {
  ...LOADED,
  ground: { friction: 0.5, undrainedStrength: 3000 },
  uplift: { model: 'developing', diffusivity: 1e-5, time: 43_200 },
  water: { depth: 0.45 },
  basis: 'partial-ec7',
}

describe('a derivation', () => {
  it.each(golden)('of %s agrees with itself, line by line', (_name, input) => {
    const { recomputed, substituted } = verifyDerivation(derive(input))
    expect(recomputed).toBeGreaterThan(20)
    expect(substituted).toBeGreaterThanOrEqual(0)
  })

  it.each(golden.filter((_, i) => i % 4 === 0))('of %s agrees in US units', (_name, input) => {
    const derivation = derive(input, { ...OPTIONS, system: 'us' })
    expect(() => verifyDerivation(derivation)).not.toThrow()
    const thrust = derivation.lines.find(({ id }) => id === 'stillThrust')
    expect(thrust?.result.unit).toBe('lbf/ft')
  })

  it('carries the figures of the check itself', () => {
    const section = parseSectionCase(LOADED)
    const result = checkSection(section)
    const { lines } = deriveSection(section, result, OPTIONS)
    const figure = (id: string) => lines.find((line) => line.id === id)?.result.value
    expect(figure('slidingFactor')).toBe(result.sliding.factor)
    expect(figure('slidingUsed')).toBe(result.sliding.utilisation)
    expect(figure('skirtFactor')).toBe(result.skirt.factor)
    expect(figure('freeboard')).toBe(result.freeboard.available)
    expect(figure('holdsTo')).toBe(result.holdsTo.depth)
    expect(figure('uplift')).toBe(result.vertical.uplift / 1000)
  })

  it.each([
    ['loads of every kind, metric', LOADED, { ...OPTIONS, gripShare: 0.93 }],
    ['loads of every kind, US', LOADED, { ...OPTIONS, system: 'us' } as const],
    ['partial factors on soft ground', PARTIAL, OPTIONS],
  ])('names every line and every input: %s', (_name, input, options) => {
    const section = parseSectionCase(input)
    const result = checkSection(section)
    // Beside a bend the result is that of the bend, which the line check gives; here only names count.
    const derivation = deriveSection(section, result, { ...options, gripShare: 1 })
    verifyDerivation(derivation)
    const names = derivationTexts.line as Record<string, string>
    const notes = derivationTexts.note as Record<string, string>
    const givens = derivationTexts.given as Record<string, string>
    expect(derivation.lines.filter(({ id }) => !names[id]).map(({ id }) => id)).toEqual([])
    expect(derivation.lines.filter(({ id, note }) => note && !notes[id])).toEqual([])
    expect(derivation.givens.filter(({ symbol }) => !givens[symbol])).toEqual([])
  })
})

/** One line, changed, after everything that it stands on: what is before it is not computed again. */
function changed(derivation: Derivation, place: number, change: Partial<DerivationLine>) {
  const before = derivation.lines.slice(0, place).map(({ result }) => result)
  const lines = [{ ...derivation.lines[place]!, ...change }]
  return { ...derivation, givens: [...derivation.givens, ...before], lines }
}

/** The line that stops a derivation; none where it passes. */
function stoppedBy(derivation: Derivation): string | undefined {
  try {
    verifyDerivation(derivation)
    return undefined
  } catch (error) {
    if (error instanceof DerivationDisagreementError) return error.lineNumber
    throw error
  }
}

const UNIT_TWINS: Readonly<Record<string, string>> = { kN: 'N', m: 'cm', '': 'm' }

describe.each([
  ['the question of the telephone', goldens[0]?.case],
  ['loads of every kind', LOADED],
  ['partial factors', PARTIAL],
])('one change stops the sheet and names its line: %s', (_name, input) => {
  const derivation = derive(input)
  const places = derivation.lines.map((line, i) => [line, i] as const)

  it('one figure, by one part in a million', () => {
    const missed = places
      .filter(([line]) => line.result.value !== 0)
      .filter(([line, i]) => {
        const result = { ...line.result, value: line.result.value * (1 + 1e-6) }
        return stoppedBy(changed(derivation, i, { result })) !== line.number
      })
    expect(missed.map(([{ id }]) => id)).toEqual([])
  })

  it('one input of one line', () => {
    const missed = places
      .filter(([line]) => line.inputs.length > 0)
      .filter(([line, i]) => {
        const [first, ...rest] = line.inputs
        const inputs = [{ ...first!, value: (first!.value || 1) * (1 + 1e-6) }, ...rest]
        return stoppedBy(changed(derivation, i, { inputs })) !== line.number
      })
    expect(missed.map(([{ id }]) => id)).toEqual([])
  })

  it('one unit', () => {
    const missed = places.filter(([line, i]) => {
      const unit = UNIT_TWINS[line.result.unit] ?? `${line.result.unit} kg`
      return stoppedBy(changed(derivation, i, { result: { ...line.result, unit } })) !== line.number
    })
    expect(missed.map(([{ id }]) => id)).toEqual([])
  })

  it('one expression', () => {
    const missed = places
      .filter(([line]) => line.result.value !== 0)
      .filter(([line, i]) => {
        const formula = `1.001 * (${line.formula})`
        return stoppedBy(changed(derivation, i, { formula })) !== line.number
      })
    expect(missed.map(([{ id }]) => id)).toEqual([])
  })
})

it('names the changed line in the middle of a whole derivation, and leaves the others alone', () => {
  const derivation = derive(goldens[0]?.case)
  const place = derivation.lines.findIndex(({ id }) => id === 'uplift')
  const line = derivation.lines[place]!
  const wrong = { ...line, result: { ...line.result, value: line.result.value * (1 + 1e-6) } }
  const lines = derivation.lines.map((other) => (other === line ? wrong : other))
  expect(stoppedBy(derivation)).toBeUndefined()
  expect(stoppedBy({ ...derivation, lines })).toBe(line.number)
})

describe('a line in words of mathematics', () => {
  const { lines } = derive(goldens[0]?.case)
  const written = (id: string) =>
    writeLine(
      lines.find((line) => line.id === id)!,
      'metric',
    )

  it('is written from its one expression, symbolic and with its numbers', () => {
    const { symbolic, numeric, result } = written('stillThrust')
    expect(symbolic.plain).toBe('F_h = (γ h^2)/2')
    expect(symbolic.tex).toBe('F_{\\mathrm{h}} = \\frac{\\gamma \\, h^{2}}{2}')
    expect(symbolic.typst).toBe('F_upright("h") = frac(gamma thin h^("2"), "2")')
    expect(numeric?.plain).toBe('(9.81\u00a0kN/m³ · (0.550\u00a0m)^2)/2')
    expect(result.plain).toBe('1.48\u00a0kN/m')
  })

  it('rounds what holds and the leave level down, wherever they stand', () => {
    expect(written('holdsTo').result.plain).toBe('0.489\u00a0m')
    expect(written('holdsToLevel').numeric?.plain).toBe('2.870\u00a0m + 0.489\u00a0m')
    expect(written('holdsToLevel').result.plain).toBe('3.359\u00a0m')
  })

  it('says to what both sides of a substituted line agree', () => {
    expect(written('skinTension').residual).toBeLessThan(1e-12)
    expect(written('freeSkirt').residual).toBeLessThan(1e-12)
    expect(written('stillThrust').residual).toBeNull()
  })
})
