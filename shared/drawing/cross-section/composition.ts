import type { Message, TextValues } from '../../texts/format-text'
import { LabelPlacer, type Label } from '../label-placer'
import type { ArrowStyle, Arrow, SceneItem, ShapeRole, TextRole } from '../scene'
import { measureWith } from '../text-width'
import { textResolver } from '../../texts/format-text'
import { drawingTexts } from '../../texts/drawing.en'
import { bodyShape, type BodyShape } from './body-shape'
import { sectionFrame, type SectionFrame } from './section-frame'
import type { CrossSectionInput } from './section-input'

/** A drawing while it is put together: shapes in painting order, texts by importance. */
export interface Composition {
  readonly input: CrossSectionInput
  readonly frame: SectionFrame
  readonly body: BodyShape
  readonly shapes: SceneItem[]
  readonly placer: LabelPlacer
}

const measureMetric = measureWith(textResolver({ drawing: drawingTexts }, 'metric'))

/** Starts a drawing of the section. */
export function startComposition(input: CrossSectionInput): Composition {
  const frame = sectionFrame(input)
  return {
    input,
    frame,
    body: bodyShape(input, frame),
    shapes: [],
    placer: new LabelPlacer(input.view, input.measure ?? measureMetric),
  }
}

/** A line or an area. */
export function addPath(drawing: Composition, id: string, role: ShapeRole, d: string): void {
  if (d !== '') drawing.shapes.push({ kind: 'path', id, role, d })
}

export const PRESSURE_ARROW: ArrowStyle = { shaft: 1.3, head: 7, spread: 6 }
export const FORCE_ARROW: ArrowStyle = { shaft: 4, head: 13, spread: 13 }

/** Arrows of one diagram. */
export function addArrows(
  drawing: Composition,
  id: string,
  role: ShapeRole,
  arrows: readonly Arrow[],
): void {
  const style = role === 'pressure' || role === 'uplift' ? PRESSURE_ARROW : FORCE_ARROW
  if (arrows.length > 0) drawing.shapes.push({ kind: 'arrows', id, role, arrows, style })
}

/** A message of the drawing's own texts. */
export function drawingText(name: string, values?: TextValues): Message {
  return values ? { key: `drawing.${name}`, values } : { key: `drawing.${name}` }
}

/** A label in the size of values; `role` says what it speaks about. */
export function valueLabel(
  drawing: Composition,
  id: string,
  role: TextRole,
  message: Message,
): Label {
  return { id, role, message, size: drawing.frame.layout.font, weight: 600 }
}

/** A label in the size of explanations. */
export function quietLabel(
  drawing: Composition,
  id: string,
  message: Message,
  role: TextRole = 'labelQuiet',
): Label {
  return { id, role, message, size: drawing.frame.layout.small }
}
