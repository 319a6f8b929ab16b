import type { AirThroughTime } from '../../calc/air/air-through-time'
import type { KnownReading, TimeSeries } from '../../calc/series/time-series'
import type { SectionCase } from '../../schemas/section-case'
import type { KeptChecks } from './kept-checks'

/** One section, and the water that comes to it. SI units; moments in seconds, all from one origin. */
export interface EventInput {
  /**
   * The section. Its depths follow from the levels and its uplift grows with them: `water.depth`,
   * `water.dryDepth` and `uplift.time` are not looked at.
   */
  readonly section: SectionCase
  /** Lowest ground of the section [m], in the datum of the levels. */
  readonly groundLevel: number
  /** Water level on the wet side by time [m]. */
  readonly water: TimeSeries
  /**
   * Level of the pond on the dry side by time [m], one reading or more; before the first and after the
   * last one, that one. Left out: dry.
   */
  readonly pond?: readonly KnownReading[]
  /** Air temperature and leak through the night; left out: the pressure of the case stays. */
  readonly air?: Omit<AirThroughTime, 'airPressure'>
  /** Longest step [s], above 0; every reading is a step of its own as well. */
  readonly step: number
  /** Share of friction resistance and skirt grip that is there, 0 to 1; 1 if left out. */
  readonly gripShare?: number
  /**
   * What the ground under the skirt has seen before the series, where it begins in water, for the
   * growing model: `soaked` (the safe side, if left out) or `dry`.
   */
  readonly groundBefore?: 'dry' | 'soaked'
  /** Time to clear the area [s]; 20 min if left out. */
  readonly timeToClear?: number
  /** Answers that are shared with other sections of the same case and grip; left out: none. */
  readonly kept?: KeptChecks
}
