import { reversed, segmentsPath } from '../path-data'
import { crossing } from '../cross-section/body-shape'
import { addPath, type Composition } from '../cross-section/composition'
import { levelY } from '../cross-section/section-frame'
import { spreadColumn, type Label } from '../label-placer'
import type { ShapeRole } from '../scene'
import type { DemonstrationInput } from './demonstration-input'
import { demoText, largeLabel, smallLabel } from './demo-text'

/** A gap between a line and its name [px]. */
const OVER = 6

/** Lines at heights, the depth of the water and the guess where it is a height. */
export function drawHeights(drawing: Composition, input: DemonstrationInput): void {
  const { guess } = input
  const named: Named[] = input.levels.map(({ id, depth, line, text, message }) => {
    drawLine(drawing, { id: `level-${id}`, role: line, depth, side: 'wet' })
    return { depth, label: largeLabel(drawing, `level-${id}-value`, text, message) }
  })
  if (guess && guess.place !== 'bar') {
    const side = guess.place === 'dryLevel' ? 'dry' : 'wet'
    const label = largeLabel(drawing, 'guess-value', 'label', guess.message)
    drawLine(drawing, { id: 'guess', role: 'guess', depth: guess.value, side })
    if (side === 'wet') named.push({ depth: guess.value, label })
    else nameDry(drawing, label, guess.value)
  }
  nameWet(drawing, named)
  labelDepth(drawing, input)
}

/** A height and its name. */
interface Named {
  readonly depth: number
  readonly label: Label
}

/** Where names of heights may begin, as shares of the width: clear of the mark on the water. */
const NAMES_AT = [0, 0.28, 0.42] as const

/** Names at the left edge, in the order of their heights, so far apart that each can be read. */
function nameWet({ frame, placer }: Composition, named: readonly Named[]): void {
  const sorted = [...named].sort((a, b) => b.depth - a.depth)
  const { font, top } = frame.layout
  const heights = spreadColumn(
    sorted.map(({ depth }) => levelY(frame, depth) - OVER),
    font + 4,
    { top: top + font, bottom: frame.groundY - 4 },
  )
  sorted.forEach(({ label }, index) => {
    const y = heights[index] ?? top
    const spots = NAMES_AT.map((share) => ({
      x: 10 + frame.width * share,
      y,
      anchor: 'start' as const,
    }))
    if (!placer.placeOverLines(label, spots)) placer.placeSurely(label, spots)
  })
}

/** The name of a height on the dry side. */
function nameDry({ frame, placer }: Composition, label: Label, depth: number): void {
  const y = levelY(frame, depth) - OVER
  const x = frame.width - 8
  placer.placeSurely(label, [
    { x, y, anchor: 'end' },
    { x, y: y - label.size, anchor: 'end' },
  ])
}

interface Line {
  readonly id: string
  readonly role: ShapeRole
  readonly depth: number
  readonly side: 'wet' | 'dry'
}

function drawLine(drawing: Composition, { id, role, depth, side }: Line): void {
  const y = levelY(drawing.frame, depth)
  const [from, to] = endsOf(drawing, y, side)
  addPath(
    drawing,
    id,
    role,
    segmentsPath([
      [
        { x: from, y },
        { x: to, y },
      ],
    ]),
  )
  drawing.placer.avoid({ left: from, right: to, top: y - 1, bottom: y + 1 })
}

function endsOf({ frame, body }: Composition, y: number, side: Line['side']): [number, number] {
  const { centre, radius } = body.unloaded
  if (side === 'dry') {
    const face = crossing(reversed(body.dryFace), y)?.x ?? centre.x + radius
    return [face, frame.width - 4]
  }
  const face = crossing(body.wetFace, y)?.x ?? centre.x - radius
  return [4, face]
}

/** Where the depth may stand, as shares of the width. */
const DEPTH_AT = [0.14, 0.45, 0.5] as const

/** The depth of the water at its left end, and that of the dry side at the right one. */
function labelDepth(drawing: Composition, input: DemonstrationInput): void {
  const { depth, dryDepth } = input.case.water
  const { frame, placer } = drawing
  const shown = (value: number) => demoText('level', { depth: { value, kind: 'length' } })
  if (depth > 0) {
    const y = levelY(frame, depth)
    const label = largeLabel(drawing, 'depth-value', 'labelWater', shown(depth))
    placer.placeSurely(
      label,
      DEPTH_AT.flatMap((share) => [
        { x: frame.width * share, y: y + label.size + 3, anchor: 'start' as const },
        { x: frame.width * share, y: y - OVER, anchor: 'start' as const },
      ]),
    )
  }
  if (dryDepth > 0) {
    const label = largeLabel(drawing, 'dry-depth-value', 'labelWater', shown(dryDepth))
    placer.placeSurely(label, [
      { x: frame.width - 70, y: levelY(frame, dryDepth) - OVER, anchor: 'end' },
    ])
  }
}

/** Names of both sides. */
export function labelSides(drawing: Composition): void {
  const { frame, placer } = drawing
  const y = frame.layout.font + 4
  const wet = smallLabel(drawing, 'wet-side', 'labelWater', demoText('wet'))
  const dry = smallLabel(drawing, 'dry-side', 'labelDry', demoText('dry'))
  placer.put(wet, { x: 10, y, anchor: 'start' })
  placer.put(dry, { x: frame.width - 10, y, anchor: 'end' })
}
