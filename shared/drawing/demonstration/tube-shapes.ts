import { areaPath, linePath } from '../path-data'
import type { Point } from '../scene'
import { addPath, type Composition } from '../cross-section/composition'
import { levelY } from '../cross-section/section-frame'
import type { Adrift } from './demonstration-input'

/** Points on an outline that is drawn by hand. */
const POINTS = 48

/** A tube without a skirt, on the ground or adrift; a spoke shows how it rolls. */
export function drawLooseTube(drawing: Composition, { lift, drift, turn }: Adrift): void {
  const { frame, body } = drawing
  const { radius } = body.unloaded
  const centre = {
    x: body.unloaded.centre.x + frame.scale * drift,
    y: body.unloaded.centre.y - frame.scale * lift,
  }
  const circle = { cx: centre.x, cy: centre.y, r: radius }
  drawing.shapes.push(
    { kind: 'circle', id: 'loose-fill', role: 'barrierFill', ...circle },
    { kind: 'circle', id: 'loose', role: 'barrier', ...circle },
  )
  const spoke = (reach: number): Point => ({
    x: centre.x + reach * radius * Math.sin(turn),
    y: centre.y + reach * radius * Math.cos(turn),
  })
  addPath(drawing, 'spoke', 'unloaded', linePath([spoke(-0.8), spoke(0.8)]))
  const weld = spoke(1)
  drawing.shapes.push({ kind: 'circle', id: 'weld', role: 'weld', cx: weld.x, cy: weld.y, r: 4 })
}

/** Height of a tube that loses its air, over the ground [m]: 0 full, 1 flat. */
export function collapsedHeight(diameter: number, collapse: number): number {
  return diameter * (1 - 0.94 * collapse)
}

/** A tube that loses its air: it spreads as it sinks, its skin keeps its length. */
export function drawCollapsedTube(drawing: Composition, collapse: number): void {
  const { frame, input, body } = drawing
  const { diameter, skirtLength } = input.case.barrier
  const high = (frame.scale * collapsedHeight(diameter, collapse)) / 2
  const flat = (Math.PI * diameter * frame.scale) / 4
  const round = (diameter * frame.scale) / 2
  const wide = round + (flat - round) * collapse
  const centre = { x: body.unloaded.centre.x + 0.3 * wide * collapse, y: frame.groundY - high }
  const skin = Array.from({ length: POINTS }, (_, index): Point => {
    const angle = (2 * Math.PI * index) / POINTS
    return { x: centre.x + wide * Math.cos(angle), y: centre.y + high * Math.sin(angle) }
  })
  addPath(drawing, 'soft-fill', 'ghostFill', areaPath(skin))
  addPath(drawing, 'soft', 'barrier', areaPath(skin))
  const edge = { x: frame.axis.toPx(-skirtLength), y: frame.groundY - 2 }
  const weld = { x: centre.x - wide, y: frame.groundY - 2 }
  addPath(drawing, 'skirt', 'skirt', linePath([edge, weld]))
}

/** Share of the depth that stands over the crest of a weir: critical depth. */
const CRITICAL = 2 / 3

/** Water that runs through where nothing holds it: down to critical depth, then a thin fast sheet. */
export function drawThroughWater(drawing: Composition, sillX: number, openness: number): void {
  const { frame, input } = drawing
  const { depth } = input.case.water
  if (depth <= 0) return
  const reach = frame.scale * input.case.barrier.diameter
  const at = (x: number, height: number): Point => ({ x, y: levelY(frame, height) })
  const over = depth * (1 - (1 - CRITICAL) * openness)
  const surface = [
    at(0, depth),
    at(Math.max(0, sillX - 1.4 * reach), depth),
    at(sillX - 0.5 * reach, depth * (1 - 0.12 * openness)),
    at(sillX, over),
    at(sillX + 0.5 * reach, over * (1 - 0.4 * openness)),
    at(sillX + reach, over * (1 - 0.6 * openness)),
    at(frame.width, over * (1 - 0.7 * openness)),
  ]
  const bed = [
    { x: frame.width, y: frame.groundY },
    { x: 0, y: frame.groundY },
  ]
  addPath(drawing, 'water', 'water', areaPath([...surface, ...bed]))
  addPath(drawing, 'water-line', 'waterLine', linePath(surface))
}
