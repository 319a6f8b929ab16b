import type { Station } from '../../schemas/line'
import type { LineEnds, LineMark } from '../../schemas/mark'
import type { DrawnSectionOfLine, WeakestPlace } from '../long-section/long-section-input'
import type { View } from '../scene'
import type { MeasureText } from '../text-width'
import type { PlanWindow } from './plan-frame'

/** A run of the line with one tube, as it lies on the ground. */
export interface PlannedRun {
  readonly from: number
  readonly to: number
  readonly diameter: number
  readonly skirtLength: number
  readonly contactWidth: number
}

export interface PlanInput {
  readonly view: View
  /** In order of chainage; two of them or more have x and y. */
  readonly stations: readonly Station[]
  readonly marks: readonly LineMark[]
  readonly ends: LineEnds
  readonly runs: readonly PlannedRun[]
  readonly sections: readonly DrawnSectionOfLine[]
  readonly weakest: WeakestPlace | null
  /** Chainage that is looked at [m]. */
  readonly place: number | null
  /** Marks that lead water to the dry side now, by their place in the list. */
  readonly flowing: readonly number[]
  /** Another line beside it. */
  readonly alternative: readonly Station[] | null
  readonly window: PlanWindow | null
  readonly measure?: MeasureText | undefined
}
