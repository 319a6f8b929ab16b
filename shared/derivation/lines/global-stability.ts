import { globalPairs } from '../../checks/global-checks'
import { writeCheck } from './check-lines'
import { sum, type LineContext } from './context'
import { resistanceText } from './friction'

/** Sliding, overturning and flotation with global factors. */
export function writeGlobalStability(context: LineContext): void {
  const { state, names } = context
  if (!state.isReversed) writeSliding(context)
  writeRestoring(context)
  if (!state.isReversed) {
    const { moment } = names
    const common = { check: 'overturning', group: 'stability', suffix: 'o' } as const
    writeCheck(context, { ...common, resistance: 'M_R', demand: moment })
  }
  if (names.uplift === null) return
  const common = { check: 'flotation', group: 'stability', suffix: 'f' } as const
  writeCheck(context, { ...common, resistance: 'W', demand: 'U' })
}

/** Moment about the dry toe that resists, M_Ww + M_Wb − M_U. */
export function writeRestoring({ book, state, names }: LineContext): void {
  const { waterMoment, selfMoment, uplift } = state.vertical
  book.line('stability', {
    id: 'restoring',
    symbol: 'M_R',
    formula: sum(['M_W', names.selfMoment], [names.upliftMoment]),
    value: waterMoment + selfMoment - uplift.moment,
    kind: 'momentPerLength',
    source: 'equilibrium',
    hasNote: true,
  })
}

function writeSliding(context: LineContext): void {
  const { book, state, names } = context
  const { demand, resistance } = globalPairs(state).sliding
  const force = { kind: 'forcePerLength', source: 'equilibrium' } as const
  if (names.isSloped) {
    const afloat = sum(['W_b'], [names.lift, names.dryLift])
    book.line('stability', {
      ...force,
      id: 'normal',
      symbol: 'N_s',
      formula: sum(
        ['P_s', `(${afloat}) * cos(beta)`],
        [`${names.force} * sin(beta)`, names.uplift],
      ),
      value: normalForce(context),
    })
    book.line('stability', {
      ...force,
      id: 'slidingDemand',
      symbol: 'E_s',
      formula: `${names.force} * cos(beta) + (${afloat}) * sin(beta)`,
      value: demand,
    })
  }
  book.line('stability', {
    ...force,
    id: 'slidingResistance',
    symbol: 'R_s',
    formula: resistanceText(context, names.isSloped ? 'N_s' : 'N', 'B'),
    value: resistance,
    hasNote: true,
  })
  const against = names.isSloped ? 'E_s' : names.force
  const common = { check: 'sliding', group: 'stability', suffix: 's' } as const
  writeCheck(context, { ...common, resistance: 'R_s', demand: against })
}

/** Normal force on the ground, from the friction that it has without soft ground. */
function normalForce({ state }: LineContext): number {
  const ground = { ...state.section.ground, undrainedStrength: null }
  const firm = { ...state, section: { ...state.section, ground } }
  return globalPairs(firm).sliding.resistance / ground.friction
}
