import { compare, isWorse } from '../../checks/compare'
import { partialPairs, partialSliding } from '../../checks/partial-checks'
import { writeCheck } from './check-lines'
import { sum, type LineContext } from './context'
import { FACTORED_STRENGTH, resistanceText, UNFACTORED_STRENGTH } from './friction'
import { writeRestoring } from './global-stability'

/** Factors on permanent and variable actions, and on friction. */
const COMBINATIONS = {
  1: { permanent: '1.35', variable: '1.5', strength: UNFACTORED_STRENGTH },
  2: { permanent: '', variable: '1.3', strength: FACTORED_STRENGTH },
} as const

const times = (factor: string, what: string) => (factor === '' ? what : `${factor} * (${what})`)

/** Sliding in both combinations, EQU and UPL after EN 1997-1. */
export function writePartialStability(context: LineContext): void {
  const { state } = context
  if (state.isReversed) writeEffect(context, 2)
  else {
    writeCombination(context, 1)
    writeCombination(context, 2)
    writeSlidingCheck(context)
  }
  writeRestoring(context)
  if (!state.isReversed) writeOverturning(context)
  writeFlotation(context)
}

function writeEffect(context: LineContext, which: 1 | 2): void {
  const { book, state, result, names } = context
  const { permanent, variable } = COMBINATIONS[which]
  const dry = result.thrust.dry > 0 ? 'F_dry' : null
  const fixed = sum(['F_h'], [dry])
  const moving = names.variableForces.join(' + ')
  const { still, dry: dryLoad, current, wave, debris } = state.horizontal
  const factors = which === 1 ? { g: 1.35, q: 1.5 } : { g: 1, q: 1.3 }
  book.line('stability', {
    id: `effect${which}`,
    symbol: `E_${which}`,
    formula: sum([times(permanent, fixed), moving === '' ? null : `${variable} * (${moving})`]),
    value:
      factors.g * (still.force - dryLoad.force) +
      factors.q * (current.force + wave.force + debris.force),
    kind: 'forcePerLength',
    source: 'ec7',
  })
}

function writeCombination(context: LineContext, which: 1 | 2): void {
  const { book, state, names } = context
  const { permanent, strength } = COMBINATIONS[which]
  const pair = partialSliding(state, which)
  const force = { kind: 'forcePerLength', source: 'ec7' } as const
  writeEffect(context, which)
  const effect = `E_${which}`
  const lifts = sum([names.lift, names.dryLift])
  const lifted = lifts === '' ? null : names.isSloped ? `(${lifts}) * cos(beta)` : `(${lifts})`
  const own = names.isSloped ? `W_b * cos(beta) - ${effect} * sin(beta)` : 'W_b'
  const normal = `(${times(permanent, sum(['P_s'], [lifted, names.uplift]))} + ${own})`
  book.line('stability', {
    ...force,
    id: `resistance${which}`,
    symbol: `R_${which}`,
    formula: resistanceText(context, normal, 'B', strength),
    value: pair.resistance,
  })
  if (!names.isSloped) return
  const afloat = lifts === '' ? 'W_b' : `(W_b - ${permanent === '' ? '1' : permanent} * (${lifts}))`
  book.line('stability', {
    ...force,
    id: `demand${which}`,
    symbol: `D_${which}`,
    formula: `${effect} * cos(beta) + ${afloat} * sin(beta)`,
    value: pair.demand,
  })
}

function writeSlidingCheck(context: LineContext): void {
  const { state, names } = context
  const used = ([1, 2] as const).map((which) => compare(partialSliding(state, which), 1))
  const which = isWorse(used[1]!.utilisation, used[0]!.utilisation) ? 2 : 1
  writeCheck(context, {
    check: 'sliding',
    group: 'stability',
    resistance: `R_${which}`,
    demand: names.isSloped ? `D_${which}` : `E_${which}`,
    suffix: 's',
    source: 'ec7',
  })
}

function writeOverturning(context: LineContext): void {
  const { book, state, result, names } = context
  const { demand, resistance } = partialPairs(state).overturning
  const fixed = sum(['M_h'], [result.thrust.dry > 0 ? 'M_dry' : null])
  const moving = names.variableMoments.join(' + ')
  const common = { kind: 'momentPerLength', source: 'ec7' } as const
  book.line('stability', {
    ...common,
    id: 'overturningDemand',
    symbol: 'E_o',
    formula: sum([`1.1 * (${fixed})`, moving === '' ? null : `1.5 * (${moving})`]),
    value: demand,
  })
  book.line('stability', {
    ...common,
    id: 'overturningResistance',
    symbol: 'R_o',
    formula: '0.9 * M_R',
    value: resistance,
  })
  const compared = { check: 'overturning', group: 'stability', suffix: 'o' } as const
  writeCheck(context, { ...compared, resistance: 'R_o', demand: 'E_o', source: 'ec7' })
}

function writeFlotation(context: LineContext): void {
  const { book, state, names } = context
  const { demand, resistance } = partialPairs(state).flotation
  const up = sum([names.uplift, names.lift, names.dryLift])
  if (up === '') return
  const common = { kind: 'forcePerLength', source: 'ec7' } as const
  book.line('stability', {
    ...common,
    id: 'flotationDemand',
    symbol: 'E_f',
    formula: up,
    value: demand,
  })
  book.line('stability', {
    ...common,
    id: 'flotationResistance',
    symbol: 'R_f',
    formula: '0.9 * (P_s + W_b)',
    value: resistance,
  })
  const compared = { check: 'flotation', group: 'stability', suffix: 'f' } as const
  writeCheck(context, { ...compared, resistance: 'R_f', demand: 'E_f', source: 'ec7' })
}
