import type { LoadedOutline } from '../../calc/loaded-shape/loaded-outline'
import { reversed } from '../path-data'
import type { Point } from '../scene'
import type { CrossSectionInput } from './section-input'
import { toScene, type SectionFrame } from './section-frame'

/** Tube and skirt in the scene [px]. */
export interface BodyShape {
  /** Stands as drawn, stood like this last, or has not stood at all (then its unloaded circle). */
  readonly state: 'standing' | 'last' | 'unloaded'
  /** What the water meets, from the ground to the top of the tube. */
  readonly wetFace: readonly Point[]
  /** From the top of the tube to the ground on the dry side. */
  readonly dryFace: readonly Point[]
  /** The closed skin of the tube. */
  readonly skin: readonly Point[]
  /** The skirt from its wet edge to the weld line; empty without a skirt. */
  readonly skirt: readonly Point[]
  /** Where skirt and tube meet. */
  readonly weld: Point
  /** The strip on which the tube rests; null where it does not stand. */
  readonly contact: readonly [Point, Point] | null
  readonly top: Point
  readonly right: number
  readonly centre: Point
  /** The tube before the water came. */
  readonly unloaded: { readonly centre: Point; readonly radius: number }
}

/** Points on each half of the unloaded circle. */
const HALF_CIRCLE = 24

/** The shape to be drawn: what stands, else what stood last, else the unloaded tube. */
export function bodyShape(input: CrossSectionInput, frame: SectionFrame): BodyShape {
  if (input.outline) return fromOutline(input, frame, input.outline, 'standing')
  if (input.lastStanding) return fromOutline(input, frame, input.lastStanding.outline, 'last')
  return fromCircle(input, frame)
}

function fromOutline(
  input: CrossSectionInput,
  frame: SectionFrame,
  outline: LoadedOutline,
  state: 'standing' | 'last',
): BodyShape {
  const place = (points: readonly Point[]) => points.map((point) => toScene(frame, point))
  const freeSkirt = place(outline.freeSkirt)
  const over = place([...outline.wetSkin, ...outline.crown, ...outline.drySkin])
  const contact = place(outline.contact)
  const skin = [...over, ...reversed(contact), ...reversed(place(outline.underside))]
  const path = [...freeSkirt, ...over]
  const top = highest(path)
  const weld = over[0] ?? toScene(frame, { x: 0, y: 0 })
  return {
    state,
    wetFace: path.slice(0, top + 1),
    dryFace: path.slice(top),
    skin,
    skirt: skirtLine(input, frame, freeSkirt, weld),
    weld,
    contact: [contact[0]!, contact[1]!],
    top: path[top] ?? weld,
    ...extentOf(skin),
    unloaded: unloadedCircle(input, frame),
  }
}

function fromCircle(input: CrossSectionInput, frame: SectionFrame): BodyShape {
  const unloaded = unloadedCircle(input, frame)
  const { centre, radius } = unloaded
  const at = (angle: number): Point => ({
    x: centre.x + radius * Math.sin(angle),
    y: centre.y - radius * Math.cos(angle),
  })
  const half = (from: number, to: number) =>
    Array.from({ length: HALF_CIRCLE + 1 }, (_, i) => at(from + ((to - from) * i) / HALF_CIRCLE))
  const wetFace = half(-Math.PI, 0)
  const dryFace = half(0, Math.PI)
  const weld = toScene(frame, { x: 0, y: 0 })
  const skin = [...wetFace, ...dryFace.slice(1)]
  return {
    state: 'unloaded',
    wetFace,
    dryFace,
    skin,
    skirt: skirtLine(input, frame, [], weld),
    weld,
    contact: null,
    top: at(0),
    ...extentOf(skin),
    unloaded,
  }
}

function unloadedCircle(input: CrossSectionInput, frame: SectionFrame): BodyShape['unloaded'] {
  const { diameter, contactWidth } = input.case.barrier
  return {
    centre: toScene(frame, { x: contactWidth / 2, y: diameter / 2 }),
    radius: (frame.scale * diameter) / 2,
  }
}

function skirtLine(
  input: CrossSectionInput,
  frame: SectionFrame,
  freeSkirt: readonly Point[],
  weld: Point,
): readonly Point[] {
  const { skirtLength } = input.case.barrier
  if (skirtLength === 0) return []
  const edge = toScene(frame, { x: -skirtLength, y: 0 })
  return [edge, ...(freeSkirt.length > 0 ? freeSkirt : [weld])]
}

function highest(points: readonly Point[]): number {
  let best = 0
  points.forEach((point, index) => {
    if (point.y < points[best]!.y) best = index
  })
  return best
}

function extentOf(points: readonly Point[]): { right: number; centre: Point } {
  let left = Infinity
  let right = -Infinity
  let top = Infinity
  let bottom = -Infinity
  for (const { x, y } of points) {
    left = Math.min(left, x)
    right = Math.max(right, x)
    top = Math.min(top, y)
    bottom = Math.max(bottom, y)
  }
  return { right, centre: { x: (left + right) / 2, y: (top + bottom) / 2 } }
}

/** Where a face, followed from the ground, first reaches a height of the scene; null: it stays below. */
export function crossing(
  face: readonly Point[],
  y: number,
): { readonly index: number; readonly x: number } | null {
  for (let index = 0; index + 1 < face.length; index++) {
    const lower = face[index]!
    const upper = face[index + 1]!
    if (upper.y > y) continue
    if (lower.y <= y) return { index, x: lower.x }
    const share = (lower.y - y) / (lower.y - upper.y)
    return { index, x: lower.x + share * (upper.x - lower.x) }
  }
  return null
}
