import { wholeAxis } from '../cross-section/cut-axis'
import type { SectionLayout } from '../cross-section/layout'
import type { SectionFrame } from '../cross-section/section-frame'
import type { DemonstrationInput } from './demonstration-input'

/** From this width on the type is larger [px]. */
const WIDE_FROM = 560

/** Height of a row under the ground in sizes of type, and of the pressure diagram there [px]. */
const ROW = 1.75
const UPLIFT_ROOM = 34

/** Longest bar, as a share of the width. */
const BAR_SHARE = 0.6

/** Kept free in diameters: above the highest water, wet of the skirt, dry of the tube. */
const ABOVE = 0.2
const WET = 0.12
const DRY = 1.5

/** Pressure arrows, as a share of true head. */
const HEAD_SHARE = 0.2

/** Rows under the ground: bars, and the guess under them where it is marked there. */
export function stripRows({ bars, hasGuessRow }: { bars: number; hasGuessRow: boolean }): number {
  return bars + (hasGuessRow && bars > 0 ? 1 : 0)
}

/** The frame of a large picture. It depends on what stays in a scene, so nothing jumps while it moves. */
export function demonstrationFrame(input: DemonstrationInput, rows: number): SectionFrame {
  const { view, room } = input
  const { diameter } = input.case.barrier
  const layout = layoutOf(input, rows)
  const left = Math.max(room.skirtLength, 0.8 * diameter) + WET * diameter
  const right = DRY * diameter
  const above = Math.max(room.depth, diameter) + ABOVE * diameter
  const usableWidth = view.width - layout.gutterLeft - layout.gutterRight
  const usableHeight = view.height - layout.top - layout.strip
  const scale = Math.max(1, Math.min(usableWidth / (left + right), usableHeight / above))
  const spare = usableWidth - scale * (left + right)
  return {
    layout,
    width: view.width,
    height: view.height,
    scale,
    groundY: view.height - layout.strip,
    axis: wholeAxis(layout.gutterLeft + 0.5 * spare + scale * left, scale),
    sin: 0,
    cos: 1,
    fall: 0,
    headScale: Math.min(HEAD_SHARE * scale, UPLIFT_ROOM / Math.max(room.depth, 0.1)),
    forceScale: barLength(input) / input.forceReach,
  }
}

/** Length of a bar of full value [px]. */
export function barLength({ view }: DemonstrationInput): number {
  return BAR_SHARE * view.width
}

/** Height of one row under the ground [px]. */
export function rowHeight({ font }: SectionLayout): number {
  return ROW * font
}

/** Where the rows begin below the ground [px]. */
export function rowsTop({ parts }: DemonstrationInput): number {
  return parts.includes('uplift') ? UPLIFT_ROOM + 6 : 14
}

function layoutOf(input: DemonstrationInput, rows: number): SectionLayout {
  const isWide = input.view.width >= WIDE_FROM
  const font = isWide ? 16 : 13
  return {
    name: isWide ? 'wide' : 'narrow',
    font,
    small: isWide ? 13 : 12,
    gutterLeft: isWide ? 24 : 8,
    gutterRight: isWide ? 24 : 8,
    top: isWide ? 22 : 18,
    strip: rowsTop(input) + rows * ROW * font + 10,
    pressureMax: UPLIFT_ROOM,
    arrowStep: isWide ? 40 : 26,
    grip: 12,
  }
}
