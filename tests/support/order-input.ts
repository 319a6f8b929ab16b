import { LOW_ROAD_ENDS, LOW_ROAD_MARKS } from '../../server/demo/ferry-quay-marks'
import { OFF_THE_GRAVEL_STATIONS } from '../../server/demo/ferry-quay-lines'
import { LOW_ROAD_SCENARIOS } from '../../server/demo/ferry-quay-scenarios'
import { MILL_LANE, WORKS_YARD } from '../../server/demo/ferry-quay-store'
import { deploymentPlan } from '../../shared/deployment/deployment-plan'
import { bandSeries } from '../../shared/forecast/forecast-series'
import { forecastCrest } from '../../shared/forecast/crest'
import type { OrderInput } from '../../shared/order/order-input'
import { deploymentSettingsSchema } from '../../shared/schemas/deployment'
import type { Forecast } from '../../shared/schemas/forecast'
import type { ScenarioContent } from '../../shared/schemas/scenario'

const HOUR = 3_600_000

/** Midnight before the flood of the demonstration, UTC. */
export const FLOOD_DAY = Date.UTC(2031, 2, 3)
export const floodHour = (hour: number): number => FLOOD_DAY + hour * HOUR

/** Knots of the invented hydrograph from 22:00 on: hours since midnight, levels in Quay datum. */
const KNOTS: readonly (readonly [number, number])[] = [
  ...([
    [22, 2.34],
    [23, 2.43],
    [24, 2.54],
    [25, 2.68],
    [26, 2.84],
    [27, 3],
    [28, 3.16],
  ] as const),
  ...([
    [29, 3.29],
    [30, 3.38],
    [30.5, 3.41],
    [31, 3.42],
    [31.5, 3.42],
    [32, 3.4],
  ] as const),
  ...([
    [33, 3.34],
    [34, 3.25],
    [36, 3.06],
    [38, 2.9],
    [40, 2.76],
    [42, 2.63],
    [44, 2.53],
  ] as const),
]

const readings = KNOTS.map(([hour, expected]) => {
  const band = hour >= 25 ? 0.12 : 0
  return { time: floodHour(hour), expected, low: expected - band, high: expected + band }
})

/** The forecast of the lock, issued at 21:45. */
export const LOCK_FORECAST: Forecast = {
  id: 'forecast-lock',
  gaugeId: 'gauge-lock',
  origin: 'typed',
  issuedAt: floodHour(21.75),
  note: '',
  call: null,
  gauge: { name: 'Lock', zero: 0.6, correction: -0.04 },
  readings,
  observed: [],
  shift: null,
  crest: forecastCrest({ readings, observed: [] }),
  createdAt: floodHour(21.8),
  createdBy: { id: 'engineer-a', name: 'Engineer A' },
}

const survey = {
  stations: OFF_THE_GRAVEL_STATIONS,
  sectionLength: 10,
  marks: [...LOW_ROAD_MARKS],
  ends: LOW_ROAD_ENDS,
}

/** "Edges weighed where needed", as the demonstration has it. */
export const WEIGHED: ScenarioContent = LOW_ROAD_SCENARIOS.find(
  ({ key }) => key === 'edges-weighed',
)!.content

/** The plan decided at 22:10 with two pairs and one blower, from the slipway outward. */
export function ferryQuayPlan(content: ScenarioContent = WEIGHED) {
  const settings = deploymentSettingsSchema.parse({
    decidedAt: floodHour(22 + 1 / 6),
    order: 'outward',
    gust: 9,
  })
  const levels = {
    low: bandSeries(readings, 'low'),
    expected: bandSeries(readings, 'expected'),
    high: bandSeries(readings, 'high'),
  }
  const depots = [MILL_LANE, WORKS_YARD]
  return deploymentPlan({
    survey,
    content,
    settings: { ...settings, decidedAt: settings.decidedAt! },
    depots,
    levels,
  })
}

const PLAN = ferryQuayPlan()

/** Everything that the order of Ferry Quay is made from. */
export function ferryQuayOrder(changes: Partial<OrderInput> = {}): OrderInput {
  return {
    head: {
      number: 3,
      organisation: 'Harbour Engineers',
      project: { name: 'Ferry Quay', site: 'Quay and Low road, right bank' },
      line: 'Low road, off the gravel',
      scenario: 'Edges weighed where needed',
      datum: 'QD',
      timeZone: 'UTC',
      units: 'metric',
      issuedAt: floodHour(22.25),
      expiresAt: floodHour(42),
      meetAt: 'Slipway head, car park side',
      contact: 'Duty desk, channel 4',
      note: '',
    },
    survey,
    content: WEIGHED,
    gauge: { name: 'Quay board', zero: 0, correction: 0 },
    resting: { forecast: LOCK_FORECAST, band: 'expected' },
    plan: PLAN,
    ...changes,
  }
}
