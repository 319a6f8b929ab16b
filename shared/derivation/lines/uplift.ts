import { upliftMoments } from '../../calc/uplift/uplift-share'
import type { SourceId } from '../sources'
import type { LineContext } from './context'
import { sum } from './context'

/** Below this the half-space solution stands for the series; see `developingMean`. */
const EARLY_TAU = 0.01

/** Source of the chosen uplift model. */
export function upliftSource({ section }: Pick<LineContext, 'section'>): SourceId {
  const { model } = section.uplift
  return model === 'deep' ? 'harr' : model === 'developing' ? 'diffusion' : 'creep'
}

/** τ of the developing model, and whether the early form holds. */
export function developing({ section, state }: LineContext): { tau: number; isEarly: boolean } {
  const { diffusivity, time } = section.uplift
  const tau = ((diffusivity ?? 0) * (time ?? 0)) / state.geometry.base ** 2
  return { tau, isEarly: tau < EARLY_TAU }
}

/** Water under skirt and tube, and what is left on the ground. */
export function writeUplift(context: LineContext): void {
  const { book, section, state, result, names } = context
  const { model, edgeFactor } = section.uplift
  const { base, edgeDepth } = state.geometry
  const excess = edgeFactor * edgeDepth - section.water.dryDepth
  const isThere = model !== 'none' && base > 0 && (excess !== 0 || names.dryDepth !== null)
  book.given('eta', edgeFactor, 'ratio')
  if (isThere) writePressure(context, excess)
  if (model === 'developing' && base > 0) writeTau(context)
  if (isThere) writeResultant(context)
  book.line('uplift', {
    id: 'net',
    symbol: 'N',
    formula: sum(['W'], [names.uplift]),
    value: result.vertical.net,
    kind: 'forcePerLength',
    source: 'equilibrium',
  })
}

function writePressure({ book, names }: LineContext, excess: number): void {
  const { edgeDepth, dryDepth } = names
  const formula = edgeDepth === null ? '-h_d' : sum([`eta * ${edgeDepth}`], [dryDepth])
  book.line('uplift', {
    id: 'excess',
    symbol: 'e_u',
    formula,
    value: excess,
    kind: 'length',
    source: 'statics',
    hasNote: true,
  })
}

function writeTau(context: LineContext): void {
  const { book, section, state } = context
  const { tau, isEarly } = developing(context)
  const shares = upliftMoments(section.uplift, state.geometry.base)
  book.given('c_v', section.uplift.diffusivity ?? 0, 'flowPerLength')
  book.given('t_u', section.uplift.time ?? 0, 'seconds')
  book.line('uplift', {
    id: 'tau',
    symbol: 'tau',
    formula: 'c_v * t_u / B^2',
    value: tau,
    kind: 'ratio',
    source: 'diffusion',
  })
  const common = { kind: 'ratio', source: 'diffusion', isSubstituted: !isEarly } as const
  book.line('uplift', {
    ...common,
    id: 'upliftMean',
    symbol: 'r_u',
    formula: isEarly
      ? '2 * sqrt(tau / pi)'
      : '1 / 2 - series(4 / (n * pi)^2 * exp(-(n * pi)^2 * tau), n, 1, 2)',
    value: shares.mean,
  })
  book.line('uplift', {
    ...common,
    id: 'upliftArm',
    symbol: 'm_u',
    formula: isEarly
      ? '2 * sqrt(tau / pi) - tau'
      : '1 / 3 - series(2 / (n * pi)^2 * exp(-(n * pi)^2 * tau), n, 1, 1)',
    value: shares.moment,
  })
}

const SHARES = {
  none: { mean: '', moment: '' },
  linear: { mean: 'e_u / 2', moment: 'e_u / 3' },
  deep: { mean: 'e_u / 2', moment: '5 * e_u / 16' },
  developing: { mean: 'e_u * r_u', moment: 'e_u * m_u' },
} as const

function writeResultant(context: LineContext): void {
  const { book, section, state, result, names } = context
  const { mean, moment } = SHARES[section.uplift.model]
  const hasDry = names.dryDepth !== null
  const source = upliftSource(context)
  names.uplift = 'U'
  names.upliftMoment = 'M_U'
  book.line('uplift', {
    id: 'uplift',
    symbol: 'U',
    formula: hasDry ? `gamma * B * (h_d + ${mean})` : `gamma * B * ${mean}`,
    value: result.vertical.uplift,
    kind: 'forcePerLength',
    source,
    hasNote: true,
  })
  book.line('uplift', {
    id: 'upliftMoment',
    symbol: 'M_U',
    formula: hasDry ? `gamma * B^2 * (h_d / 2 + ${moment})` : `gamma * B^2 * ${moment}`,
    value: state.vertical.uplift.moment,
    kind: 'momentPerLength',
    source,
  })
}
