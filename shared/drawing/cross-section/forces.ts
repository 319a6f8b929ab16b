import { upliftShare } from '../../calc/uplift/uplift-share'
import type { Point } from '../scene'
import { crossing } from './body-shape'
import type { Composition } from './composition'
import { levelY } from './section-frame'
import type { CrossSectionInput } from './section-input'

/** Head of water that acts upwards under the skirt [m], at a distance from its wet edge. */
export type UpliftHead = (fromEdge: number) => number

/** Head under the base: the edge's excess by the chosen model, plus the water on the dry side. */
export function upliftHead(input: CrossSectionInput): UpliftHead {
  const { uplift, barrier, water, ground } = input.case
  const base = barrier.skirtLength + barrier.contactWidth
  if (uplift.model === 'none' || base === 0) return () => 0
  const sin = ground.fall / Math.hypot(1, ground.fall)
  const edgeDepth = Math.max(0, water.depth - barrier.skirtLength * sin)
  const excess = uplift.edgeFactor * edgeDepth - water.dryDepth
  return (fromEdge) => water.dryDepth + excess * upliftShare(uplift, base, fromEdge)
}

/**
 * Friction that the skirt can give, μ N with
 * `N = ρg(L_w h − ½ L_w² sin β) + (W_b − V_lift − V_dry) cos β − F sin β − U` [N/m].
 */
export function frictionResistance(input: CrossSectionInput): number {
  const { thrust, vertical } = input.evaluation
  const { fall, friction } = input.case.ground
  const cos = 1 / Math.hypot(1, fall)
  const square = vertical.waterOnSkirt + vertical.lift - vertical.uplift
  const upright = vertical.self - vertical.lift - vertical.dryLift
  return friction * (square + upright * cos - thrust.total * fall * cos)
}

/** Length of the pressure arrow at a depth below the wet surface [px]. */
export function pressureLength({ frame, input }: Composition, y: number): number {
  const below = (y - levelY(frame, input.case.water.depth)) / frame.scale
  return frame.headScale * Math.max(0, below)
}

/** Where the water meets the barrier at a height of the scene [px]. */
export function faceX({ body }: Composition, y: number): number {
  return crossing(body.wetFace, y)?.x ?? body.top.x
}

/** Left end of the pressure diagram on the face at a height of the scene. */
export function diagramX(drawing: Composition, y: number): number {
  if (drawing.body.state !== 'standing') return faceX(drawing, y)
  return faceX(drawing, y) - pressureLength(drawing, y)
}

/** The thrust as an arrow; null where there is none, or it has no one arm. */
export function thrustArrow(drawing: Composition): { from: Point; to: Point } | null {
  const { input, frame, body } = drawing
  const { total, arm } = input.evaluation.thrust
  if (total === 0 || arm === null) return null
  const { diameter } = input.case.barrier
  const y = levelY(frame, Math.min(Math.max(arm, 0), 1.5 * diameter))
  const length = frame.forceScale * total
  if (total > 0) {
    const to = { x: diagramX(drawing, y) - 6, y }
    return { from: { x: to.x - length, y }, to }
  }
  const to = { x: body.right + 8, y }
  return { from: { x: to.x - length, y }, to }
}
