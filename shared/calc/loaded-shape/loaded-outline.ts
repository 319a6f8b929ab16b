import { FILM } from '../../constants'
import { gaussLegendre } from '../numerics/gauss-legendre'
import type { StandingShape } from './loaded-shape'
import { seatAngle, surfaceAngle, wetRun } from './skin-length'

/** A point of the section: x to the dry side from the nominal weld line, y up from the ground [m]. */
export interface Point {
  readonly x: number
  readonly y: number
}

/** The loaded tube as polylines, each from the wet side to the dry side unless said. */
export interface LoadedOutline {
  /** Lifted skirt, from where it leaves the ground up to the weld line. */
  readonly freeSkirt: readonly Point[]
  /** Skin in the water, from the weld line up to the water surface. */
  readonly wetSkin: readonly Point[]
  /** Skin above the water, from the surface to the crest. */
  readonly crown: readonly Point[]
  /** Half circle on the dry side, from the crest down to the ground. */
  readonly drySkin: readonly Point[]
  /** Skin under the weld line, from the weld down to the ground. */
  readonly underside: readonly Point[]
  /** Both touch-down points. */
  readonly contact: readonly [Point, Point]
  readonly weld: Point
  readonly crest: Point
}

/** What the outline needs beside the shape. */
export interface OutlineInput {
  readonly shape: StandingShape
  readonly airPressure: number
  readonly depth: number
  readonly unitWeight: number
  /** Points of each curve, 2 or more. */
  readonly points?: number
}

/** Three points integrate each short piece to well below a pixel. */
const PIECE = gaussLegendre(3)

/**
 * Outline of a standing shape, to scale. The wet edge of the skirt is the fixed point: as the skirt
 * lifts, the weld line moves towards the water by the difference between its length and its run.
 */
export function loadedOutline(input: OutlineInput): LoadedOutline {
  const { shape, airPressure, unitWeight, points = 24 } = input
  const depth = input.depth < FILM ? 0 : input.depth
  const radius = shape.crest / 2
  const skirt = freeSkirtCurve(depth, shape.weldHeight, points)
  const weld: Point = {
    x: skirt[skirt.length - 1]!.x - shape.freeSkirt,
    y: shape.weldHeight,
  }
  const membrane = { depth, perimeter: 0, kappa: unitWeight / (2 * airPressure) }
  const wet = wetSkinCurve(membrane, radius, weld, points)
  const surface = wet[wet.length - 1]!
  const beta = surfaceAngle(depth, radius)
  const middle = surface.x + radius * Math.sin(beta)
  const touch = weld.x + radius * Math.sin(seatAngle(shape.weldHeight, radius))
  const centre = { x: middle, y: radius }

  return {
    freeSkirt: skirt.map(({ x, y }) => ({ x: x - shape.freeSkirt, y })),
    wetSkin: wet,
    crown: arc(centre, radius, { from: -beta, to: 0, points }),
    drySkin: arc(centre, radius, { from: 0, to: Math.PI, points: 2 * points }),
    underside: arc({ x: touch, y: radius }, radius, {
      from: Math.PI + seatAngle(shape.weldHeight, radius),
      to: Math.PI,
      points,
    }),
    contact: [
      { x: touch, y: 0 },
      { x: middle, y: 0 },
    ],
    weld,
    crest: { x: middle, y: shape.crest },
  }
}

interface ArcRange {
  /** Angles from straight up, clockwise to the dry side [rad]. */
  readonly from: number
  readonly to: number
  readonly points: number
}

function arc(centre: Point, radius: number, { from, to, points }: ArcRange): readonly Point[] {
  return Array.from({ length: points }, (_, i) => {
    const angle = from + ((to - from) * i) / (points - 1)
    return {
      x: centre.x + radius * Math.sin(angle),
      y: centre.y + radius * Math.cos(angle),
    }
  })
}

/** The free skirt from its peel point, x measured from there: y = s², dx = cot φ dy. */
function freeSkirtCurve(depth: number, weldHeight: number, points: number): readonly Point[] {
  const end = Math.sqrt(weldHeight)
  const curve: Point[] = [{ x: 0, y: 0 }]
  for (let i = 1; i < points; i += 1) {
    const from = (end * (i - 1)) / (points - 1)
    const span = end / (points - 1)
    let run = 0
    for (const { at, weight } of PIECE) {
      const v = (from + span * at) ** 2 / depth
      const cosine = (1 - v) ** 2
      run += (weight * cosine) / Math.sqrt((2 - v) * (1 + cosine))
    }
    const before = curve[i - 1]!
    curve.push({ x: before.x + 2 * span * Math.sqrt(depth) * run, y: (from + span) ** 2 })
  }
  return depth === 0 ? [curve[0]!, curve[0]!] : curve
}

/** The wet skin upwards from the weld: each point by the run that is left below it. */
function wetSkinCurve(
  membrane: Parameters<typeof wetRun>[0],
  radius: number,
  weld: Point,
  points: number,
): readonly Point[] {
  const { depth } = membrane
  if (depth === 0) return [weld, weld]
  const whole = wetRun(membrane, radius, weld.y)
  return Array.from({ length: points }, (_, i) => {
    const y = weld.y + ((depth - weld.y) * i) / (points - 1)
    return { x: weld.x + whole - wetRun(membrane, radius, y), y }
  })
}
