import type { TimeSeries } from '../calc/series/time-series'
import type { DeploymentSettings } from '../schemas/deployment'
import { FORECAST_BANDS, type ForecastBand } from '../schemas/forecast'
import type { Survey } from '../schemas/line-faults'
import type { ScenarioContent } from '../schemas/scenario'
import { lineWorkPlan, type LineWorkPlan, type SectionWork } from './laying-jobs'
import type { LayingForce } from './laying-run'
import { comers, mobilisation, total } from './mobilisation'
import type { Comer, Mobilisation, MobilisingDepot } from './mobilisation'
import { waterArrival } from './water-arrival'

/** Levels through time, by band [m, s since 1970]; a band that is not forecast is left out. */
export type BandLevels = Readonly<Partial<Record<ForecastBand, TimeSeries>>>

export interface DeploymentInput {
  readonly survey: Survey
  readonly content: ScenarioContent
  /** With `decidedAt` said. */
  readonly settings: DeploymentSettings & { readonly decidedAt: number }
  readonly depots: readonly MobilisingDepot[]
  readonly levels: BandLevels
}

/** When the water comes to each section, by band [s]; infinite where it does not. */
export type Deadlines = Readonly<Record<ForecastBand, readonly number[]>>

/** Everything that does not depend on the order. */
export interface Groundwork {
  readonly works: readonly SectionWork[]
  readonly deadlines: Deadlines
  readonly pairs: readonly Comer[]
  readonly blowers: readonly Comer[]
  readonly onSite: number
  readonly layingFrom: number
  readonly force: LayingForce
  readonly moved: Mobilisation
  readonly unlaid: LineWorkPlan['unlaid']
}

/** Works, deadlines and force of a plan [s since 1970]. */
export function groundwork({
  survey,
  content,
  settings,
  depots,
  levels,
}: DeploymentInput): Groundwork {
  const { works, unlaid } = lineWorkPlan(survey, content, settings)
  const moved = mobilisation(depots, settings)
  const first = moved.pairs[0]?.after ?? total(moved)
  const decided = settings.decidedAt / 1000
  const layingFrom = decided + first + settings.clearingTime
  const pairs = comers(moved.pairs, settings.pairs, first)
  const blowers = comers(moved.blowers, settings.blowers, first)
  const force = {
    pairs: pairs.map(({ after }) => Math.max(layingFrom, decided + after)),
    blowers: blowers.map(({ after }) => decided + after),
  }
  const deadlines = deadlinesOf(works, levels, decided)
  return {
    works,
    unlaid,
    moved,
    pairs,
    blowers,
    force,
    deadlines,
    layingFrom,
    onSite: decided + first,
  }
}

function deadlinesOf(works: readonly SectionWork[], levels: BandLevels, from: number): Deadlines {
  const of = (band: ForecastBand) =>
    works.map(({ lowest }) => {
      const series = levels[band]
      return (series && waterArrival(series, lowest.lowestGround, from)) ?? Infinity
    })
  return { low: of('low'), expected: of('expected'), high: of('high') }
}

/** Seconds to the moment that the plan keeps [ms]. */
export function moment(seconds: number): number {
  return Math.round(seconds * 1000)
}

export function byBand<Value>(of: (band: ForecastBand) => Value): Record<ForecastBand, Value> {
  const [low, expected, high] = FORECAST_BANDS
  return { low: of(low), expected: of(expected), high: of(high) }
}
