import type { Background } from '../../schemas/mark'
import type { PlanFrame } from './plan-frame'

/**
 * Where a picture lies in a plan: the six numbers of an SVG `matrix` that carry pixels of the picture
 * to the drawing. Two points fix place, turn and scale; a picture is never stretched.
 *
 * @param size Width and height of the picture [px].
 */
export function placedPicture(
  { first, second }: Background,
  size: { readonly width: number; readonly height: number },
  frame: Pick<PlanFrame, 'toPoint'>,
): readonly [number, number, number, number, number, number] {
  const [a, b] = [first, second].map(({ u, v }) => ({ x: u * size.width, y: v * size.height }))
  const [p, q] = [first, second].map(frame.toPoint)
  const [dx, dy] = [b!.x - a!.x, b!.y - a!.y]
  const [ex, ey] = [q!.x - p!.x, q!.y - p!.y]
  const square = dx * dx + dy * dy
  const cos = (dx * ex + dy * ey) / square
  const sin = (dx * ey - dy * ex) / square
  return [cos, sin, -sin, cos, p!.x - cos * a!.x + sin * a!.y, p!.y - sin * a!.x - cos * a!.y]
}
