import type { Verdict } from '../../schemas/section-result'
import { areaPath } from '../path-data'
import type { Point } from '../scene'

/** Thickness of a frame in shares of its side. */
const FRAME = 0.2

/**
 * The shape of a verdict around a centre, to be filled: a full square, a half-filled one, an open
 * one with a bar, a dotted one.
 */
export function verdictShape(verdict: Verdict, centre: Point, side: number): string {
  if (verdict === 'holds') return box(centre, side, side)
  if (verdict === 'narrow') return frame(centre, side) + lowerHalf(centre, side)
  if (verdict === 'fails') return frame(centre, side) + bar(centre, side)
  return dots(centre, side)
}

function box({ x, y }: Point, width: number, height: number): string {
  return areaPath(corners(x, y, width / 2, height / 2))
}

function corners(x: number, y: number, w: number, h: number): readonly Point[] {
  return [
    { x: x - w, y: y - h },
    { x: x + w, y: y - h },
    { x: x + w, y: y + h },
    { x: x - w, y: y + h },
  ]
}

/** An outer square and, the other way round, the hole in it. */
function frame({ x, y }: Point, side: number): string {
  const inner = side * (0.5 - FRAME)
  return (
    areaPath(corners(x, y, side / 2, side / 2)) +
    areaPath([...corners(x, y, inner, inner)].reverse())
  )
}

function lowerHalf({ x, y }: Point, side: number): string {
  return box({ x, y: y + side / 4 }, side * (1 - FRAME), side / 2)
}

function bar({ x, y }: Point, side: number): string {
  const end = side / 2
  const half = (side * FRAME) / Math.SQRT2
  return areaPath([
    { x: x - end, y: y + end - half },
    { x: x + end - half, y: y - end },
    { x: x + end, y: y - end + half },
    { x: x - end + half, y: y + end },
  ])
}

function dots({ x, y }: Point, side: number): string {
  const places = [-0.5, 0, 0.5]
  return places
    .flatMap((across) => places.map((down) => ({ across, down })))
    .filter(({ across, down }) => across !== 0 || down !== 0)
    .map(({ across, down }) =>
      box({ x: x + across * side * 0.8, y: y + down * side * 0.8 }, side * 0.2, side * 0.2),
    )
    .join('')
}
