import type { Station } from '../../schemas/line'
import type { LineEnds, LineMark } from '../../schemas/mark'
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
  /** Loaded crest [m]; null where no shape stands. */
  readonly crestLevel?: number | null
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

/** Low and high end of a level [m]; null where that end is not known. */
export interface LevelBand {
  readonly low: number | null
  readonly high: number | null
}

/** A part of a line, from chainage to chainage. */
export interface ChainageWindow {
  readonly from: number
  readonly to: number
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
  /** Low and high end of the band of the level [m]. */
  readonly band?: LevelBand | null
  readonly marks?: readonly LineMark[]
  readonly ends?: LineEnds | null
  /** Marks that lead water to the dry side now, by their place in the list. */
  readonly flowing?: readonly number[]
  /** Datum of all levels, such as "Quay datum (QD)". */
  readonly datum?: string | null
  /** Part of the line that is looked at; left out: all of it. */
  readonly window?: ChainageWindow | null
  readonly measure?: MeasureText | undefined
}
