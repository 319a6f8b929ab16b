import type { View } from '../scene'

/** Sizes that follow the room, not the barrier [CSS px]. */
export interface SectionLayout {
  readonly name: 'wide' | 'medium' | 'narrow'
  /** Type of values, and of what explains them. */
  readonly font: number
  readonly small: number
  /** Room left of the skirt's edge and right of the tube. */
  readonly gutterLeft: number
  readonly gutterRight: number
  /** Room above the highest water. */
  readonly top: number
  /** Depth of the strip of ground. */
  readonly strip: number
  /** Length of the pressure arrows at the greatest depth. */
  readonly pressureMax: number
  /** Distance between arrows of one diagram. */
  readonly arrowStep: number
  /** Radius of the grips that are dragged. */
  readonly grip: number
}

const WIDE: SectionLayout = {
  name: 'wide',
  font: 13,
  small: 12,
  gutterLeft: 168,
  gutterRight: 176,
  top: 38,
  strip: 138,
  pressureMax: 84,
  arrowStep: 44,
  grip: 12,
}

const MEDIUM: SectionLayout = {
  name: 'medium',
  font: 12.5,
  small: 11.5,
  gutterLeft: 150,
  gutterRight: 104,
  top: 32,
  strip: 128,
  pressureMax: 62,
  arrowStep: 34,
  grip: 12,
}

const NARROW: SectionLayout = {
  name: 'narrow',
  font: 12,
  small: 11.5,
  gutterLeft: 32,
  gutterRight: 14,
  top: 30,
  strip: 104,
  pressureMax: 44,
  arrowStep: 26,
  grip: 12,
}

/** Widths from which more is shown. */
const WIDE_FROM = 860
const MEDIUM_FROM = 520

/** Share of the height that the ground may take. */
const GROUND_SHARE = 0.36

/** The layout for a room; a low room has less ground. */
export function layoutFor(view: View): SectionLayout {
  const layout = view.width >= WIDE_FROM ? WIDE : view.width >= MEDIUM_FROM ? MEDIUM : NARROW
  const strip = Math.min(layout.strip, view.height * GROUND_SHARE)
  return { ...layout, strip, pressureMax: (layout.pressureMax * strip) / layout.strip }
}
