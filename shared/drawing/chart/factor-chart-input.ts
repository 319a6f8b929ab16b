import type { Message } from '../../texts/format-text'
import type { View } from '../scene'
import type { MeasureText } from '../text-width'
import type { UnitSystem } from '../../units'

/** One point of a curve. */
export interface FactorPoint {
  /** Depth of water [m]. */
  readonly depth: number
  /** Null: nothing to compare at this depth; the curve has a gap there. */
  readonly factor: number | null
}

/** One curve, named where it is drawn. */
export interface FactorSeries {
  readonly id: string
  readonly label: Message
  /** The case as it is, or what it would be. */
  readonly style: 'chosen' | 'alternative'
  /** In order of depth. */
  readonly points: readonly FactorPoint[]
}

export interface FactorChartInput {
  readonly view: View
  readonly series: readonly FactorSeries[]
  /** Required factor; null where the basis does not check it. */
  readonly required: number | null
  /** End of the depth axis [m]. */
  readonly greatestDepth: number
  /** Depth of the water now [m]. */
  readonly now: number
  /** Depth to which the section holds; null: it holds at none. */
  readonly holdsTo: number | null
  /** Units in which the ticks are round figures; metric if left out. */
  readonly units?: UnitSystem | undefined
  readonly measure?: MeasureText | undefined
}
