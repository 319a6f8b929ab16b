import type { DeploymentPlan } from '../schemas/deployment'
import type { Forecast, ForecastBand } from '../schemas/forecast'
import type { Survey } from '../schemas/line-faults'
import type { LineEnds, LineMark } from '../schemas/mark'
import type { Order } from '../schemas/order'
import type { ScenarioContent } from '../schemas/scenario'

/** A gauge as an order names it. */
export interface OrderGauge {
  readonly name: string
  /** Gauge zero in the datum of the project [m]. */
  readonly zero: number
  /** Level at the line less level at the gauge [m]. */
  readonly correction: number
}

/** The forecast issue that a scenario rests on, and which band its level is the crest of. */
export interface OrderForecast {
  readonly forecast: Forecast
  readonly band: ForecastBand
}

/** Everything that an order is made from. */
export interface OrderInput {
  readonly head: Pick<
    Order,
    | 'number'
    | 'organisation'
    | 'project'
    | 'line'
    | 'scenario'
    | 'datum'
    | 'timeZone'
    | 'units'
    | 'issuedAt'
    | 'expiresAt'
    | 'meetAt'
    | 'contact'
    | 'note'
  >
  readonly survey: Survey & { readonly marks: readonly LineMark[]; readonly ends: LineEnds }
  readonly content: ScenarioContent
  /** Gauge that the crew can see; null: none. */
  readonly gauge: OrderGauge | null
  /** Null: the level was entered and rests on no forecast. */
  readonly resting: OrderForecast | null
  /** Null: nothing is planned yet; the order then has no times. */
  readonly plan: DeploymentPlan | null
}
