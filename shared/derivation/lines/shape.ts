import { FILM } from '../../constants'
import { shapeAngles } from '../../calc/loaded-shape/shape-angles'
import type { StandingShape } from '../../calc/loaded-shape/loaded-shape'
import type { LineContext } from './context'

/** The tube as it stands: each root put back into its governing equation. */
export function writeShape(context: LineContext): void {
  const { book, section, state } = context
  const { shape } = state
  book.given('p', section.barrier.airPressure, 'pressure')
  if (!shape.solved) return
  if (section.water.depth < FILM) writeUnloaded(context, shape)
  else writeLoaded(context, shape)
}

function writeUnloaded({ book }: LineContext, shape: StandingShape): void {
  book.line('shape', {
    id: 'skinTension',
    symbol: 'T',
    formula: 'p * D / 2',
    value: shape.skinTension,
    kind: 'forcePerLength',
    source: 'membrane',
  })
  book.line('shape', {
    id: 'crest',
    symbol: 'H',
    formula: '2 * T / p',
    value: shape.crest,
    kind: 'length',
    source: 'membrane',
  })
}

/** cos of the slope of the wet skin at the height y. */
const WET_COSINE = '(2 * p * y + gamma * (h - y)^2) / (2 * T) - 1'

function writeLoaded(context: LineContext, shape: StandingShape): void {
  const { book } = context
  const force = { kind: 'forcePerLength', source: 'membrane' } as const
  const length = { kind: 'length', source: 'membrane' } as const
  book.line('shape', {
    ...force,
    id: 'skirtTension',
    symbol: 'T_s',
    formula: 'gamma * h^2 / 2',
    value: shape.skirtTension,
  })
  // The three unknowns hang together: each stands in the equations of the others.
  book.unknown('T', shape.skinTension, 'forcePerLength')
  book.unknown('y_A', shape.weldHeight, 'length')
  writeAngles(context, shape)
  writeRoots(context, shape)
  book.line('shape', {
    ...length,
    id: 'crest',
    symbol: 'H',
    formula: '2 * T / p',
    value: shape.crest,
  })
  book.line('shape', {
    ...length,
    id: 'freeSkirt',
    symbol: 'ell_f',
    isSubstituted: true,
    formula: 'integral(1 / sqrt(y / h * (2 - y / h) * (1 + (1 - y / h)^2)), y, 0, y_A)',
    value: shape.freeSkirt,
  })
}

/** Height of the weld line, contact strip and skin tension: they are found together. */
function writeRoots({ book }: LineContext, shape: StandingShape): void {
  const force = { kind: 'forcePerLength', source: 'membrane' } as const
  const length = { kind: 'length', source: 'membrane' } as const
  book.line('shape', {
    ...length,
    id: 'weldHeight',
    symbol: 'y_A',
    left: 'T * sin(beta_A)',
    formula: 'T * sin(alpha) + T_s * sin(phi)',
    value: shape.weldHeight,
    hasNote: true,
  })
  book.line('shape', {
    ...length,
    id: 'contact',
    symbol: 'c',
    isSubstituted: true,
    formula:
      `T / p * (sin(beta_h) - sin(alpha)) + ` +
      `integral((${WET_COSINE}) / sqrt(1 - (${WET_COSINE})^2), y, y_A, h)`,
    value: shape.contact,
  })
  book.line('shape', {
    ...force,
    id: 'skinTension',
    symbol: 'T',
    left: 'pi * D',
    formula:
      'T / p * (pi + alpha + beta_h) + c + ' +
      `integral(1 / sqrt(1 - (${WET_COSINE})^2), y, y_A, h)`,
    value: shape.skinTension,
    hasNote: true,
  })
}

function writeAngles({ book, section, state }: LineContext, shape: StandingShape): void {
  const { unitWeight, depth } = state.geometry
  const angles = shapeAngles(shape, section.barrier.airPressure, depth, unitWeight)
  const common = { kind: 'angle', source: 'membrane' } as const
  book.line('shape', {
    ...common,
    id: 'seatAngle',
    symbol: 'alpha',
    formula: 'acos(1 - p * y_A / T)',
    value: angles.seat,
  })
  book.line('shape', {
    ...common,
    id: 'weldAngle',
    symbol: 'beta_A',
    formula: 'acos((2 * p * y_A + gamma * (h - y_A)^2) / (2 * T) - 1)',
    value: angles.weld,
  })
  book.line('shape', {
    ...common,
    id: 'skirtAngle',
    symbol: 'phi',
    formula: 'acos((1 - y_A / h)^2)',
    value: angles.skirt,
  })
  book.line('shape', {
    ...common,
    id: 'surfaceAngle',
    symbol: 'beta_h',
    formula: 'acos(p * h / T - 1)',
    value: angles.surface,
  })
}
