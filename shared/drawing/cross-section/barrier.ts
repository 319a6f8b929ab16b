import { boxAround, type Spot } from '../label-placer'
import { areaPath, linePath, segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { addPath, drawingText, quietLabel, type Composition } from './composition'
import { toScene } from './section-frame'

/** Half the width of the skirt's line: it lies on the ground, not in it [px]. */
const SKIRT_LIFT = 2

/** Tube and skirt: loaded, or as a ghost where they do not stand. */
export function drawBarrier(drawing: Composition): void {
  const { body } = drawing
  const stands = body.state === 'standing'
  if (body.state === 'last') drawUnloaded(drawing)
  addPath(drawing, 'tube-fill', stands ? 'barrierFill' : 'ghostFill', areaPath(body.skin))
  if (stands) drawUnloaded(drawing)
  addPath(drawing, 'tube', stands ? 'barrier' : 'ghost', areaPath(body.skin))
  drawSkirt(drawing)
  if (body.contact && stands) {
    addPath(drawing, 'contact', 'contact', linePath(body.contact.map(lowered)))
  }
  avoidSkin(drawing)
}

/** Only where it can be told apart from the loaded tube. */
function drawUnloaded(drawing: Composition): void {
  const { centre, radius } = drawing.body.unloaded
  if (drawing.input.case.water.depth === 0 && drawing.body.state === 'standing') return
  for (let step = 0; step < AVOIDED; step++) {
    const from = onCircle(centre, radius, step / AVOIDED)
    drawing.placer.avoid(boxAround(from, onCircle(centre, radius, (step + 1) / AVOIDED)))
  }
  drawing.shapes.push({
    kind: 'circle',
    id: 'unloaded',
    role: 'unloaded',
    cx: centre.x,
    cy: centre.y,
    r: radius,
  })
}

/** Boxes that keep labels off the dotted circle. */
const AVOIDED = 20

function onCircle(centre: Point, radius: number, turn: number): Point {
  const angle = 2 * Math.PI * turn
  return { x: centre.x + radius * Math.cos(angle), y: centre.y + radius * Math.sin(angle) }
}

function drawSkirt(drawing: Composition): void {
  const { body, frame, input } = drawing
  const [edge, ...rest] = body.skirt
  if (!edge) return
  const { cut } = frame.axis
  const onGround = (px: number) => onSlope(drawing, px)
  const corners = cut ? [onGround(cut.fromPx), onGround(cut.toPx)] : []
  const line = [edge, ...corners, ...rest].map(raised)
  addPath(drawing, 'skirt', 'skirt', linePath(line))
  const { shapes } = drawing
  shapes.push({
    kind: 'circle',
    id: 'weld',
    role: 'weld',
    cx: body.weld.x,
    cy: body.weld.y,
    r: 3.5,
  })
  if (input.case.uplift.edgeFactor === 0 || input.case.uplift.model === 'none') {
    addPath(drawing, 'sealed-edge', 'contact', segmentsPath([[raised(edge), below(edge)]]))
  }
}

function onSlope(drawing: Composition, px: number): Point {
  const { frame } = drawing
  return toScene(frame, { x: frame.axis.toMetres(px) / frame.cos, y: 0 })
}

const raised = ({ x, y }: Point): Point => ({ x, y: y - SKIRT_LIFT })
const lowered = ({ x, y }: Point): Point => ({ x, y: y + SKIRT_LIFT })
const below = ({ x, y }: Point): Point => ({ x, y: y + 9 })

/** No label across the skin; a few boxes follow it. */
function avoidSkin({ body, placer }: Composition): void {
  const { skin } = body
  const stride = Math.max(1, Math.floor(skin.length / 28))
  for (let index = 0; index + stride < skin.length; index += stride) {
    placer.avoid(boxAround(skin[index]!, skin[index + stride]!, 2))
  }
}

/** True where a text of this width lies inside the skin, so far below the middle. */
function fitsInside({ body }: Composition, width: number, drop: number): boolean {
  const halfHeight = body.centre.y - body.top.y
  const halfWidth =
    (body.right - body.centre.x) * Math.sqrt(Math.max(0, 1 - (drop / halfHeight) ** 2))
  return width / 2 + 5 < halfWidth
}

/** Air pressure inside the tube, and the name of the dotted circle. */
export function labelBarrier(drawing: Composition): void {
  const { body, input, placer, frame } = drawing
  const { airPressure } = input.case.barrier
  const { centre, top, right } = body
  const message = drawingText('air', { pressure: { value: airPressure, kind: 'pressure' } })
  const label = { ...quietLabel(drawing, 'air', message, 'labelBarrier'), weight: 600 } as const
  const drop = frame.layout.grip + frame.layout.small + 7
  const inside: Spot = { x: centre.x, y: centre.y + drop, anchor: 'middle' }
  const outside: readonly Spot[] = [
    { x: right + 8, y: centre.y + 4, anchor: 'start' },
    { x: top.x, y: top.y - 8, anchor: 'middle' },
    { x: right + 8, y: centre.y - 14, anchor: 'start' },
    { x: top.x, y: top.y - 26, anchor: 'middle' },
    { x: frame.width - 8, y: top.y - 26, anchor: 'end' },
  ]
  if (fitsInside(drawing, placer.width(label), drop)) placer.placeSurely(label, [inside])
  else if (body.state === 'standing') placer.place(label, outside)
}
