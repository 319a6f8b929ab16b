import { areaPath, segmentsPath } from '../path-data'
import { addPath, type Composition } from '../cross-section/composition'
import { barLength, rowHeight, rowsTop } from './demonstration-frame'
import type { DemonstrationInput } from './demonstration-input'
import { largeLabel } from './demo-text'

/** Thickness of a bar as a share of its row. */
const THICK = 0.55

/** Bars under the ground, all in one scale, each with its value behind it. */
export function drawRows(drawing: Composition, input: DemonstrationInput): void {
  const { frame, placer } = drawing
  const { layout, groundY } = frame
  const row = rowHeight(layout)
  const left = Math.max(layout.gutterLeft, 12)
  const marked = guessX(drawing, input)
  if (marked !== null)
    placer.avoid({ left: marked - 2, right: marked + 2, top: groundY, bottom: frame.height })
  input.bars.forEach(({ id, role, text, value, message }, index) => {
    const top = groundY + rowsTop(input) + index * row + (row * (1 - THICK)) / 2
    const bottom = top + row * THICK
    const right = left + (barLength(input) * Math.max(0, value)) / input.reach
    const corners = [
      { x: left, y: top },
      { x: right, y: top },
      { x: right, y: bottom },
      { x: left, y: bottom },
    ]
    addPath(drawing, `bar-${id}`, role, areaPath(corners))
    const label = largeLabel(drawing, `bar-${id}-value`, text, message)
    const x = Math.min(right + 10, frame.width - placer.width(label) - 6)
    placer.placeOverLines(label, [{ x, y: bottom - 0.12 * layout.font, anchor: 'start' }])
  })
}

/** The guess of the room on the bars: a line across them, named below. */
export function drawGuessOnRows(drawing: Composition, input: DemonstrationInput): void {
  const { guess, bars } = input
  const x = guessX(drawing, input)
  if (x === null || guess === null) return
  const { frame, placer } = drawing
  const row = rowHeight(frame.layout)
  const top = frame.groundY + rowsTop(input)
  const bottom = top + bars.length * row + 4
  addPath(
    drawing,
    'guess',
    'guess',
    segmentsPath([
      [
        { x, y: top - 4 },
        { x, y: bottom },
      ],
    ]),
  )
  const label = largeLabel(drawing, 'guess-value', 'label', guess.message)
  const width = placer.width(label)
  const start = Math.max(6, Math.min(x - width / 2, frame.width - width - 6))
  placer.put(label, { x: start, y: bottom + frame.layout.font, anchor: 'start' })
}

/** Place of the guess across the bars [px]; null: it is not marked there. */
function guessX({ frame }: Composition, input: DemonstrationInput): number | null {
  const { guess, bars, reach } = input
  if (guess?.place !== 'bar' || bars.length === 0) return null
  const left = Math.max(frame.layout.gutterLeft, 12)
  return left + barLength(input) * Math.min(1.5, Math.max(0, guess.value / reach))
}
