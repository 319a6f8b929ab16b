import type { Station } from '../../schemas/line'
import type { Verdict } from '../../schemas/section-result'
import type { View } from '../scene'
import type { MeasureText } from '../text-width'

/** One tube length of the line, as far as the drawing shows it. */
export interface DrawnSectionOfLine {
  readonly from: number
  readonly to: number
  readonly verdict: Verdict
  /** Level to which it holds [m]; null where nothing holds. */
  readonly holdsToLevel: number | null
}

/** Part of the line on which one size is laid. */
export interface DrawnRun {
  readonly from: number
  readonly to: number
  /** Diameter of the unloaded tube [m]. */
  readonly diameter: number
}

/** Where the line gives way first. */
export interface WeakestPlace {
  readonly chainage: number
  /** Level to which it holds [m]; null where nothing holds. */
  readonly holdsToLevel: number | null
}

export interface LongSectionInput {
  readonly view: View
  /** In order of chainage, one or more. */
  readonly stations: readonly Station[]
  readonly sectionLength: number
  /** Level that is checked [m]; null: a survey without water. */
  readonly waterLevel: number | null
  readonly runs: readonly DrawnRun[]
  readonly sections: readonly DrawnSectionOfLine[]
  readonly weakest: WeakestPlace | null
  /** Chainage that is looked at [m]. */
  readonly place: number | null
  readonly measure?: MeasureText | undefined
}
