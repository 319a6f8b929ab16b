import { skinDemand } from '../../checks/global-checks'
import { partialPairs } from '../../checks/partial-checks'
import { writeCheck } from './check-lines'
import { sum, type LineContext } from './context'

/** Freeboard, fabric, resultant: what limits besides friction and weight. */
export function writeLimits(context: LineContext): void {
  writeResultant(context)
  writeFreeboard(context)
  if (context.section.barrier.fabricStrength !== null) writeFabric(context)
}

function writeResultant({ book, result, names }: LineContext): void {
  const { x, share } = result.resultant
  if (result.overturningGross !== null && names.upliftMoment !== null) {
    book.line('stability', {
      id: 'grossRatio',
      symbol: 'r_g',
      formula: `(${sum(['M_W', names.selfMoment])}) / (${names.moment} + M_U)`,
      value: result.overturningGross,
      kind: 'ratio',
      source: 'equilibrium',
      hasNote: true,
    })
  }
  if (x === null || share === null) return
  book.line('stability', {
    id: 'resultant',
    symbol: 'x_R',
    formula: `(M_R - ${names.moment}) / N`,
    value: x,
    kind: 'length',
    source: 'equilibrium',
    hasNote: true,
  })
  book.line('stability', {
    id: 'share',
    symbol: 's_R',
    formula: 'max(0, min(1, 3 * min(x_R, B - x_R) / B))',
    value: share,
    kind: 'ratio',
    source: 'equilibrium',
  })
}

function writeFreeboard({ book, section, result }: LineContext): void {
  const { available, required, utilisation } = result.freeboard
  const { waveHeight, currentSpeed } = section.water
  if (available === null) return
  book.line('limits', {
    id: 'freeboard',
    symbol: 'f',
    formula: sum(
      ['H'],
      [
        'h',
        waveHeight > 0 ? 'min(H_s, 0.78 * h)' : null,
        currentSpeed > 0 ? 'V^2 / (2 * g)' : null,
      ],
    ),
    value: available,
    kind: 'length',
    source: 'freeboard',
    check: 'freeboard',
  })
  if (utilisation === null || required === null) return
  book.given('f_r', required, 'length')
  book.line('limits', {
    id: 'freeboardUsed',
    symbol: 'u_b',
    formula: 'f_r / f',
    value: utilisation,
    kind: 'ratio',
    source: 'freeboard',
    check: 'freeboard',
  })
}

function writeFabric(context: LineContext): void {
  const { book, section, state, names } = context
  const isPartial = state.basis.format === 'partial'
  const tension = state.shape.solved ? 'T' : 'p * D / 2'
  const force = { kind: 'forcePerLength' } as const
  book.given('S_t', section.barrier.fabricStrength ?? 0, 'forcePerLength')
  book.line('limits', {
    ...force,
    id: 'fabricDemand',
    symbol: 'T_d',
    formula: isPartial
      ? `1.35 * max(${tension}, ${names.force})`
      : `max(${tension}, ${names.force})`,
    value: isPartial ? partialPairs(state).fabric.demand : skinDemand(state),
    source: isPartial ? 'ec7' : 'membrane',
  })
  if (isPartial) {
    book.line('limits', {
      ...force,
      id: 'fabricResistance',
      symbol: 'S_d',
      formula: 'S_t / 3',
      value: partialPairs(state).fabric.resistance,
      source: 'basis',
    })
  }
  const compared = { check: 'fabric', group: 'limits', suffix: 't' } as const
  writeCheck(context, { ...compared, resistance: isPartial ? 'S_d' : 'S_t', demand: 'T_d' })
}
