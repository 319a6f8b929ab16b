import { boxAround } from '../label-placer'
import { segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { crossing } from './body-shape'
import { thrustArrow } from './forces'
import { addPath, drawingText, quietLabel, valueLabel, type Composition } from './composition'
import { levelY, toScene } from './section-frame'
import { reversed } from '../path-data'

/** Half the length of the stroke that ends a dimension [px]. */
const TICK = 3.5

/** A dimension line with an oblique stroke at each end. */
export function dimensionLine(from: Point, to: Point): readonly (readonly [Point, Point])[] {
  const stroke = ({ x, y }: Point): readonly [Point, Point] => [
    { x: x - TICK, y: y + TICK },
    { x: x + TICK, y: y - TICK },
  ]
  return [[from, to], stroke(from), stroke(to)]
}

/** Shorter than this a dimension has no room for its strokes [px]. */
const SHORTEST = 3

function addDimension(drawing: Composition, id: string, from: Point, to: Point): void {
  if (Math.hypot(to.x - from.x, to.y - from.y) < SHORTEST) return
  addPath(drawing, id, 'dimension', segmentsPath(dimensionLine(from, to)))
  drawing.placer.avoid(boxAround(from, to, 3))
}

/** Depth on the wet side, skirt below the ground, crest and freeboard on the dry side. */
export function drawDimensions(drawing: Composition): void {
  drawDepth(drawing)
  drawSkirtLength(drawing)
  if (drawing.body.state === 'standing') drawCrest(drawing)
}

/** Where the depth is dimensioned; null where there is no room or no water. */
export function depthLine(drawing: Composition): { from: Point; to: Point } | null {
  const { input, frame, body } = drawing
  const { depth } = input.case.water
  if (frame.layout.name === 'narrow' || depth <= 0) return null
  const face = Math.min(...body.wetFace.map((point) => point.x))
  const tail = thrustArrow(drawing)?.from.x ?? face
  const x = Math.max(40, Math.min(body.skirt[0]?.x ?? face, face, tail) - 18)
  return { from: { x, y: frame.groundY }, to: { x, y: levelY(frame, depth) } }
}

function drawDepth(drawing: Composition): void {
  const line = depthLine(drawing)
  if (!line) return
  addDimension(drawing, 'depth', line.from, line.to)
  if (drawing.frame.fall === 0) return
  // The depth counts from the ground at the weld line: on a slope a thin line carries it over.
  const { groundY } = drawing.frame
  const witness: [Point, Point] = [
    { x: line.from.x - 6, y: groundY },
    { x: drawing.body.weld.x, y: groundY },
  ]
  addPath(drawing, 'depth-witness', 'levelLine', segmentsPath([witness]))
  drawing.placer.avoid(boxAround(witness[0], witness[1], 1))
}

/** The row of the skirt's length: above the legend, and no deeper below the ground than this [px]. */
const ABOVE_LEGEND = 34
const BELOW_DIAGRAM = 34

function skirtRow({ frame, input }: Composition): number {
  const edge = toScene(frame, { x: -input.case.barrier.skirtLength, y: 0 })
  const ground = Math.max(edge.y, frame.groundY)
  return Math.min(frame.height - ABOVE_LEGEND, ground + frame.layout.pressureMax + BELOW_DIAGRAM)
}

function drawSkirtLength(drawing: Composition): void {
  const edge = drawing.body.skirt[0]
  if (!edge) return
  const { frame } = drawing
  const end = frame.axis.toPx(0)
  const y = skirtRow(drawing)
  const message = drawingText('skirtLength', {
    length: { value: drawing.input.case.barrier.skirtLength, kind: 'length' },
  })
  const label = quietLabel(drawing, 'skirt-length', message, 'labelBarrier')
  const half = drawing.placer.width(label) / 2 + 6
  const middle = labelMiddle(drawing, edge.x, end, half)
  const ends = dimensionLine({ x: edge.x, y }, { x: end, y })
  const fits = end - edge.x > 2 * half + 12
  const line: (readonly [Point, Point])[] = fits
    ? [
        [
          { x: edge.x, y },
          { x: middle - half, y },
        ],
        [
          { x: middle + half, y },
          { x: end, y },
        ],
        ...ends.slice(1),
      ]
    : [...ends]
  addPath(drawing, 'skirt-dimension', 'dimension', segmentsPath(line))
  const beside = { x: edge.x - 8, y: y + 4, anchor: 'end' as const }
  const inside = { x: middle, y: y + 4, anchor: 'middle' as const }
  drawing.placer.place(
    label,
    fits ? [inside] : [beside, { ...inside, x: end + 8, anchor: 'start' }],
  )
  drawing.placer.avoid(boxAround({ x: edge.x, y }, { x: end, y }, 4))
}

/** Middle of the dimension, moved aside where a cut runs through it. */
function labelMiddle({ frame }: Composition, from: number, to: number, half: number): number {
  const middle = (from + to) / 2
  const { cut } = frame.axis
  if (!cut || middle + half < cut.fromPx - 8 || middle - half > cut.toPx + 8) return middle
  const after = cut.toPx + 10 + half
  return after + half < to ? after : cut.fromPx - 10 - half
}

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

function drawCrest(drawing: Composition): void {
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

/** Values of depth, crest and freeboard. */
export function labelDimensions(drawing: Composition): void {
  labelDepth(drawing)
  if (drawing.body.state === 'standing') labelCrest(drawing)
}

function labelDepth(drawing: Composition): void {
  const { input, placer, frame } = drawing
  const line = depthLine(drawing)
  if (!line) return
  const message = drawingText('depth', {
    depth: { value: input.case.water.depth, kind: 'length' },
  })
  const { x } = line.from
  const y = (line.from.y + line.to.y) / 2 + 4
  placer.placeSurely(valueLabel(drawing, 'depth-value', 'label', message), [
    { x: x - 9, y, anchor: 'end' },
    { x: x + 9, y, anchor: 'start' },
    { x: x + 9, y: line.to.y + frame.layout.font + 3, anchor: 'start' },
    { x: x + 9, y: line.to.y - 8, anchor: 'start' },
    { x: x - 9, y: line.to.y - 8, anchor: 'end' },
  ])
}

function labelCrest(drawing: Composition): void {
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
