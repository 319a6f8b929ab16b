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

/** Where the surface begins and ceases to fall, in diameters from the sill. */
const FALL = { from: -1.2, to: 1.6 } as const

/** Share of the depth that is left behind it. */
const LEFT = 0.2

/**
 * Water that runs through where nothing holds it: about two thirds of its depth over the sill (critical
 * depth), then a thin fast sheet. A picture; the flow itself is the engine's.
 */
export function drawThroughWater(drawing: Composition, sillX: number, openness: number): void {
  const { frame, input } = drawing
  const { depth } = input.case.water
  if (depth <= 0) return
  const reach = frame.scale * input.case.barrier.diameter
  const from = sillX + FALL.from * reach
  const length = (FALL.to - FALL.from) * reach
  const surface = Array.from({ length: POINTS + 1 }, (_, index): Point => {
    const share = index / POINTS
    const fallen = share * share * (3 - 2 * share) * (1 - LEFT) * openness
    return { x: from + share * length, y: levelY(frame, depth * (1 - fallen)) }
  })
  const whole = [
    { x: Math.min(0, from), y: levelY(frame, depth) },
    ...surface,
    { x: Math.max(frame.width, from + length), y: surface.at(-1)?.y ?? frame.groundY },
  ]
  const bed = [
    { x: Math.max(frame.width, from + length), y: frame.groundY },
    { x: Math.min(0, from), y: frame.groundY },
  ]
  addPath(drawing, 'water', 'water', areaPath([...whole, ...bed]))
  addPath(drawing, 'water-line', 'waterLine', linePath(whole))
}
