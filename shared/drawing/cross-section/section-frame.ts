import type { LoadedOutline } from '../../calc/loaded-shape/loaded-outline'
import { niceAbove } from '../nice-ticks'
import type { Point } from '../scene'
import { cutAxis, wholeAxis, type CutAxis } from './cut-axis'
import { frictionResistance } from './friction'
import { layoutFor, type SectionLayout } from './layout'
import type { CrossSectionInput } from './section-input'

/** The greatest depth of a case, in diameters: the drawing keeps room for it. */
export const GREATEST_DEPTH = 1.5

/** How metres, heads of water and forces become pixels in one drawing. */
export interface SectionFrame {
  readonly layout: SectionLayout
  readonly width: number
  readonly height: number
  /** px per metre, the same in both directions. */
  readonly scale: number
  /** Height of the ground at the weld line [px]. */
  readonly groundY: number
  readonly axis: CutAxis
  readonly sin: number
  readonly cos: number
  /** Crossfall tan β. */
  readonly fall: number
  /** px per metre of head: all pressure arrows. */
  readonly headScale: number
  /** px per N/m: all force arrows. */
  readonly forceScale: number
}

/** Below this share of the scale that the height allows, the skirt is cut rather than shrunk. */
const LEAST_SHARE = 0.36

/** Width of the gap at a cut [px]. */
const CUT_GAP = 14

/** Pressure arrows are drawn at less than this share of true head, below the thrust at a third. */
const HEAD_SHARE = 0.28

/** The drawing reaches at least so far to the wet side of the weld line, in diameters. */
const LEAST_LEFT = 0.8

/** Share of the spare height that goes above the water. */
const SPARE_ABOVE = 0.72

/** How far to the dry side a firm tube reaches under load, in diameters from the weld line. */
const ROLLED = 0.93

/** Extent of the drawing in metres around the weld line. */
interface Extent {
  readonly left: number
  readonly right: number
  readonly above: number
  readonly below: number
}

/** Works out the frame. It does not depend on the depth, so nothing jumps while the water is dragged. */
export function sectionFrame(input: CrossSectionInput): SectionFrame {
  const { view } = input
  const { fall } = input.case.ground
  const layout = layoutFor(view)
  const cos = 1 / Math.hypot(1, fall)
  const sin = fall * cos
  const extent = extentOf(input, sin, cos)
  const usableWidth = view.width - layout.gutterLeft - layout.gutterRight
  const usableHeight = view.height - layout.top - layout.strip
  const byHeight = usableHeight / (extent.above + extent.below)
  const byWidth = usableWidth / (extent.left + extent.right)
  const scale =
    byWidth >= LEAST_SHARE * byHeight
      ? Math.min(byWidth, byHeight)
      : Math.max(byWidth, Math.min(byHeight, (0.5 * usableWidth) / extent.right))
  const spare = usableHeight - scale * (extent.above + extent.below)
  const axis = axisOf(extent, scale, layout, usableWidth)
  return {
    layout,
    width: view.width,
    height: view.height,
    scale,
    groundY: layout.top + scale * extent.above + spare * SPARE_ABOVE,
    axis,
    sin,
    cos,
    fall,
    headScale: headScaleOf(input, layout, scale, sin),
    forceScale: forceScaleOf(input, axis, layout),
  }
}

function extentOf(input: CrossSectionInput, sin: number, cos: number): Extent {
  const { diameter, skirtLength } = input.case.barrier
  const nominal = diameter * (ROLLED + Math.abs(sin) / 2)
  const outline = input.outline ?? input.lastStanding?.outline
  const right = Math.max(nominal, outline ? farthest(outline) : 0)
  const left = Math.max(skirtLength * cos, LEAST_LEFT * diameter)
  const wetRise = sin * (skirtLength + 0.4 * diameter)
  const dryRise = -sin * (right + 0.6 * diameter)
  return {
    left,
    right,
    above: Math.max(GREATEST_DEPTH * diameter, wetRise + 0.1 * diameter, dryRise),
    below: Math.max(0, -wetRise, -dryRise),
  }
}

function farthest(outline: LoadedOutline): number {
  let right = 0
  for (const { x } of outline.drySkin) right = Math.max(right, x)
  return right
}

function axisOf(
  extent: Extent,
  scale: number,
  layout: SectionLayout,
  usableWidth: number,
): CutAxis {
  const spare = usableWidth - scale * (extent.left + extent.right)
  // Rounding must not cut a skirt that just fits.
  if (spare >= -0.01) return wholeAxis(layout.gutterLeft + spare * 0.6 + scale * extent.left, scale)
  const originPx = layout.gutterLeft + usableWidth - scale * extent.right
  const skirtPx = originPx - layout.gutterLeft - CUT_GAP
  const edgePart = (layout.name === 'narrow' ? 0.62 : 0.5) * skirtPx
  const fromPx = layout.gutterLeft + edgePart
  const toPx = fromPx + CUT_GAP
  return cutAxis(originPx, scale, {
    fromX: -extent.left + edgePart / scale,
    toX: (toPx - originPx) / scale,
    fromPx,
    toPx,
  })
}

function headScaleOf(
  input: CrossSectionInput,
  layout: SectionLayout,
  scale: number,
  sin: number,
): number {
  const { diameter, skirtLength } = input.case.barrier
  const greatest = GREATEST_DEPTH * diameter + Math.max(0, -sin * skirtLength)
  return Math.min(layout.pressureMax / greatest, HEAD_SHARE * scale)
}

/** Longest force arrow: this share of the width, between these lengths [px]. */
const FORCE_SHARE = 0.32
const FORCE_LENGTHS = { least: 110, most: 330 } as const

/** Kept free at the wet edge of the drawing [px]. */
const WET_EDGE = 26

/**
 * Thrust at the greatest depth and friction at a depth of one diameter fix the scale, so that it
 * stays while the water moves; only unusual forces (debris, waves) make it smaller, by nice steps.
 */
function forceScaleOf(input: CrossSectionInput, axis: CutAxis, layout: SectionLayout): number {
  const { barrier, ground, water, gravity } = input.case
  const weight = water.density * gravity
  const { diameter, skirtLength, contactWidth } = barrier
  const greatest = Math.max(
    (weight * (GREATEST_DEPTH * diameter) ** 2) / 2,
    0.6 * ground.friction * weight * (skirtLength + contactWidth) * diameter,
  )
  const present = greatestForce(input)
  const reference = present > greatest ? niceAbove(present) : greatest
  const { least, most } = FORCE_LENGTHS
  const wanted = Math.min(most, Math.max(least, FORCE_SHARE * input.view.width))
  const face = axis.toPx(-0.55 * diameter)
  return Math.max(1, Math.min(wanted, face - layout.pressureMax - WET_EDGE)) / reference
}

/** The greatest force that one arrow shows. */
function greatestForce(input: CrossSectionInput): number {
  const { thrust, sliding } = input.evaluation
  const friction = Math.max(0, frictionResistance(input))
  return Math.max(
    Math.abs(thrust.total),
    thrust.debris,
    thrust.dry,
    friction,
    friction * (sliding.utilisation ?? 0),
  )
}

/** Flatter ground than 1 in this many is called level in words. */
const FLATTEST = 1000

/** The slope as "1 in …"; null where the ground is as good as level. */
export function slopeRun(fall: number): number | null {
  const run = Math.round(1 / Math.abs(fall))
  return run > FLATTEST ? null : run
}

/** From the axes of the section (along the ground and square to it) [m] to the scene [px]. */
export function toScene(frame: SectionFrame, point: Point): Point {
  const { sin, cos, axis, scale, groundY } = frame
  return {
    x: axis.toPx(point.x * cos + point.y * sin),
    y: groundY - scale * (point.y * cos - point.x * sin),
  }
}

/** Height above the ground at the weld line [m] as a height in the scene [px]. */
export function levelY(frame: SectionFrame, height: number): number {
  return frame.groundY - frame.scale * height
}

/** Height of the ground at a place [px] of the scene [px]. */
export function groundYAt(frame: SectionFrame, px: number): number {
  return frame.groundY + frame.scale * frame.fall * frame.axis.toMetres(px)
}

/** The ground from one place to another [px], with the corners at a cut. */
export function groundPoints(frame: SectionFrame, fromPx: number, toPx: number): Point[] {
  const { cut } = frame.axis
  const corners = cut ? [cut.fromPx, cut.toPx].filter((px) => px > fromPx && px < toPx) : []
  return [fromPx, ...corners, toPx].map((x) => ({ x, y: groundYAt(frame, x) }))
}
