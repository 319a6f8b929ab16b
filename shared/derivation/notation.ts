import type { Box } from './layout'
import { symbolParts } from './symbols'

/** One way to write a formula down. */
interface Notation {
  readonly symbol: (id: string) => string
  readonly figure: (digits: string, exponent: number, unit: string) => string
  readonly operator: (sign: string) => string
  readonly fraction: (over: string, under: string) => string
  readonly power: (base: string, exponent: string) => string
  readonly root: (of: string) => string
  readonly brackets: (of: string, isLong: boolean) => string
  readonly call: (name: string, args: readonly string[]) => string
  readonly integral: (of: string, variable: string, from: string, to: string) => string
  readonly series: (of: string, variable: string, from: string) => string
  readonly extreme: (name: string, of: string) => string
}

function write(box: Box, n: Notation): string {
  switch (box.kind) {
    case 'symbol':
      return n.symbol(box.id)
    case 'figure':
      return n.figure(box.digits, box.exponent, box.unit)
    case 'row':
      return box.items
        .map((item) => (typeof item === 'string' ? n.operator(item) : write(item, n)))
        .filter((part) => part !== '')
        .join(' ')
    case 'fraction':
      return n.fraction(write(box.over, n), write(box.under, n))
    case 'power':
      return n.power(write(box.base, n), write(box.exponent, n))
    case 'root':
      return n.root(write(box.of, n))
    case 'brackets':
      return n.brackets(write(box.of, n), box.isLong ?? false)
    case 'function':
      return n.call(
        box.name,
        box.args.map((arg) => write(arg, n)),
      )
    case 'integral':
      return n.integral(
        write(box.of, n),
        write(box.variable, n),
        write(box.from, n),
        write(box.to, n),
      )
    case 'series':
      return n.series(write(box.of, n), write(box.variable, n), box.from)
    case 'extreme':
      return n.extreme(box.name, write(box.of, n))
  }
}

const ARC_NAMES: Readonly<Record<string, string>> = {
  asin: 'arcsin',
  acos: 'arccos',
  atan: 'arctan',
}
const fullName = (name: string): string => ARC_NAMES[name] ?? name

/** Functions that TeX and Typst know by name; the rest is set upright. */
const KNOWN = new Set('sin cos tan sinh cosh tanh exp max min arcsin arccos arctan'.split(' '))

const TEX: Notation = {
  symbol: (id) => {
    const { base, isGreek, isUpright, sub, isStarred } = symbolParts(id)
    const letter = isGreek ? `\\${base}` : isUpright ? `\\mathrm{${base}}` : base
    const below = sub === '' ? '' : `_{\\mathrm{${sub}}}`
    return `${letter === 'ell' ? '\\ell' : letter}${below}${isStarred ? '^{*}' : ''}`
  },
  figure: (digits, exponent, unit) => {
    const number = digits.replace('−', '-').replace(/\u202f/g, '\\,')
    const power = exponent === 0 ? '' : ` \\cdot 10^{${exponent}}`
    return unit === '' ? `${number}${power}` : `${number}${power}\\,${texUnit(unit)}`
  },
  operator: (sign) =>
    ({ ' ': '\\,', '*': '\\cdot', '−': '-', '≤': '\\le', ':': '\\colon' })[sign] ?? sign,
  fraction: (over, under) => `\\frac{${over}}{${under}}`,
  power: (base, exponent) => `${base}^{${exponent}}`,
  root: (of) => `\\sqrt{${of}}`,
  brackets: (of, isLong) => (isLong ? `(${of})` : `\\left(${of}\\right)`),
  call: (name, args) => {
    const full = fullName(name)
    if (name === 'abs') return `\\left|${args.join(', ')}\\right|`
    const head = KNOWN.has(full) ? `\\${full}` : `\\operatorname{${full}}`
    return `${head}\\left(${args.join(',\\, ')}\\right)`
  },
  integral: (of, variable, from, to) => `\\int_{${from}}^{${to}} ${of}\\, \\mathrm{d}${variable}`,
  series: (of, variable, from) => `\\sum_{${variable} = ${from.replace('…', '\\dots')}} ${of}`,
  extreme: (name, of) => `\\${name}\\left\\{ ${of} \\right\\}`,
}

function texUnit(unit: string): string {
  const raised = unit.replace(/²/g, '^{2}').replace(/³/g, '^{3}').replace(/·/g, '\\cdot ')
  return `\\mathrm{${raised}}`
}

const TYPST: Notation = {
  symbol: (id) => {
    const { base, isGreek, isUpright, sub, isStarred } = symbolParts(id)
    const greek = base === 'phi' ? 'phi' : base
    const letter = isGreek ? greek : isUpright ? `upright("${base}")` : base
    const below = sub === '' ? '' : `_upright("${sub}")`
    return `${letter}${below}${isStarred ? '^"*"' : ''}`
  },
  figure: (digits, exponent, unit) => {
    const number = digits.startsWith('−') ? `minus "${digits.slice(1)}"` : `"${digits}"`
    const power = exponent === 0 ? '' : ` dot 10^(${exponent})`
    return unit === '' ? `${number}${power}` : `${number}${power} thin upright("${unit}")`
  },
  operator: (sign) =>
    ({ ' ': 'thin', '*': 'dot', '−': '-', '≤': '<=', ':': 'colon' })[sign] ?? sign,
  fraction: (over, under) => `frac(${over}, ${under})`,
  power: (base, exponent) => `${base}^(${exponent})`,
  root: (of) => `sqrt(${of})`,
  brackets: (of, isLong) => (isLong ? `\\( ${of} \\)` : `lr((${of}))`),
  call: (name, args) => {
    const full = fullName(name)
    if (name === 'abs') return `abs(${args.join(', ')})`
    const head = KNOWN.has(full) ? full : `op("${full}")`
    return `${head} lr((${args.join(' , ')}))`
  },
  integral: (of, variable, from, to) => `integral_(${from})^(${to}) ${of} thin dif ${variable}`,
  series: (of, variable, from) => `sum_(${variable} = "${from}") ${of}`,
  extreme: (name, of) => `${name} lr({ ${of} })`,
}

const GREEK: Readonly<Record<string, string>> = {
  alpha: 'α',
  beta: 'β',
  gamma: 'γ',
  eta: 'η',
  mu: 'μ',
  phi: 'φ',
  pi: 'π',
  rho: 'ρ',
  tau: 'τ',
  ell: 'ℓ',
}

const isSimple = (text: string): boolean => !/[ /]/.test(text)
const held = (text: string): string => (isSimple(text) ? text : `(${text})`)

const PLAIN: Notation = {
  symbol: (id) => {
    const { base, sub, isStarred } = symbolParts(id)
    return `${GREEK[base] ?? base}${sub === '' ? '' : `_${sub}`}${isStarred ? '*' : ''}`
  },
  figure: (digits, exponent, unit) =>
    `${digits}${exponent === 0 ? '' : `·10^${exponent}`}${unit === '' ? '' : `\u00a0${unit}`}`,
  operator: (sign) => ({ ' ': '', '*': '·' })[sign] ?? sign,
  fraction: (over, under) => `${held(over)}/${held(under)}`,
  power: (base, exponent) => `${base}^${held(exponent)}`,
  root: (of) => `√(${of})`,
  brackets: (of) => `(${of})`,
  call: (name, args) => `${fullName(name)}(${args.join(', ')})`,
  integral: (of, variable, from, to) => `∫[${from} … ${to}] ${of} d${variable}`,
  series: (of, variable, from) => `Σ[${variable} = ${from}] ${of}`,
  extreme: (name, of) => `${name}{${of}}`,
}

/** One formula in the three notations that screen, paper and plain text read. */
export interface Written {
  /** For KaTeX. */
  readonly tex: string
  /** For Typst's mathematics. */
  readonly typst: string
  /** For those who do not see it, and for CSV. */
  readonly plain: string
}

/** Writes a formula in all notations. */
export function writeBox(box: Box): Written {
  return { tex: write(box, TEX), typst: write(box, TYPST), plain: write(box, PLAIN) }
}
