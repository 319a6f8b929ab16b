import type { LineContext } from './context'

/** The ground under the section, as level. */
export interface GroundPlace {
  readonly groundLevel: number | null
}

/** Inputs of barrier and water, the unit weight, and how the water lies on the skirt. */
export function writeGeometry(context: LineContext, { groundLevel }: GroundPlace): void {
  const { book, section, state, names } = context
  const { barrier, water } = section
  book.given('rho', water.density, 'density')
  book.given('g', section.gravity, 'acceleration')
  book.given('D', barrier.diameter, 'length')
  book.given('L', barrier.skirtLength, 'length')
  book.given('b', barrier.contactWidth, 'length')
  book.given('m', barrier.mass, 'massPerLength')
  book.given('V', water.currentSpeed, 'speed')
  book.given('H_s', water.waveHeight, 'length')
  book.given('mu', section.ground.friction, 'ratio')
  book.line('geometry', {
    id: 'unitWeight',
    symbol: 'gamma',
    formula: 'rho * g',
    value: state.geometry.unitWeight,
    kind: 'unitWeight',
    source: 'statics',
  })
  writeDepth(context, groundLevel)
  if (water.dryDepth > 0) {
    book.given('h_d', water.dryDepth, 'length')
    names.dryDepth = 'h_d'
  }
  if (section.ground.fall !== 0) writeFall(context)
  book.line('geometry', {
    id: 'base',
    symbol: 'B',
    formula: 'L + b',
    value: state.geometry.base,
    kind: 'length',
    source: 'equilibrium',
  })
}

function writeDepth({ book, section }: LineContext, groundLevel: number | null): void {
  const { depth } = section.water
  if (groundLevel === null) {
    book.given('h', depth, 'length')
    return
  }
  book.given('Z_g', groundLevel, 'length')
  book.given('Z_w', groundLevel + depth, 'length')
  book.line('geometry', {
    id: 'depth',
    symbol: 'h',
    formula: 'Z_w - Z_g',
    value: depth,
    kind: 'length',
    source: 'equilibrium',
  })
}

function writeFall({ book, section, state, names }: LineContext): void {
  const { edgeDepth, wettedSkirt, sinFall } = state.geometry
  names.isSloped = true
  book.given('t_f', section.ground.fall, 'ratio')
  book.line('geometry', {
    id: 'fall',
    symbol: 'beta',
    formula: 'atan(t_f)',
    value: Math.asin(sinFall),
    kind: 'angle',
    source: 'equilibrium',
    hasNote: true,
  })
  if (edgeDepth > 0) {
    names.edgeDepth = 'h_e'
    book.line('geometry', {
      id: 'edgeDepth',
      symbol: 'h_e',
      formula: 'h - L * sin(beta)',
      value: edgeDepth,
      kind: 'length',
      source: 'statics',
    })
    return
  }
  names.edgeDepth = null
  names.skirt = 'L_w'
  book.line('geometry', {
    id: 'wettedSkirt',
    symbol: 'L_w',
    formula: 'h / sin(beta)',
    value: wettedSkirt,
    kind: 'length',
    source: 'statics',
    hasNote: true,
  })
}
