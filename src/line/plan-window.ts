import { ZOOM_RANGE, type PlanFrame, type PlanWindow } from '@shared/drawing/plan'
import type { Point, View } from '@shared/drawing/scene'

/**
 * The window after zooming; what lies under the point stays where it is.
 *
 * @param whole Scale that shows all of the line [px/m].
 */
export function zoomedAround(
  frame: PlanFrame,
  { point, factor, whole, view }: { point: Point; factor: number; whole: number; view: View },
): PlanWindow {
  const scale = Math.min(
    ZOOM_RANGE.most * whole,
    Math.max(ZOOM_RANGE.least * whole, frame.scale * factor),
  )
  const kept = frame.toGrid(point)
  const centre = frame.toGrid({ x: view.width / 2, y: view.height / 2 })
  const share = frame.scale / scale
  return {
    scale,
    centre: { x: kept.x + share * (centre.x - kept.x), y: kept.y + share * (centre.y - kept.y) },
  }
}

/** The window after the drawing was moved by so many px. */
export function movedBy(frame: PlanFrame, by: Point, view: View): PlanWindow {
  const centre = frame.toGrid({ x: view.width / 2 - by.x, y: view.height / 2 - by.y })
  return { scale: frame.scale, centre }
}
