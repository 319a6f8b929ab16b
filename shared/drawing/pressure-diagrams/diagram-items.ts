import type { SectionCase } from '../../schemas/section-case'
import type { SectionResult } from '../../schemas/section-result'
import type { Message } from '../../texts/format-text'
import type { Quantity, QuantityKind } from '../../units'
import type { Arrow, Point, SceneItem, ShapeRole, TextItem, View } from '../scene'

/** What the pressure diagrams show. */
export interface PressureDiagramInput {
  readonly section: SectionCase
  readonly result: Pick<SectionResult, 'thrust' | 'vertical' | 'loadedShape'>
  readonly view: View
}

/** One point of a pressure diagram: where, and how much [m, Pa]. */
export interface Loaded {
  readonly at: number
  readonly pressure: number
}

/** Room over the diagrams, and under them for their names [px]. */
export const TOP = 30
export const BELOW = 26

const TEXT_SIZE = 11
const PRESSURE_ARROW = { shaft: 1.2, head: 6, spread: 5 } as const
const FORCE_ARROW = { shaft: 3.4, head: 11, spread: 11 } as const

/** A text at a place, quiet unless said otherwise. */
export function label(id: string, message: Message, place: Partial<TextItem> & Point): TextItem {
  return {
    kind: 'text',
    id,
    role: 'labelQuiet',
    anchor: 'start',
    size: TEXT_SIZE,
    weight: 400,
    message,
    hasHalo: true,
    ...place,
  }
}

export function path(id: string, role: ShapeRole, d: string): SceneItem {
  return { kind: 'path', id, role, d }
}

/** Arrows of a diagram: thin for pressures, thick for their resultant. */
export function arrows(
  id: string,
  role: 'pressure' | 'uplift' | 'force',
  drawn: readonly Arrow[],
): readonly SceneItem[] {
  const style = role === 'force' ? FORCE_ARROW : PRESSURE_ARROW
  return drawn.length === 0 ? [] : [{ kind: 'arrows', id, role, arrows: drawn, style }]
}

/** A text of the diagrams with one quantity in it. */
export function quantityText(
  key: string,
  name: string,
  value: number,
  kind: QuantityKind,
): Message {
  const quantity: Quantity = { value, kind }
  return { key: `sheet.diagram.${key}`, values: { [name]: quantity } }
}

/** Middles of so many equal parts. */
export function middles(from: number, to: number, count: number): readonly number[] {
  return Array.from({ length: count }, (_, i) => from + ((i + 0.5) / count) * (to - from))
}
