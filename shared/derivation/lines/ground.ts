import type { LineContext } from './context'

/** The engine changes over to the limit of the means here. */
const LARGE = 20

/** Seepage through the ground, and what one section weighs with its water. */
export function writeGround(context: LineContext): void {
  const { book, section, result, state } = context
  const { permeability, layerThickness } = section.ground
  const perMetre = result.seepage?.perMetre ?? null
  if (perMetre !== null && perMetre > 0 && permeability !== null && layerThickness !== null) {
    const x = (Math.PI * state.geometry.base) / (4 * layerThickness)
    book.given('T_l', layerThickness, 'length')
    book.given('k_g', permeability, 'speed')
    book.line('ground', {
      id: 'seepageWidth',
      symbol: 'x_s',
      formula: 'pi * B / (4 * T_l)',
      value: x,
      kind: 'ratio',
      source: 'harr',
    })
    const head = context.names.dryDepth === null ? 'h' : '(h - h_d)'
    book.line('ground', {
      id: 'seepage',
      symbol: 'q_s',
      formula:
        x > LARGE
          ? `k_g * ${head} * pi / (4 * (x_s + 0.6931471805599453))`
          : `k_g * ${head} * agm(1, 1 / cosh(x_s)) / (2 * agm(1, tanh(x_s)))`,
      value: perMetre,
      kind: 'flowPerLength',
      source: 'harr',
      hasNote: true,
    })
  }
  book.given('ell_s', section.barrier.sectionLength, 'length')
  book.line('ground', {
    id: 'anchoringMass',
    symbol: 'm_w',
    formula: 'ell_s * W_w / g',
    value: result.anchoringMassPerSection,
    kind: 'mass',
    source: 'equilibrium',
    hasNote: true,
  })
}
