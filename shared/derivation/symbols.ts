const GREEK_NAMES = new Set([
  'alpha',
  'beta',
  'gamma',
  'eta',
  'mu',
  'phi',
  'pi',
  'rho',
  'tau',
  'ell',
])

/** How a symbol is put together. */
export interface SymbolParts {
  /** Letter, or the name of a Greek one. */
  readonly base: string
  readonly isGreek: boolean
  /** Several letters stand for one quantity: upright. */
  readonly isUpright: boolean
  readonly sub: string
  readonly isStarred: boolean
}

/** Subscripts that read better in full. */
const SUBSCRIPTS: Readonly<Record<string, string>> = { Ww: 'W', min: 'min', max: 'max' }

/** Takes the name of a quantity in a formula apart: `W_w`, `beta_A`, `FS_s`, `eta_star`. */
export function symbolParts(id: string): SymbolParts {
  const [base = '', ending = ''] = id.split('_')
  const isGreek = GREEK_NAMES.has(base)
  const isStarred = ending === 'star'
  return {
    base,
    isGreek,
    isUpright: !isGreek && base.length > 1,
    sub: isStarred ? '' : (SUBSCRIPTS[ending] ?? ending),
    isStarred,
  }
}
