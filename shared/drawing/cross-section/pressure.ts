import { boxAround, type Label, type Spot } from '../label-placer'
import { areaPath, linePath } from '../path-data'
import type { Quantity } from '../../units'
import type { Arrow, Point, TextRole } from '../scene'
import { addArrows, addPath, drawingText, valueLabel, type Composition } from './composition'
import { diagramX, faceX, pressureLength, upliftHead } from './forces'
import { isCut } from './ground'
import { groundYAt, levelY, toScene } from './section-frame'

/** Between an arrow's head and the skirt's middle line [px]. */
const SKIRT_GAP = 4

/** Heights of the arrows on the face: they begin at this share of a step above the ground. */
const FIRST_ARROW = 0.35

/** Pressure of the water on the face of the tube and on the skirt, in one scale. */
export function drawPressure(drawing: Composition): void {
  if (drawing.input.case.water.depth <= 0) return
  if (drawing.body.state === 'standing') drawFace(drawing)
  drawOnSkirt(drawing)
}

/** The water that stands on the skirt. */
export function drawOnSkirt(drawing: Composition): void {
  const down = skirtArrows(drawing)
  addArrows(drawing, 'on-skirt', 'pressure', down)
  const [first, last] = [down[0], down.at(-1)]
  if (first && last) drawing.placer.avoid(boxAround(first.from, last.to, 3))
}

/** The water against the face of a standing tube. */
export function drawFace(drawing: Composition): void {
  const { frame, input, placer } = drawing
  const { depth } = input.case.water
  const surface = levelY(frame, depth)
  const height = frame.groundY - surface
  const count = Math.max(2, Math.min(8, Math.round(height / 20)))
  const arrows = Array.from({ length: count }, (_, index): Arrow => {
    const y = frame.groundY - (height * (index + FIRST_ARROW)) / count
    const x = faceX(drawing, y) - 2
    return { from: { x: x - pressureLength(drawing, y), y }, to: { x, y } }
  })
  const edge = Array.from({ length: 13 }, (_, index): Point => {
    const y = surface + (height * index) / 12
    return { x: diagramX(drawing, y) - 2, y }
  })
  addPath(drawing, 'face-diagram', 'envelope', linePath(edge))
  addArrows(drawing, 'on-face', 'pressure', arrows)
  for (const { from, to } of arrows) placer.avoid(boxAround(from, to, 4))
}

/** Places along the ground, evenly between two ends and clear of a cut [px]. */
function places(drawing: Composition, from: number, to: number): readonly number[] {
  const { arrowStep } = drawing.frame.layout
  const count = Math.floor((to - from) / arrowStep)
  if (count < 1) return []
  return Array.from({ length: count + 1 }, (_, i) => from + ((to - from) * i) / count).filter(
    (px) => !isCut(drawing, px),
  )
}

function skirtArrows(drawing: Composition): readonly Arrow[] {
  const { body, frame } = drawing
  const [edge, peel] = body.skirt
  if (!edge || !peel) return []
  const end = peel.x - pressureLength(drawing, frame.groundY) - 10
  return places(drawing, edge.x + 5, end).flatMap((px): Arrow[] => {
    const length = pressureLength(drawing, groundYAt(frame, px))
    if (length < 1) return []
    const foot = { x: px, y: groundYAt(frame, px) }
    const to = moved(drawing, foot, SKIRT_GAP)
    return [{ from: moved(drawing, to, length), to }]
  })
}

/** A point moved away from the ground, square to it; negative: into it. */
function moved({ frame }: Composition, point: Point, distance: number): Point {
  return { x: point.x + frame.sin * distance, y: point.y - frame.cos * distance }
}

/** Samples of the uplift diagram between the wet edge and the dry toe. */
const SAMPLES = 24

/** Water under the skirt: the true pressure diagram of the chosen model, from edge to dry toe. */
export function drawUplift(drawing: Composition): void {
  const { barrier, water } = drawing.input.case
  if (drawing.input.evaluation.vertical.uplift <= 0 || water.depth <= 0) return
  if (barrier.skirtLength === 0) return
  const base = barrier.skirtLength + barrier.contactWidth
  const head = upliftHead(drawing.input)
  const lengthAt = (fromEdge: number) => drawing.frame.headScale * head(fromEdge)
  const outline = Array.from({ length: SAMPLES + 1 }, (_, index) => {
    // Denser at both ends, where the deep model falls steeply.
    const fromEdge = (base * (1 - Math.cos((Math.PI * index) / SAMPLES))) / 2
    return moved(drawing, onBase(drawing, fromEdge), -lengthAt(fromEdge))
  })
  const roof = [onBase(drawing, base), onBase(drawing, 0)]
  addPath(drawing, 'uplift-area', 'upliftArea', areaPath([...outline, ...roof]))
  addPath(drawing, 'uplift-line', 'upliftLine', linePath(outline))
  addArrows(drawing, 'under-skirt', 'uplift', upliftArrows(drawing, base, lengthAt))
  for (let index = 0; index < SAMPLES; index += 2) {
    drawing.placer.avoid(boxAround(roofAt(outline, index, drawing), outline[index]!, 4))
  }
}

function roofAt(outline: readonly Point[], index: number, { frame }: Composition): Point {
  const next = outline[Math.min(index + 2, SAMPLES)]!
  return { x: next.x, y: groundYAt(frame, outline[index]!.x) }
}

function onBase(drawing: Composition, fromEdge: number): Point {
  return toScene(drawing.frame, { x: fromEdge - drawing.input.case.barrier.skirtLength, y: 0 })
}

function upliftArrows(
  drawing: Composition,
  base: number,
  lengthAt: (fromEdge: number) => number,
): readonly Arrow[] {
  const { frame, input } = drawing
  const from = onBase(drawing, 0).x
  return places(drawing, from, onBase(drawing, base).x).flatMap((px): Arrow[] => {
    const fromEdge = frame.axis.toMetres(px) / frame.cos + input.case.barrier.skirtLength
    const length = lengthAt(Math.min(base, Math.max(0, fromEdge)))
    if (length < 1.5) return []
    const to = { x: px, y: groundYAt(frame, px) }
    return [{ from: moved(drawing, to, -length), to }]
  })
}

/** What the water on and under the skirt comes to. */
export function labelPressure(drawing: Composition): void {
  labelOnSkirt(drawing)
  labelUnderSkirt(drawing)
}

/** A label in full, in short for where that does not fit, and its figure alone beside its arrows. */
function allLengths(
  drawing: Composition,
  name: 'onSkirt' | 'underSkirt',
  role: TextRole,
  force: Quantity,
): readonly [Label, Label, Label] {
  const label = (text: string) =>
    valueLabel(drawing, `${name}-value`, role, drawingText(text, { force }))
  return [label(name), label(`${name}Short`), label('forceAlone')]
}

function labelOnSkirt(drawing: Composition): void {
  const { body, input, frame, placer } = drawing
  const { waterOnSkirt } = input.evaluation.vertical
  const [edge, peel] = body.skirt
  if (!edge || !peel || input.case.water.depth <= 0) return
  const force = { value: waterOnSkirt, kind: 'forcePerLength' } as const
  const surface = levelY(frame, input.case.water.depth)
  const over = (x: number) =>
    groundYAt(frame, x) - pressureLength(drawing, groundYAt(frame, x)) - 12
  const middle = (edge.x + peel.x) / 2
  const { cut } = frame.axis
  const spots: readonly Spot[] = [
    { x: edge.x + 5, y: over(edge.x), anchor: 'start' },
    ...(cut ? [{ x: cut.toPx + 14, y: over(cut.toPx), anchor: 'start' as const }] : []),
    { x: middle, y: over(middle), anchor: 'middle' },
    { x: edge.x + 5, y: surface - 8, anchor: 'start' },
    { x: middle, y: surface - 8, anchor: 'middle' },
    { x: peel.x - 20, y: surface - 8, anchor: 'end' },
    { x: edge.x + 5, y: surface - 26, anchor: 'start' },
    { x: middle, y: surface - 26, anchor: 'middle' },
    { x: middle, y: surface - 44, anchor: 'middle' },
  ]
  const [long, short, alone] = allLengths(drawing, 'onSkirt', 'label', force)
  if (frame.layout.name !== 'narrow' && placer.place(long, spots)) return
  if (!placer.place(short, spots)) placer.placeSurely(alone, spots)
}

function labelUnderSkirt(drawing: Composition): void {
  const { input, frame, placer, body } = drawing
  const { uplift } = input.evaluation.vertical
  const edge = body.skirt[0]
  if (uplift <= 0 || !edge || input.case.water.depth <= 0) return
  const force = { value: uplift, kind: 'forcePerLength' } as const
  const { barrier } = input.case
  const base = barrier.skirtLength + barrier.contactWidth
  const head = upliftHead(input)
  const under = (px: number, fromEdge: number): Spot => ({
    x: px,
    y: groundYAt(frame, px) + frame.headScale * head(fromEdge) + frame.layout.font + 5,
    anchor: 'start',
  })
  const spots = [0, 0.25, 0.4, 0.55].map((share) =>
    under(onBase(drawing, share * base).x, share * base),
  )
  const { cut } = frame.axis
  if (cut) spots.push(under(cut.toPx + 14, barrier.skirtLength + cut.toX))
  const [long, short, alone] = allLengths(drawing, 'underSkirt', 'labelUplift', force)
  if (frame.layout.name !== 'narrow' && placer.place(long, spots)) return
  // Over the water it would take the room of what belongs there.
  if (!placer.place(short, spots) && !placer.place(alone, spots)) placer.placeSurely(short, spots)
}
