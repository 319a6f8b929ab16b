import { areaPath, linePath, reversed, segmentsPath } from '../path-data'
import type { Point } from '../scene'
import { crossing } from './body-shape'
import { addPath, type Composition } from './composition'
import { faceX } from './forces'
import { groundPoints, groundYAt, levelY } from './section-frame'

/** Share of the overflow's height that stands over the crest: critical depth. */
const CRITICAL = 2 / 3

/** How much of it is left where the sheet reaches the ground. */
const THINNED = 0.4

/** Water on both sides, below everything else. */
export function drawWater(drawing: Composition): void {
  const { depth, dryDepth } = drawing.input.case.water
  if (depth > 0) {
    const surface = wetSurface(drawing)
    addPath(drawing, 'water', 'water', areaPath([...surface, ...wetBed(drawing, surface)]))
  }
  if (dryDepth > 0) addPath(drawing, 'dry-water', 'water', areaPath(dryBody(drawing)))
}

/** Surface lines, after ground and barrier. */
export function drawSurfaces(drawing: Composition): void {
  const { depth, dryDepth } = drawing.input.case.water
  if (depth > 0) addPath(drawing, 'water-line', 'waterLine', linePath(wetSurface(drawing)))
  if (dryDepth > 0) {
    const [from, to] = drySurface(drawing)
    addPath(drawing, 'dry-water-line', 'waterLine', linePath([from, to]))
    drawLevelMark(drawing, 'dry-level', { x: to.x - 18, y: to.y })
  }
  const { frame } = drawing
  drawLevelMark(drawing, 'level', { x: levelMarkX(drawing), y: levelY(frame, depth) })
}

/** Least distance of the level mark from a grip and from the barrier [px]. */
const MARK_GAP = 30
const FACE_GAP = 18

/** Where the triangle of the level mark stands: clear of the grip, the barrier and the shore. */
export function levelMarkX(drawing: Composition): number {
  const { layout } = drawing.frame
  const y = levelY(drawing.frame, drawing.input.case.water.depth)
  const grip = waterGripX(drawing)
  const end = Math.min(...drawing.body.wetFace.map(({ x }) => x), faceX(drawing, y)) - FACE_GAP
  const wanted = layout.name === 'narrow' ? grip + MARK_GAP : layout.gutterLeft + 34
  const isFree = wanted <= end && Math.abs(wanted - grip) >= MARK_GAP
  return Math.max(shoreX(drawing, y) + 12, isFree ? wanted : grip - MARK_GAP)
}

/** The grip on the water sits in this share of the way to the weld line. */
const GRIP_SHARE = 0.5

/** Where the water surface is taken hold of: clear of a cut and of the shore. */
export function waterGripX(drawing: Composition): number {
  const { axis, layout } = drawing.frame
  const { cut } = axis
  const end = Math.min(axis.toPx(0), drawing.body.unloaded.centre.x - drawing.body.unloaded.radius)
  const wanted = layout.gutterLeft + GRIP_SHARE * Math.max(0, end - layout.gutterLeft)
  const afterCut = cut ? cut.toPx + 34 : 0
  return afterCut < end - 24 ? Math.max(wanted, afterCut) : wanted
}

/** In shallower water the strokes are left out [px]. */
const ROOM_FOR_STROKES = 22

/** The sign for a free surface: a triangle on it and three strokes under it. */
function drawLevelMark(drawing: Composition, id: string, at: Point): void {
  const triangle = [
    { x: at.x - 6, y: at.y - 10 },
    { x: at.x + 6, y: at.y - 10 },
    { x: at.x, y: at.y - 1 },
  ]
  addPath(drawing, id, 'levelMark', areaPath(triangle))
  drawing.placer.reserve({ left: at.x - 8, right: at.x + 8, top: at.y - 11, bottom: at.y + 12 })
  if (groundYAt(drawing.frame, at.x) - at.y < ROOM_FOR_STROKES) return
  const strokes = [8, 5, 2].map((half, index): [Point, Point] => {
    const y = at.y + 4 + 3.5 * index
    return [
      { x: at.x - half, y },
      { x: at.x + half, y },
    ]
  })
  addPath(drawing, `${id}-strokes`, 'waterDetail', segmentsPath(strokes))
}

/** The surface from the left edge to the barrier, or over it. */
function wetSurface(drawing: Composition): Point[] {
  const { frame, body, input } = drawing
  const y = levelY(frame, input.case.water.depth)
  const left = { x: shoreX(drawing, y), y }
  const hit = crossing(body.wetFace, y)
  if (hit) return [left, { x: hit.x, y }]
  return [left, ...nappe(drawing, y)]
}

/** Where the ground rises through the water on the wet side; 0 where it does not. */
function shoreX(drawing: Composition, y: number): number {
  const { frame, input } = drawing
  if (groundYAt(frame, 0) >= y) return 0
  return Math.max(0, frame.axis.toPx(-input.case.water.depth / frame.fall))
}

/** The sheet of water over the tube, down its back and away. */
function nappe(drawing: Composition, y: number): Point[] {
  const { body, frame } = drawing
  const { top, dryFace, centre } = body
  const over = CRITICAL * (top.y - y)
  const drop = Math.max(12, 1.6 * (top.y - y))
  const brink = [1, 0.75, 0.5, 0.25, 0].map((share) => ({
    x: top.x - drop * share,
    y: y + (top.y - y - over) * (1 - share) ** 2,
  }))
  const back = dryFace.slice(1).flatMap((point, index): Point[] => {
    const share = (index + 1) / dryFace.length
    const sheet = over * (1 - (1 - THINNED) * share)
    const reach = Math.hypot(point.x - centre.x, point.y - centre.y) || 1
    const x = point.x + ((point.x - centre.x) / reach) * sheet
    const outer = point.y + ((point.y - centre.y) / reach) * sheet
    const isClear = outer < groundYAt(frame, x) - THINNED * over
    return isClear ? [{ x: Math.min(x, frame.width), y: outer }] : []
  })
  const landing = Math.min(frame.width, (back.at(-1) ?? top).x + THINNED * over)
  const away = groundPoints(frame, landing, frame.width)
  return [...brink, ...back, ...away.map(({ x, y: ground }) => ({ x, y: ground - THINNED * over }))]
}

/** The way back under the water, along the barrier and the ground. */
function wetBed(drawing: Composition, surface: readonly Point[]): Point[] {
  const { body, frame } = drawing
  const left = surface[0]!
  const right = surface.at(-1)!
  const hit = crossing(body.wetFace, left.y)
  const wet = hit ? body.wetFace.slice(0, hit.index + 1) : body.wetFace
  const foot = body.wetFace[0] ?? body.weld
  const bed = groundPoints(frame, left.x, Math.max(foot.x, left.x)).reverse()
  if (hit) return [...reversed(wet), ...bed]
  const toe = body.dryFace.at(-1) ?? body.weld
  const floor = groundPoints(frame, toe.x, right.x).reverse()
  return [...floor, ...reversed(body.dryFace), ...reversed(wet), ...bed]
}

function drySurface(drawing: Composition): [Point, Point] {
  const { frame, body, input } = drawing
  const y = levelY(frame, input.case.water.dryDepth)
  const hit = crossing(reversed(body.dryFace), y)
  return [
    { x: hit?.x ?? body.top.x, y },
    { x: dryShoreX(drawing, y), y },
  ]
}

/** Where ground that rises to the dry side ends the water there; the edge of the view otherwise. */
function dryShoreX(drawing: Composition, y: number): number {
  const { frame, input, body } = drawing
  if (groundYAt(frame, frame.width) >= y) return frame.width
  return Math.max(body.right, frame.axis.toPx(-input.case.water.dryDepth / frame.fall))
}

function dryBody(drawing: Composition): Point[] {
  const { frame, body } = drawing
  const [from, to] = drySurface(drawing)
  const fromFoot = reversed(body.dryFace)
  const hit = crossing(fromFoot, from.y)
  const dry = hit ? fromFoot.slice(0, hit.index + 1) : fromFoot
  const foot = fromFoot[0] ?? body.weld
  return [from, to, ...groundPoints(frame, foot.x, to.x).reverse(), ...dry]
}
