import { reversed, segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { crossing } from './body-shape'
import { addPath, drawingText, quietLabel, valueLabel, type Composition } from './composition'
import { addDimension } from './dimension-line'
import { levelY } from './section-frame'

/** Crest and freeboard, left to right. */
interface CrestLines {
  readonly freeboardX: number
  readonly crestX: number
}

function crestLines({ body, frame }: Composition): CrestLines | null {
  const { name } = frame.layout
  if (name === 'narrow') return null
  const freeboardX = body.right + 24
  return { freeboardX, crestX: name === 'wide' ? freeboardX + 70 : freeboardX }
}

/** Height in the scene from which the freeboard counts: water, waves and velocity head; null: none. */
function freeboardFoot({ input, body, frame }: Composition): number | null {
  const { available } = input.evaluation.freeboard
  return available === null || available <= 0 ? null : body.top.y + frame.scale * available
}

/** Crest and freeboard as dimensions beside the tube. */
export function drawCrest(drawing: Composition): void {
  const lines = crestLines(drawing)
  if (!lines) return
  const { body, frame } = drawing
  const foot = freeboardFoot(drawing)
  const ground = body.top.y + frame.scale * crestHeight(drawing)
  const witness: [Point, Point][] = [
    [
      { x: body.top.x + 10, y: body.top.y },
      { x: lines.crestX + 6, y: body.top.y },
    ],
  ]
  if (frame.fall !== 0) {
    witness.push([
      { x: body.right, y: ground },
      { x: lines.crestX + 6, y: ground },
    ])
  }
  addPath(drawing, 'crest-witness', 'witness', segmentsPath(witness))
  addDimension(drawing, 'crest', { x: lines.crestX, y: ground }, { x: lines.crestX, y: body.top.y })
  if (foot === null) return
  const carried: [Point, Point] = [
    { x: dryFaceX(drawing, foot) + 4, y: foot },
    { x: lines.freeboardX + 6, y: foot },
  ]
  addPath(drawing, 'freeboard-witness', 'levelLine', segmentsPath([carried]))
  addDimension(
    drawing,
    'freeboard',
    { x: lines.freeboardX, y: foot },
    { x: lines.freeboardX, y: body.top.y },
  )
}

function dryFaceX({ body }: Composition, y: number): number {
  return crossing(reversed(body.dryFace), y)?.x ?? body.right
}

function crestHeight({ input }: Composition): number {
  const shape = input.evaluation.loadedShape
  return shape.solved ? shape.crest : 0
}

/** Values of crest and freeboard. */
export function labelCrest(drawing: Composition): void {
  const { body, frame, placer } = drawing
  const lines = crestLines(drawing)
  const crest = { crest: { value: crestHeight(drawing), kind: 'length' } } as const
  if (!lines || frame.layout.name === 'medium') {
    placer.place(valueLabel(drawing, 'crest-value', 'labelBarrier', drawingText('crest', crest)), [
      { x: body.top.x, y: body.top.y - 9, anchor: 'middle' },
      { x: frame.width - 8, y: body.top.y - 9, anchor: 'end' },
    ])
  } else {
    const middle = levelY(frame, crestHeight(drawing) * 0.36)
    const at = { x: lines.crestX + 10, anchor: 'start' as const }
    placer.placeSurely(
      valueLabel(
        drawing,
        'crest-value',
        'labelBarrier',
        drawingText('length', { length: crest.crest }),
      ),
      [{ ...at, y: middle }],
    )
    placer.place(quietLabel(drawing, 'crest-name', drawingText('crestName')), [
      { ...at, y: middle + frame.layout.small + 3 },
    ])
  }
  if (lines) labelFreeboard(drawing, lines)
}

function labelFreeboard(drawing: Composition, { freeboardX }: CrestLines): void {
  const { body, placer, input, frame } = drawing
  const foot = freeboardFoot(drawing)
  const { available } = input.evaluation.freeboard
  if (foot === null || available === null) return
  const middle = (foot + body.top.y) / 2
  const at = { x: freeboardX + 9, anchor: 'start' as const }
  const height = { value: available, kind: 'smallLength', rounding: 'down' } as const
  const value = valueLabel(
    drawing,
    'freeboard-value',
    'label',
    drawingText('freeboard', { height }),
  )
  const beneath = Math.max(middle, body.top.y + frame.layout.font + 3)
  placer.place(value, [
    { ...at, y: beneath },
    { ...at, y: foot + frame.layout.font + 4 },
    { ...at, y: body.top.y - 9 },
  ])
  const name = quietLabel(drawing, 'freeboard-name', drawingText('freeboardName'))
  placer.place(name, [
    { ...at, y: beneath + frame.layout.small + 3 },
    { ...at, y: foot + 2 * frame.layout.font + 6 },
  ])
}
