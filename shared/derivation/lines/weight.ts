import { overhangBounds, tubeOverhang } from '../../calc/hydrostatics/tube-overhang'
import { sum, type LineContext } from './context'

/** Water on the skirt, the tube's own lift, own weight, and their moments about the dry toe. */
export function writeWeight(context: LineContext): void {
  const { book, section, result, state } = context
  const { barrier, water } = section
  book.line('weight', {
    id: 'radius',
    symbol: 'R',
    formula: 'D / 2',
    value: barrier.diameter / 2,
    kind: 'length',
    source: 'equilibrium',
  })
  if (writeOverhang(context, water.depth, WET)) context.names.lift = 'V_l'
  writeSkirtWater(context)
  book.line('weight', {
    id: 'selfWeight',
    symbol: 'W_b',
    formula: 'm * g',
    value: result.vertical.self,
    kind: 'forcePerLength',
    source: 'equilibrium',
  })
  if (water.dryDepth > 0 && writeOverhang(context, water.dryDepth, DRY)) {
    context.names.dryLift = 'V_d'
  }
  book.line('weight', {
    id: 'weight',
    symbol: 'W',
    formula: sum(['W_w', 'W_b'], [context.names.dryLift]),
    value: state.vertical.waterOnSkirt + state.vertical.self - state.vertical.dryLift,
    kind: 'forcePerLength',
    source: 'equilibrium',
  })
  writeMoments(context)
}

interface Side {
  readonly depth: string
  readonly lower: string
  readonly upper: string
  readonly arc: string
  readonly area: string
  readonly lift: string
  readonly suffix: '' | 'Dry'
}

const WET: Side = {
  depth: 'h',
  lower: 's_1',
  upper: 's_2',
  arc: 'Q_s',
  area: 'A_o',
  lift: 'V_l',
  suffix: '',
}
const DRY: Side = {
  depth: 'h_d',
  lower: 's_1',
  upper: 's_3',
  arc: 'Q_d',
  area: 'A_d',
  lift: 'V_d',
  suffix: 'Dry',
}

/** The circle over the weld line in closed form; false where the water does not reach it. */
function writeOverhang({ book, section, state }: LineContext, depth: number, side: Side): boolean {
  const { diameter, contactWidth } = section.barrier
  const bounds = overhangBounds(diameter, contactWidth, depth)
  if (bounds === null) return false
  const { lower: l, upper: u, arc, area } = side
  const common = { source: 'statics' } as const
  book.line('weight', {
    ...common,
    id: `overhangLower${side.suffix}`,
    symbol: l,
    formula: contactWidth === 0 ? '-R' : '-sqrt(R^2 - b^2 / 4)',
    value: bounds.lower,
    kind: 'length',
  })
  book.line('weight', {
    ...common,
    id: `overhangUpper${side.suffix}`,
    symbol: u,
    formula: bounds.upper === -bounds.lower ? `-${l}` : `${side.depth} - R`,
    value: bounds.upper,
    kind: 'length',
  })
  book.line('weight', {
    ...common,
    id: `underArc${side.suffix}`,
    symbol: arc,
    formula: underArcText(l, u),
    value: bounds.underArc,
    kind: 'area',
  })
  book.line('weight', {
    ...common,
    id: `overhang${side.suffix}`,
    symbol: area,
    formula: contactWidth === 0 ? arc : `${arc} - b * (${u} - ${l}) / 2`,
    value: tubeOverhang(diameter, contactWidth, depth).area,
    kind: 'area',
  })
  book.line('weight', {
    ...common,
    id: `lift${side.suffix}`,
    symbol: side.lift,
    formula: `gamma * ${area}`,
    value: side.suffix === '' ? state.vertical.lift : state.vertical.dryLift,
    kind: 'forcePerLength',
    ...(side.suffix === '' ? { hasNote: true } : {}),
  })
  return true
}

/** ∫ √(R² − s²) ds from one height to the other. */
function underArcText(lower: string, upper: string): string {
  const strip = (s: string) => `${s} * sqrt(R^2 - ${s}^2)`
  const turned = `R^2 * (asin(${upper} / R) - asin(${lower} / R))`
  return `(${turned} + ${strip(upper)} - ${strip(lower)}) / 2`
}

function writeSkirtWater({ book, state, result, names }: LineContext): void {
  const { skirt, isSloped, lift } = names
  book.line('weight', {
    id: 'skirtWater',
    symbol: 'P_s',
    formula: isSloped
      ? `gamma * (${skirt} * h - ${skirt}^2 * sin(beta) / 2)`
      : `gamma * ${skirt} * h`,
    value: state.vertical.skirtWater,
    kind: 'forcePerLength',
    source: 'statics',
  })
  book.line('weight', {
    id: 'waterOnSkirt',
    symbol: 'W_w',
    formula: sum(['P_s'], [lift]),
    value: result.vertical.waterOnSkirt,
    kind: 'forcePerLength',
    source: 'statics',
  })
}

function writeMoments({ book, section, state, names }: LineContext): void {
  const { barrier, water } = section
  const { skirt: l, isSloped, lift } = names
  if (lift !== null) {
    const { moment } = tubeOverhang(barrier.diameter, barrier.contactWidth, water.depth)
    book.line('weight', {
      id: 'overhangMoment',
      symbol: 'M_o',
      formula:
        barrier.contactWidth === 0
          ? '(R^2 * (s_2 - s_1) - (s_2^3 - s_1^3) / 3) / 2'
          : 'b * A_o + ((R^2 + b^2 / 4) * (s_2 - s_1) - (s_2^3 - s_1^3) / 3 - b * Q_s) / 2',
      value: moment,
      kind: 'volume',
      source: 'statics',
    })
  }
  const onSlope = isSloped ? ` - sin(beta) * (b * ${l}^2 / 2 + ${l}^3 / 3)` : ''
  const moments = `h * (b * ${l} + ${l}^2 / 2)${onSlope}`
  book.line('weight', {
    id: 'waterMoment',
    symbol: 'M_W',
    formula: lift === null ? `gamma * (${moments})` : `gamma * (${moments} - M_o)`,
    value: state.vertical.waterMoment,
    kind: 'momentPerLength',
    source: 'statics',
  })
  if (barrier.contactWidth === 0) return
  names.selfMoment = 'M_b'
  book.line('weight', {
    id: 'selfMoment',
    symbol: 'M_b',
    formula: 'W_b * b / 2',
    value: state.vertical.selfMoment,
    kind: 'momentPerLength',
    source: 'equilibrium',
  })
}
