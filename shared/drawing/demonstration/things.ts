import { areaPath, linePath } from '../path-data'
import type { Arrow, Point } from '../scene'
import { addArrows, addPath, type Composition } from '../cross-section/composition'
import { thrustArrow } from '../cross-section/forces'
import { levelY } from '../cross-section/section-frame'
import type { DemonstrationInput } from './demonstration-input'
import { demoText, smallLabel } from './demo-text'

/** The push as one arrow at its arm. */
export function drawPush(drawing: Composition): void {
  const arrow = thrustArrow(drawing)
  if (arrow) addArrows(drawing, 'thrust', 'force', [arrow])
}

/** The wind as one arrow to scale, at the middle of the tube. */
export function drawWind(drawing: Composition, force: number): void {
  if (force <= 0) return
  const { frame, body } = drawing
  const { centre } = body
  const radius = body.right - centre.x
  const to = { x: centre.x - radius - 4, y: centre.y }
  const arrow: Arrow = { from: { x: to.x - frame.forceScale * force, y: to.y }, to }
  addArrows(drawing, 'wind', 'force', [arrow])
  const streaks = [-0.6, 0.6].map((share): Arrow => {
    const y = centre.y + share * radius
    const x = to.x - 8
    return { from: { x: x - 0.6 * frame.forceScale * force, y }, to: { x, y } }
  })
  addArrows(drawing, 'wind-streaks', 'flow', streaks)
}

/** Half the width and the height of a stone under the skirt [m]. */
const STONE = { half: 0.045, high: 0.05 } as const

/** How far from the skirt's wet edge the stone lies, and the crease is [shares of the skirt]. */
const STONE_AT = 0.22
const CREASE_AT = 0.6

/** What lies under the skirt or on it: shown, with words that say what it is. */
export function drawThings(drawing: Composition, input: DemonstrationInput): void {
  const { skirtLength } = input.case.barrier
  if (skirtLength === 0) return
  if (input.parts.includes('stone')) drawStone(drawing, -skirtLength * (1 - STONE_AT))
  if (input.parts.includes('crease')) drawCrease(drawing, -skirtLength * (1 - CREASE_AT))
  if (input.parts.includes('bags')) drawBags(drawing, skirtLength)
}

/** A half ellipse on the ground [m]. */
function bump({ frame }: Composition, x: number, half: number, high: number): readonly Point[] {
  return Array.from({ length: 17 }, (_, index) => {
    const angle = Math.PI * (1 - index / 16)
    return {
      x: frame.axis.toPx(x + half * Math.cos(angle)),
      y: levelY(frame, high * Math.sin(angle)),
    }
  })
}

function drawStone(drawing: Composition, x: number): void {
  const { half, high } = STONE
  addPath(drawing, 'stone', 'debris', areaPath(bump(drawing, x, half, high)))
  addPath(drawing, 'stone-skirt', 'skirt', linePath(bump(drawing, x, 1.5 * half, high)))
  const top = { x: drawing.frame.axis.toPx(x), y: levelY(drawing.frame, high) - 8 }
  const label = smallLabel(drawing, 'stone-name', 'labelGround', demoText('stone'))
  drawing.placer.placeSurely(label, [{ ...top, anchor: 'middle' }])
}

function drawCrease(drawing: Composition, x: number): void {
  addPath(drawing, 'crease', 'skirt', linePath(bump(drawing, x, 0.035, 0.03)))
}

/** Two bags on the skirt, near its wet edge and near the tube. */
function drawBags(drawing: Composition, skirtLength: number): void {
  for (const [id, share] of [
    ['near', 0.35],
    ['far', 0.9],
  ] as const) {
    const bag = bump(drawing, -skirtLength * share, 0.16, 0.09)
    addPath(drawing, `bag-${id}`, 'debris', areaPath(bag))
  }
}
