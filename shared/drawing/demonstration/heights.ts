import { segmentsPath } from '../path-data'
import { crossing } from '../cross-section/body-shape'
import { addPath, type Composition } from '../cross-section/composition'
import { levelY } from '../cross-section/section-frame'
import type { Spot } from '../label-placer'
import type { ShapeRole } from '../scene'
import type { DemonstrationInput } from './demonstration-input'
import { demoText, largeLabel, smallLabel } from './demo-text'

/** A gap between a line and its name [px]. */
const OVER = 6

/** Lines at heights, the depth of the water and the guess where it is a height. */
export function drawHeights(drawing: Composition, input: DemonstrationInput): void {
  const { guess } = input
  labelDepth(drawing, input)
  if (guess && guess.place !== 'bar') {
    const side = guess.place === 'dryLevel' ? 'dry' : 'wet'
    const label = largeLabel(drawing, 'guess-value', 'label', guess.message)
    drawLine(drawing, { id: 'guess', role: 'guess', depth: guess.value, side })
    placeOn(drawing, label, guess.value, side)
  }
  for (const { id, depth, line, text, message } of input.levels) {
    drawLine(drawing, { id: `level-${id}`, role: line, depth, side: 'wet' })
    placeOn(drawing, largeLabel(drawing, `level-${id}-value`, text, message), depth, 'wet')
  }
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
  if (side === 'dry') return [centre.x + radius, frame.width - 4]
  const face = crossing(body.wetFace, y)?.x ?? centre.x - radius
  return [4, face]
}

function placeOn(
  drawing: Composition,
  label: ReturnType<typeof largeLabel>,
  depth: number,
  side: Line['side'],
): void {
  const { frame, placer } = drawing
  const y = levelY(frame, depth)
  const under = y + label.size + 2
  const across = frame.width * 0.3
  const spots: readonly Spot[] =
    side === 'dry'
      ? [
          { x: frame.width - 8, y: y - OVER, anchor: 'end' },
          { x: frame.width - 8, y: y - OVER - label.size, anchor: 'end' },
        ]
      : [
          { x: 10, y: y - OVER, anchor: 'start' },
          { x: across, y: y - OVER, anchor: 'start' },
          { x: 10, y: under, anchor: 'start' },
          { x: across, y: under, anchor: 'start' },
        ]
  placer.placeSurely(label, spots)
}

/** The depth of the water at its left end, and that of the dry side at the right one. */
function labelDepth(drawing: Composition, input: DemonstrationInput): void {
  const { depth, dryDepth } = input.case.water
  const { frame, placer } = drawing
  const shown = (value: number) => demoText('level', { depth: { value, kind: 'length' } })
  if (depth > 0) {
    const y = levelY(frame, depth)
    const label = largeLabel(drawing, 'depth-value', 'labelWater', shown(depth))
    const x = frame.width * 0.16
    placer.placeSurely(label, [
      { x, y: y + label.size + 3, anchor: 'start' },
      { x, y: y - OVER, anchor: 'start' },
    ])
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
