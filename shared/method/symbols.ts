import { fieldRange, type FieldRange, type NumericPath } from '../schemas/section-ranges'
import { describeRange } from '../errors'
import type { FormulaSymbol } from './formula'

/** A symbol of one formula. */
export function symbol(tex: string, meaning: string, unit: string, range?: string): FormulaSymbol {
  return range === undefined ? { tex, meaning, unit } : { tex, meaning, unit, range }
}

/** What a field may be, in the words of its own range. */
function rangeWords({ max, ...range }: FieldRange): string {
  if (typeof max === 'number') return describeRange({ ...range, max }).replace('-', '−')
  return `${range.min} to ${max.times} D`
}

/** A symbol that is entered: meaning, unit and range are those of the field. */
function entered(tex: string, path: NumericPath): FormulaSymbol {
  const range = fieldRange(path)
  const [meaning = ''] = range.meaning.split(';')
  return { tex, meaning, unit: range.unit, range: rangeWords(range) }
}

/** Symbols that many formulas share. */
export const SYMBOLS = {
  h: entered('h', 'water.depth'),
  hd: entered('h_d', 'water.dryDepth'),
  rho: entered('\\rho', 'water.density'),
  g: entered('g', 'gravity'),
  D: entered('D', 'barrier.diameter'),
  L: entered('L', 'barrier.skirtLength'),
  b: entered('b', 'barrier.contactWidth'),
  m: entered('m', 'barrier.mass'),
  p: entered('p', 'barrier.airPressure'),
  mu: entered('\\mu', 'ground.friction'),
  fall: entered('\\tan\\beta', 'ground.fall'),
  eta: entered('\\eta', 'uplift.edgeFactor'),
  V: entered('V', 'water.currentSpeed'),
  Cd: entered('C_d', 'water.dragCoefficient'),
  Hs: entered('H_s', 'water.waveHeight'),
  T: entered('T', 'water.wavePeriod'),
  strength: entered('f', 'barrier.fabricStrength'),
  B: symbol('B', 'Base from the wet edge of the skirt to the dry toe, L + b', 'm'),
  Lw: symbol('L_w', 'Length of skirt under water', 'm'),
  Wb: symbol('W_b', 'Own weight, m g', 'N/m'),
  U: symbol('U', 'Uplift: water that presses under skirt and tube', 'N/m'),
  F: symbol('F', 'All horizontal loads, dry water subtracted', 'N/m'),
  FS: symbol('FS', 'Required factor of the check basis', '–'),
} as const
