import { boxAround } from '../label-placer'
import { segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { drawCrest, labelCrest } from './crest'
import { addDimension, dimensionLine } from './dimension-line'
import { thrustArrow } from './forces'
import { addPath, drawingText, quietLabel, valueLabel, type Composition } from './composition'
import { levelY, toScene } from './section-frame'

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
