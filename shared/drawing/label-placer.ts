import type { Message } from '../texts/format-text'
import type { TextAnchor, TextItem, TextRole, TextWeight, View } from './scene'
import type { MeasureText } from './text-width'

/** An upright rectangle in the scene. */
export interface Box {
  readonly left: number
  readonly top: number
  readonly right: number
  readonly bottom: number
}

/** A text that wants a place. */
export interface Label {
  readonly id: string
  readonly role: TextRole
  readonly message: Message
  readonly size: number
  readonly weight?: TextWeight
}

/** A place on offer: base line and the side on which the text hangs. */
export interface Spot {
  readonly x: number
  readonly y: number
  readonly anchor: TextAnchor
}

/** Share of the size above and below the base line that figures and letters take. */
const ASCENT = 0.76
const DESCENT = 0.22

/** Air between two texts, and between a text and the edge [px]. */
const CLEARANCE = 2
const EDGE = 4

/** The box that a text of this width takes at a spot. */
export function textBox(spot: Spot, width: number, size: number): Box {
  const left =
    spot.anchor === 'start' ? spot.x : spot.anchor === 'end' ? spot.x - width : spot.x - width / 2
  return {
    left,
    top: spot.y - ASCENT * size,
    right: left + width,
    bottom: spot.y + DESCENT * size,
  }
}

/** True where the boxes share more than an edge, each grown by half the clearance. */
export function boxesMeet(a: Box, b: Box, clearance = 0): boolean {
  return (
    a.left < b.right + clearance &&
    b.left < a.right + clearance &&
    a.top < b.bottom + clearance &&
    b.top < a.bottom + clearance
  )
}

/** The box around a line from one point to another. */
export function boxAround(
  from: { x: number; y: number },
  to: { x: number; y: number },
  grow = 0,
): Box {
  return {
    left: Math.min(from.x, to.x) - grow,
    top: Math.min(from.y, to.y) - grow,
    right: Math.max(from.x, to.x) + grow,
    bottom: Math.max(from.y, to.y) + grow,
  }
}

/**
 * Places texts one after another, so that none meets another, an obstacle or the edge. What comes
 * first gets the better place; a text that finds none is left out and stays in the description.
 */
export class LabelPlacer {
  private readonly texts: TextItem[] = []
  private readonly taken: Box[] = []
  private readonly lines: Box[] = []

  constructor(
    private readonly view: View,
    readonly measure: MeasureText,
  ) {}

  /** The texts placed so far, in the order of placing. */
  get placed(): readonly TextItem[] {
    return this.texts
  }

  /** Room that no text may take. */
  reserve(box: Box): void {
    this.taken.push(box)
  }

  /** A line that a text should not cross, unless there is no other place for it. */
  avoid(box: Box): void {
    this.lines.push(box)
  }

  /** The parts of a level line that meet nothing, each from left to right. */
  freeParts(y: number, from: number, to: number): readonly (readonly [number, number])[] {
    const inTheWay = this.taken
      .filter(
        ({ top, bottom, right, left }) => top <= y && y <= bottom && right > from && left < to,
      )
      .sort((a, b) => a.left - b.left)
    const parts: (readonly [number, number])[] = []
    let start = from
    for (const { left, right } of inTheWay) {
      if (left - CLEARANCE > start) parts.push([start, left - CLEARANCE])
      start = Math.max(start, right + CLEARANCE)
    }
    return start < to ? [...parts, [start, to]] : parts
  }

  width(label: Label): number {
    return this.measure(label.message, label.size, label.weight ?? 400)
  }

  /** True where the label would meet nothing at a spot, lines aside. */
  hasRoom(label: Label, spot: Spot): boolean {
    return this.isFree(textBox(spot, this.width(label), label.size))
  }

  /** Puts the label on the first spot that is free; false: it found none. */
  place(label: Label, spots: readonly Spot[]): boolean {
    const width = this.width(label)
    for (const spot of spots) {
      const box = textBox(spot, width, label.size)
      if (this.isFree(box) && !this.crossesLine(box)) return this.put(label, spot, box)
    }
    return false
  }

  /** As `place`, but across lines as well. */
  placeOverLines(label: Label, spots: readonly Spot[]): boolean {
    const width = this.width(label)
    for (const spot of spots) {
      const box = textBox(spot, width, label.size)
      if (this.isFree(box)) return this.putOver(label, spot, box)
    }
    return false
  }

  /** As `place`, but rather crosses a line or moves up and down than leave the label out. */
  placeSurely(label: Label, spots: readonly Spot[]): boolean {
    if (this.place(label, spots)) return true
    const width = this.width(label)
    const first = spots[0]
    if (first === undefined) return false
    const x = this.pulledIn(first, width)
    for (let distance = 0; distance < this.view.height; distance += label.size / 2) {
      for (const y of [first.y - distance, first.y + distance]) {
        const spot = { ...first, x, y }
        const box = textBox(spot, width, label.size)
        if (this.isFree(box)) return this.putOver(label, spot, box)
      }
    }
    return false
  }

  /** Takes the spot whatever stands there: for texts whose place was worked out before. */
  put(label: Label, spot: Spot, box = textBox(spot, this.width(label), label.size)): true {
    const { id, role, message, size, weight = 400 } = label
    this.texts.push({ kind: 'text', id, role, message, size, weight, ...spot })
    this.taken.push(box)
    return true
  }

  private putOver(label: Label, spot: Spot, box: Box): true {
    this.put(label, spot, box)
    if (this.crossesLine(box)) this.texts.push({ ...this.texts.pop()!, hasHalo: true })
    return true
  }

  isFree(box: Box): boolean {
    if (box.left < EDGE || box.top < EDGE) return false
    if (box.right > this.view.width - EDGE || box.bottom > this.view.height - EDGE) return false
    return !this.taken.some((other) => boxesMeet(box, other, CLEARANCE))
  }

  private crossesLine(box: Box): boolean {
    return this.lines.some((line) => boxesMeet(box, line))
  }

  private pulledIn(spot: Spot, width: number): number {
    const { left, right } = textBox(spot, width, 0)
    if (left < EDGE) return spot.x + EDGE - left
    const over = right - (this.view.width - EDGE)
    return over > 0 ? spot.x - over : spot.x
  }
}

/**
 * Spreads texts of a column so that neighbours are at least `gap` apart and stay in between the
 * ends, moving each as little as a single sweep down and a single sweep up allow.
 *
 * @param wanted Heights from top to bottom, rising.
 */
export function spreadColumn(
  wanted: readonly number[],
  gap: number,
  ends: { readonly top: number; readonly bottom: number },
): readonly number[] {
  const heights = [...wanted]
  for (let i = 0; i < heights.length; i++) {
    const above = i === 0 ? ends.top : heights[i - 1]! + gap
    heights[i] = Math.max(heights[i]!, above)
  }
  for (let i = heights.length - 1; i >= 0; i--) {
    const below = i === heights.length - 1 ? ends.bottom : heights[i + 1]! - gap
    heights[i] = Math.min(heights[i]!, below)
  }
  return heights
}
