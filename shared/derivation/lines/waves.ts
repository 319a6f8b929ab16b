import { waveThrust, type WaveThrust } from '../../calc/moving-water/wave-thrust'
import { waveNumber } from '../../calc/moving-water/wave-number'
import type { LineContext } from './context'

/** Waves on a vertical wall. Written after the loaded shape, whose crest they reach. */
export function writeWaves(context: LineContext): void {
  const { book, section, state, names } = context
  const { water, gravity } = section
  const period = water.wavePeriod ?? 1
  const crest = state.shape.solved ? state.shape.crest : section.barrier.diameter
  const attack = { height: water.waveHeight, period, depth: water.depth, crest, gravity }
  const waves = waveThrust({ ...attack, unitWeight: state.geometry.unitWeight })
  book.given('T_w', period, 'seconds')
  book.line('thrust', {
    id: 'waveHeight',
    symbol: 'H_d',
    formula: 'min(1.8 * H_s, 0.78 * h)',
    value: waves.designHeight,
    kind: 'length',
    source: 'goda',
  })
  book.line('thrust', {
    id: 'waveNumber',
    symbol: 'k',
    left: '(2 * pi / T_w)^2',
    formula: 'g * k * tanh(k * h)',
    value: waveNumber(period, water.depth, gravity),
    kind: 'perLength',
    source: 'linearWaves',
  })
  writePressures(context, waves)
  writeWaveLoad(context, waves)
  names.variableForces.push('F_w')
  names.variableMoments.push('M_w')
}

function writePressures({ book, state }: LineContext, waves: WaveThrust): void {
  const common = { kind: 'pressure', source: 'goda' } as const
  book.line('thrust', {
    id: 'waveAlpha',
    symbol: 'alpha_1',
    formula: '0.6 + 1 / 2 * (2 * k * h / sinh(2 * k * h))^2',
    value: waves.alpha1,
    kind: 'ratio',
    source: 'goda',
  })
  book.line('thrust', {
    ...common,
    id: 'surfacePressure',
    symbol: 'p_1',
    formula: 'alpha_1 * gamma * H_d',
    value: waves.surfacePressure,
  })
  book.line('thrust', {
    ...common,
    id: 'groundPressure',
    symbol: 'p_3',
    formula: 'p_1 / cosh(k * h)',
    value: waves.groundPressure,
  })
  book.line('thrust', {
    id: 'runUp',
    symbol: 'eta_star',
    formula: '1.5 * H_d',
    value: waves.runUp,
    kind: 'length',
    source: 'goda',
  })
  if (waves.wettedAbove === 0) return
  book.line('thrust', {
    id: 'wettedAbove',
    symbol: 'h_c',
    formula: state.shape.solved ? 'min(eta_star, H - h)' : 'min(eta_star, D - h)',
    value: waves.wettedAbove,
    kind: 'length',
    source: 'goda',
  })
  book.line('thrust', {
    ...common,
    id: 'crestPressure',
    symbol: 'p_4',
    formula: 'p_1 * (1 - h_c / eta_star)',
    value: waves.crestPressure,
  })
}

function writeWaveLoad({ book, state, result }: LineContext, { wettedAbove }: WaveThrust): void {
  const isAbove = wettedAbove > 0
  book.line('thrust', {
    id: 'waveThrust',
    symbol: 'F_w',
    formula: isAbove ? '(p_1 + p_3) * h / 2 + (p_1 + p_4) * h_c / 2' : '(p_1 + p_3) * h / 2',
    value: result.thrust.wave,
    kind: 'forcePerLength',
    source: 'goda',
    hasNote: true,
  })
  book.line('thrust', {
    id: 'waveMoment',
    symbol: 'M_w',
    formula: isAbove
      ? '(2 * p_1 + p_3) * h^2 / 6 + (p_1 + p_4) * h * h_c / 2 + (p_1 + 2 * p_4) * h_c^2 / 6'
      : '(2 * p_1 + p_3) * h^2 / 6',
    value: state.horizontal.wave.moment,
    kind: 'momentPerLength',
    source: 'goda',
  })
}
