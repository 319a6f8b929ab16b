import { upliftShare } from '../../calc/uplift/uplift-share'
import type { Arrow } from '../scene'
import { crossing } from './body-shape'
import type { Composition } from './composition'
import { levelY, type SectionFrame } from './section-frame'
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
export function thrustArrow(drawing: Composition): Arrow | null {
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
  return movedInside(frame, {
    from: { x: body.right + 8 - length, y },
    to: { x: body.right + 8, y },
  })
}

/** Room that an arrow keeps to the dry edge of the drawing [px]. */
const DRY_EDGE = 6

/** An arrow on the dry side, moved over the tube where it would leave the drawing. */
export function movedInside({ width }: SectionFrame, { from, to }: Arrow): Arrow {
  const over = Math.max(0, Math.max(from.x, to.x) - (width - DRY_EDGE))
  return { from: { x: from.x - over, y: from.y }, to: { x: to.x - over, y: to.y } }
}
