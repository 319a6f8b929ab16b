import katex from 'katex'
import { describe, expect, it } from 'vitest'
import { METHOD_SECTIONS } from '../../../shared/method'
import { figureTex, givenTex, numberTex } from '../../../shared/method/figure-text'
import { CHECK_TAGS } from '../../../shared/verification/check-row'

const formulas = METHOD_SECTIONS.flatMap((section) => section.formulas)
const named = formulas.map((formula) => [formula.id, formula] as const)

/** Throws where KaTeX cannot set the text as it stands. */
function typeset(tex: string, displayMode = false): string {
  return katex.renderToString(tex, { displayMode, throwOnError: true, strict: 'error' })
}

describe('the method', () => {
  it('has sections and formulas under names of their own', () => {
    const ids = [...METHOD_SECTIONS.map(({ id }) => `section ${id}`), ...formulas.map((f) => f.id)]
    expect(new Set(ids).size).toBe(ids.length)
    expect(formulas.length).toBeGreaterThan(45)
  })

  it.each(named)('%s has symbols, units, an assumption, a source and a tag', (_id, formula) => {
    expect(formula.symbols.length).toBeGreaterThan(0)
    for (const { meaning, unit } of formula.symbols) {
      expect(meaning.length).toBeGreaterThan(2)
      expect(unit).not.toBe('')
    }
    expect(formula.assumptions.length).toBeGreaterThan(0)
    expect(formula.source.length).toBeGreaterThan(5)
    expect(CHECK_TAGS).toContain(formula.tag)
    const isRecalled = formula.source.includes('from memory')
    if (formula.tag === 'published') expect(isRecalled).toBe(false)
  })

  it.each(named)('%s is set by KaTeX without a warning', (_id, { tex, symbols, worked }) => {
    for (const line of tex) expect(typeset(line, true)).toContain('katex')
    for (const symbol of symbols) typeset(symbol.tex)
    for (const figure of worked.given) typeset(givenTex(figure))
    for (const figure of worked.compute()) typeset(figureTex(figure))
  })

  it.each(named)('%s has a worked figure that the engine computes', (_id, { worked }) => {
    const figures = worked.compute()
    expect(figures.length).toBeGreaterThan(0)
    for (const { value } of figures) expect(Number.isFinite(value)).toBe(true)
    expect(figures.some(({ value }) => value !== 0)).toBe(true)
  })
})

describe('a figure as TeX', () => {
  it('keeps five digits that count', () => {
    expect(numberTex(1483.7625)).toBe('1483.8')
    expect(numberTex(0.41915234)).toBe('0.41915')
    expect(numberTex(101_325)).toBe('101330')
    expect(numberTex(0)).toBe('0')
  })

  it('never rounds what is given', () => {
    expect(givenTex({ tex: 'p', value: 101_325, unit: 'Pa' })).toBe('p = 101325\\,\\mathrm{Pa}')
    expect(givenTex({ tex: 'k', value: 1.3063e-6, unit: '–' })).toBe('k = 1.3063\\times10^{-6}')
  })

  it('writes powers of ten where a number is very small or very large', () => {
    expect(numberTex(5.3318e-5)).toBe('5.3318\\times10^{-5}')
    expect(numberTex(-2_500_000)).toBe('-2.5\\times10^{6}')
  })

  it('writes the unit upright, and none for a pure number', () => {
    expect(figureTex({ tex: 'q', value: 2, unit: 'm²/s' })).toBe('q = 2\\,\\mathrm{m^2/s}')
    expect(figureTex({ tex: 'r', value: 0.5, unit: '–' })).toBe('r = 0.5')
  })
})
