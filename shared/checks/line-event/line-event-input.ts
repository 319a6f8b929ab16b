import type { AirThroughTime } from '../../calc/air/air-through-time'
import type { KnownReading, TimeSeries } from '../../calc/series/time-series'
import type { ForecastBand } from '../../schemas/forecast'
import type { Survey } from '../../schemas/line-faults'
import type { ScenarioContent } from '../../schemas/scenario'

/** Bands of an event in the order in which they are told; apart from the zod contract. */
export const EVENT_BANDS = ['low', 'expected', 'high'] as const satisfies readonly ForecastBand[]

/** Levels of low, expected and high water by time [m]; moments in seconds, all from one origin. */
export type BandSeries = Readonly<Record<ForecastBand, TimeSeries>>

/** What an event needs beside line, scenario and water. SI units. */
export interface LineEventSettings {
  /** Longest step [s], above 0; every reading is a step of its own as well. */
  readonly step: number
  /** Time to clear the area [s]. */
  readonly timeToClear: number
  /** What the ground has seen where the series begins in water. */
  readonly groundBefore: 'dry' | 'soaked'
  /** Air temperature through the night; null: the pressure of each size stays. */
  readonly air: Omit<AirThroughTime, 'airPressure'> | null
  /**
   * Level of the pond on the dry side by time; null: the dry level of the scenario, from when the water
   * stands as high, or none.
   */
  readonly pond: readonly KnownReading[] | null
}

/** A whole line in one scenario, and the water that comes to it. */
export interface LineEventInput {
  readonly survey: Survey
  readonly content: ScenarioContent
  readonly water: BandSeries
  readonly settings: LineEventSettings
}

/** Bands that differ from what is expected, and what is expected itself. */
export function differingBands(water: BandSeries): readonly ForecastBand[] {
  return EVENT_BANDS.filter(
    (band) => band === 'expected' || !isSameSeries(water[band], water.expected),
  )
}

function isSameSeries(a: TimeSeries, b: TimeSeries): boolean {
  if (a === b) return true
  return (
    a.length === b.length &&
    a.every(({ time, value }, i) => time === b[i]!.time && value === b[i]!.value)
  )
}
