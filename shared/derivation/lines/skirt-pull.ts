import { upliftSharePartial } from '../../calc/uplift/uplift-share'
import { partialPairs } from '../../checks/partial-checks'
import { writeCheck } from './check-lines'
import { sum, type LineContext } from './context'
import { FACTORED_STRENGTH, isSoft, resistanceText } from './friction'
import { developing, upliftSource } from './uplift'

/** Does the part of the skirt that stays flat hold the tube? Nothing to write where no shape stands. */
export function writeSkirtPull(context: LineContext): void {
  const { book, state, result, names } = context
  const { shape, geometry } = state
  if (!shape.solved || !result.loadedShape.solved) return
  const hasFree = shape.freeSkirt > 0
  book.line('skirt', {
    id: 'flatSkirt',
    symbol: 'L_f',
    formula: sum([names.skirt], [hasFree ? 'ell_f' : null]),
    value: geometry.wettedSkirt - shape.freeSkirt,
    kind: 'length',
    source: 'membrane',
  })
  const under = writeUnderSkirt(context, geometry.wettedSkirt - shape.freeSkirt)
  const normal = under === null ? '(gamma * h * L_f)' : `(gamma * h * L_f - ${under})`
  book.line('skirt', {
    id: 'skirtGrip',
    symbol: 'R_k',
    formula: resistanceText(context, normal, 'L_f'),
    value: result.loadedShape.skirtGrip,
    kind: 'forcePerLength',
    source: 'equilibrium',
    hasNote: true,
  })
  if (!state.isReversed) writeSkirtCheck(context, normal)
}

function writeSkirtCheck(context: LineContext, normal: string): void {
  const { book, state, names } = context
  const common = { check: 'skirt', group: 'skirt', suffix: 'k' } as const
  if (state.basis.format === 'global') {
    writeCheck(context, { ...common, resistance: 'R_k', demand: names.force })
    return
  }
  book.line('skirt', {
    id: 'skirtResistance',
    symbol: 'R_d',
    formula: isSoft(context)
      ? resistanceText(context, normal, 'L_f', FACTORED_STRENGTH)
      : 'R_k / 1.25',
    value: partialPairs(state).skirt.resistance,
    kind: 'forcePerLength',
    source: 'ec7',
  })
  writeCheck(context, { ...common, resistance: 'R_d', demand: 'E_2', source: 'ec7' })
}

/** Water under the flat skirt; the symbol of its force, or null where there is none. */
function writeUnderSkirt(context: LineContext, flat: number): string | null {
  const { book, section, state, names } = context
  const { uplift, water } = section
  const { base, depth, unitWeight } = state.geometry
  if (uplift.model === 'none' || base === 0) return null
  const excess = uplift.edgeFactor * depth - water.dryDepth
  if (excess === 0 && names.dryDepth === null) return null
  const head = writeHead(context, excess)
  const share = writeShare(context, flat)
  const partial = upliftSharePartial(uplift, base, flat)
  book.line('skirt', {
    id: 'underSkirt',
    symbol: 'U_f',
    formula:
      names.dryDepth === null
        ? `gamma * ${head} * ${share}`
        : `gamma * (h_d * L_f + ${head} * ${share})`,
    value: unitWeight * (water.dryDepth * flat + excess * partial),
    kind: 'forcePerLength',
    source: upliftSource(context),
  })
  return 'U_f'
}

/** Head at the edge for the flat skirt; on level ground it is that of the whole base. */
function writeHead({ book, names }: LineContext, excess: number): string {
  if (!names.isSloped) return 'e_u'
  book.line('skirt', {
    id: 'skirtExcess',
    symbol: 'e_f',
    formula: sum(['eta * h'], [names.dryDepth]),
    value: excess,
    kind: 'length',
    source: 'statics',
  })
  return 'e_f'
}

/** The pressure share summed over the flat skirt, as an expression. */
function writeShare(context: LineContext, flat: number): string {
  const { book, section, state } = context
  const { base } = state.geometry
  const { model } = section.uplift
  if (model === 'linear') return '(L_f - L_f^2 / (2 * B))'
  const source = upliftSource(context)
  const value = upliftSharePartial(section.uplift, base, flat)
  const common = { symbol: 'S_f', value, kind: 'length', source } as const
  if (model === 'deep') {
    book.line('skirt', {
      id: 'skirtPlace',
      symbol: 'z_f',
      formula: '2 * L_f / B - 1',
      value: (2 * flat) / base - 1,
      kind: 'ratio',
      source,
    })
    const formula = 'B * (z_f * acos(z_f) - sqrt(1 - z_f^2) + pi) / (2 * pi)'
    book.line('skirt', { ...common, id: 'skirtShare', formula })
    return 'S_f'
  }
  book.line('skirt', { ...common, ...developingShare(context, flat) })
  return 'S_f'
}

function developingShare(context: LineContext, flat: number) {
  const { book, state } = context
  const { tau, isEarly } = developing(context)
  const id = 'skirtShare'
  if (tau === 0) return { id, formula: '0 * B', isSubstituted: true }
  if (!isEarly) {
    const xi = 'L_f / B'
    const terms = `2 / (n * pi)^2 * (1 - cos(n * pi * ${xi})) * exp(-(n * pi)^2 * tau)`
    return {
      id,
      formula: `B * (${xi} - (${xi})^2 / 2 - series(${terms}, n, 1, 1))`,
      isSubstituted: true,
    }
  }
  book.line('skirt', {
    id: 'skirtPlaceEarly',
    symbol: 'z_f',
    formula: 'L_f / (2 * B * sqrt(tau))',
    value: flat / state.geometry.base / (2 * Math.sqrt(tau)),
    kind: 'ratio',
    source: 'diffusion',
  })
  const rest = '(1 - 2 / sqrt(pi) * integral(exp(-v^2), v, 0, min(z_f, 8)))'
  return {
    id,
    formula: `2 * B * sqrt(tau) * (z_f * ${rest} + (1 - exp(-z_f^2)) / sqrt(pi))`,
    isSubstituted: true,
  }
}
