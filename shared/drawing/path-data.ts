import type { ArrowsItem, Arrow, ArrowStyle, CircleItem, Point, ShapeItem } from './scene'

/**
 * A coordinate to a hundredth of a pixel, as SVG writes it. Put together from whole numbers: a drag
 * writes a thousand of them for each frame, and printing a fraction costs several times as much.
 */
export function coordinate(value: number): string {
  const hundredths = Math.round(Math.abs(value) * 100)
  const whole = Math.trunc(hundredths / 100)
  const rest = hundredths - whole * 100
  const sign = value < 0 && hundredths > 0 ? '-' : ''
  if (rest === 0) return `${sign}${whole}`
  return rest < 10 ? `${sign}${whole}.0${rest}` : `${sign}${whole}.${rest}`
}

function pair(point: Point): string {
  return `${coordinate(point.x)} ${coordinate(point.y)}`
}

/** The same points backwards. */
export function reversed(points: readonly Point[]): readonly Point[] {
  return [...points].reverse()
}

/** Path data of an open line through the points. */
export function linePath(points: readonly Point[]): string {
  let d = ''
  for (const point of points) d += (d === '' ? 'M' : 'L') + pair(point)
  return d
}

/** Path data of the area inside the points. */
export function areaPath(points: readonly Point[]): string {
  return `${linePath(points)}Z`
}

/** Path data of separate straight lines, each from its first to its second point. */
export function segmentsPath(segments: readonly (readonly [Point, Point])[]): string {
  let d = ''
  for (const [from, to] of segments) d += `M${pair(from)}L${pair(to)}`
  return d
}

/** Path data of a circle. */
export function circlePath({ cx, cy, r }: CircleItem): string {
  const across = coordinate(2 * r)
  const radius = coordinate(r)
  const half = `a${radius} ${radius} 0 1 0 `
  return `M${pair({ x: cx - r, y: cy })}${half}${across} 0${half}-${across} 0Z`
}

/** Path data of any item that is not a text. */
export function shapePath(item: ShapeItem): string {
  if (item.kind === 'path') return item.d
  return item.kind === 'circle' ? circlePath(item) : arrowsPath(item)
}

/** Outline of one arrow: shaft and head in one closed shape; a short arrow gets a smaller head. */
function arrowOutline({ from, to }: Arrow, style: ArrowStyle): string {
  const dx = to.x - from.x
  const dy = to.y - from.y
  const length = Math.hypot(dx, dy)
  if (length < 0.5) return ''
  const size = Math.min(1, (0.75 * length) / style.head)
  const along = { x: dx / length, y: dy / length }
  const neck = length - style.head * size
  const at = (distance: number, side: number): Point => ({
    x: from.x + along.x * distance - along.y * side,
    y: from.y + along.y * distance + along.x * side,
  })
  const shaft = Math.min(style.shaft, style.spread * size) / 2
  const spread = (style.spread * size) / 2
  return areaPath([
    at(0, -shaft),
    at(neck, -shaft),
    at(neck, -spread),
    to,
    at(neck, spread),
    at(neck, shaft),
    at(0, shaft),
  ])
}

/** Path data of all arrows of an item, to be filled. */
export function arrowsPath(item: ArrowsItem): string {
  let d = ''
  for (const arrow of item.arrows) d += arrowOutline(arrow, item.style)
  return d
}
