import { layOut } from '../derivation/layout'
import { writeFigure } from '../derivation/written-line'
import type { Derivation } from '../derivation/line'
import { writeBox } from '../derivation/notation'
import type { Sheet } from '../schemas/sheet'
import { GRAVITY, WATER_DENSITY } from '../constants'
import type { InputRow } from './document'
import type { SheetWords } from './sheet-words'

/** Path in the case of what a symbol stands for, where it is an input. */
const PATHS: Readonly<Record<string, string>> = {
  rho: 'water.density',
  g: 'gravity',
  D: 'barrier.diameter',
  L: 'barrier.skirtLength',
  b: 'barrier.contactWidth',
  m: 'barrier.mass',
  p: 'barrier.airPressure',
  ell_s: 'barrier.sectionLength',
  S_t: 'barrier.fabricStrength',
  mu: 'ground.friction',
  t_f: 'ground.fall',
  k_g: 'ground.permeability',
  T_l: 'ground.layerThickness',
  c_u: 'ground.undrainedStrength',
  eta: 'uplift.edgeFactor',
  c_v: 'uplift.diffusivity',
  t_u: 'uplift.time',
  h: 'water.depth',
  h_d: 'water.dryDepth',
  V: 'water.currentSpeed',
  C_d: 'water.dragCoefficient',
  H_s: 'water.waveHeight',
  T_w: 'water.wavePeriod',
  P_d: 'debris.force',
  f_r: 'requiredFreeboard',
  Z_g: 'groundLevel',
  Z_w: 'waterLevel',
  c_r: 'rateOfRise',
  t_c: 'timeToClear',
}

/** Everything that was entered and used, with its source. */
export function inputRows(
  derivation: Derivation,
  sheet: Sheet,
  words: SheetWords,
): readonly InputRow[] {
  return derivation.givens.map((figure) => ({
    symbol: writeBox(layOut(figure.symbol, (id) => ({ kind: 'symbol', id }))),
    name: words.say(`derivation.given.${figure.symbol}`),
    value: writeFigure(figure, derivation.system),
    source: sourceOf(figure.symbol, sheet, words),
  }))
}

function sourceOf(symbol: string, sheet: Sheet, { say }: SheetWords): string {
  const path = PATHS[symbol]
  const own = path === undefined ? undefined : sheet.inputSources[path]
  if (own !== undefined && own !== '') return own
  if (symbol.startsWith('n_')) return say('sheet.given.basis')
  if (path?.startsWith('barrier.')) return say('sheet.given.barrier')
  if (symbol === 'mu' || symbol === 'eta') return say('sheet.given.judgement')
  if (symbol === 'Z_g') return say('sheet.given.survey')
  const { gravity, water } = sheet.case
  const isDefault =
    symbol === 'd_l' ||
    (symbol === 'g' && gravity === GRAVITY) ||
    (symbol === 'rho' && water.density === WATER_DENSITY)
  return say(isDefault ? 'sheet.given.default' : 'sheet.given.entered')
}
