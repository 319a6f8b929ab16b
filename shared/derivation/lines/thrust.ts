import { dynamicDepth } from '../../calc/moving-water/current-thrust'
import { sum, type LineContext } from './context'
import { writeWaves } from './waves'

/** Everything that pushes to the dry side, and the dry water that pushes back. */
export function writeThrust(context: LineContext): void {
  const { book, state, result } = context
  const { still } = state.horizontal
  book.line('thrust', {
    id: 'stillThrust',
    symbol: 'F_h',
    formula: 'gamma * h^2 / 2',
    value: result.thrust.still,
    kind: 'forcePerLength',
    source: 'statics',
    hasNote: true,
  })
  book.line('thrust', {
    id: 'stillMoment',
    symbol: 'M_h',
    formula: 'F_h * h / 3',
    value: still.moment,
    kind: 'momentPerLength',
    source: 'statics',
  })
  if (result.thrust.current > 0) writeCurrent(context)
  if (result.thrust.wave > 0) writeWaves(context)
  if (result.thrust.debris > 0) writeDebris(context)
  if (result.thrust.dry > 0) writeDryWater(context)
  writeTotal(context)
}

function writeCurrent({ book, section, state, result, names }: LineContext): void {
  const { currentSpeed, dragCoefficient } = section.water
  book.given('C_d', dragCoefficient, 'ratio')
  book.line('thrust', {
    id: 'dynamicDepth',
    symbol: 'd_h',
    formula: 'C_d * V^2 / (2 * g)',
    value: dynamicDepth(currentSpeed, dragCoefficient, section.gravity),
    kind: 'length',
    source: 'current',
  })
  book.line('thrust', {
    id: 'currentThrust',
    symbol: 'F_c',
    formula: 'gamma * d_h * h',
    value: result.thrust.current,
    kind: 'forcePerLength',
    source: 'current',
  })
  book.line('thrust', {
    id: 'currentMoment',
    symbol: 'M_c',
    formula: 'F_c * h / 2',
    value: state.horizontal.current.moment,
    kind: 'momentPerLength',
    source: 'current',
  })
  names.variableForces.push('F_c')
  names.variableMoments.push('M_c')
}

function writeDebris({ book, section, state, result, names }: LineContext): void {
  book.given('P_d', section.debris.force, 'force')
  book.given('ell_s', section.barrier.sectionLength, 'length')
  book.line('thrust', {
    id: 'debrisThrust',
    symbol: 'F_d',
    formula: 'P_d / ell_s',
    value: result.thrust.debris,
    kind: 'forcePerLength',
    source: 'debris',
    hasNote: true,
  })
  book.line('thrust', {
    id: 'debrisMoment',
    symbol: 'M_d',
    formula: 'F_d * h',
    value: state.horizontal.debris.moment,
    kind: 'momentPerLength',
    source: 'debris',
  })
  names.variableForces.push('F_d')
  names.variableMoments.push('M_d')
}

function writeDryWater({ book, state, result }: LineContext): void {
  book.line('thrust', {
    id: 'dryThrust',
    symbol: 'F_dry',
    formula: 'gamma * h_d^2 / 2',
    value: result.thrust.dry,
    kind: 'forcePerLength',
    source: 'statics',
  })
  book.line('thrust', {
    id: 'dryMoment',
    symbol: 'M_dry',
    formula: 'F_dry * h_d / 3',
    value: state.horizontal.dry.moment,
    kind: 'momentPerLength',
    source: 'statics',
  })
}

function writeTotal({ book, state, result, names }: LineContext): void {
  const hasDry = result.thrust.dry > 0
  const { variableForces, variableMoments } = names
  if (hasDry || variableForces.length > 0) {
    names.force = 'F'
    names.moment = 'M'
    book.line('thrust', {
      id: 'totalThrust',
      symbol: 'F',
      formula: sum(['F_h', ...variableForces], [hasDry ? 'F_dry' : null]),
      value: result.thrust.total,
      kind: 'forcePerLength',
      source: 'equilibrium',
    })
    book.line('thrust', {
      id: 'totalMoment',
      symbol: 'M',
      formula: sum(['M_h', ...variableMoments], [hasDry ? 'M_dry' : null]),
      value: state.horizontal.total.moment,
      kind: 'momentPerLength',
      source: 'equilibrium',
    })
  }
  if (result.thrust.arm === null) return
  book.line('thrust', {
    id: 'arm',
    symbol: 'z_F',
    formula: `${names.moment} / ${names.force}`,
    value: result.thrust.arm,
    kind: 'length',
    source: 'equilibrium',
  })
}
