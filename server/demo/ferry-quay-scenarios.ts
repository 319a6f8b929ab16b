import { BARRIERS } from '../../shared/catalogue/barriers'
import { GROUNDS } from '../../shared/catalogue/grounds'
import {
  scenarioContentSchema,
  type ScenarioContent,
  type SizeRun,
} from '../../shared/schemas/scenario'

import { FERRY_QUAY_NOW, LOCK_ISSUE } from './ferry-quay-forecast'
import { FERRY_QUAY } from './ferry-quay-ids'

export interface DemoScenario {
  /** Ending of the id; the line stands before it. */
  readonly key: string
  readonly name: string
  readonly note: string
  readonly content: ScenarioContent
}

/** Weighed with sandbags, the edge lets half of the head through. */
const WEIGHED = 0.5

/** 0.13 m in an hour, the steepest of the forecast [m/s]. */
const RISE = 0.13 / 3600

/** The crest of the forecast of 21:45. */
const RESTS_ON = {
  gaugeId: FERRY_QUAY.lockGauge,
  forecastId: LOCK_ISSUE.id,
  issuedAt: LOCK_ISSUE.issuedAt,
  band: 'expected',
  shiftedAt: FERRY_QUAY_NOW,
} as const

/** Decided at 22:10, in a light wind; two pairs with one blower, from the lower end. */
const PLAN = { decidedAt: Date.UTC(2031, 2, 3, 22, 10), gust: 9 }

/** A tube of the catalogue from chainage to chainage; the edge is open unless it says otherwise. */
function run(
  id: 'tube-0.50' | 'tube-0.70' | 'tube-1.00',
  from: number,
  to: number,
  edgeFactor: number | null = null,
): SizeRun {
  const { id: catalogueId, isExample: _, ...barrier } = BARRIERS.find((tube) => tube.id === id)!
  const name = `Tube ${id.slice('tube-'.length)} m`
  return { from, to, barrier: { ...barrier, name, catalogueId, catalogueRevision: 1 }, edgeFactor }
}

function content(
  sizes: readonly SizeRun[],
  place: number,
  changes: Partial<ScenarioContent> = {},
): ScenarioContent {
  const parsed = scenarioContentSchema.parse({
    waterLevel: 3.42,
    forecast: RESTS_ON,
    levelNow: 2.34,
    levelLow: 3.3,
    levelHigh: 3.54,
    place,
    sizes,
    grounds: GROUNDS.map(({ id, friction, permeability, layerThickness, isSuitable }) => ({
      surface: id,
      ...{ friction, permeability, layerThickness },
      suitable: isSuitable,
    })),
    rateOfRise: RISE,
    deployment: PLAN,
  })
  return { ...parsed, ...changes }
}

const OPEN_LAYOUT = [
  run('tube-0.50', 0, 20),
  run('tube-0.70', 20, 40),
  run('tube-1.00', 40, 90),
  run('tube-0.70', 90, 160),
  run('tube-0.50', 160, 180),
]

const WEIGHED_LAYOUT = [
  run('tube-0.50', 0, 20),
  run('tube-0.70', 20, 40),
  run('tube-1.00', 40, 60, WEIGHED),
  run('tube-1.00', 60, 90),
  run('tube-0.70', 90, 120, WEIGHED),
  run('tube-0.70', 120, 160),
  run('tube-0.50', 160, 180),
]

/** The same four on Low road as it was surveyed, and on the line that swings off the gravel. */
export const LOW_ROAD_SCENARIOS: readonly DemoScenario[] = [
  {
    key: 'as-asked',
    name: 'As asked: 0.70 m on Low road',
    note: 'The question of the telephone: a 0.70 m tube everywhere against 3.42 QD, edges open.',
    content: content([run('tube-0.70', 0, 180)], 60),
  },
  {
    key: 'open-edge',
    name: 'Open edge, best layout',
    note: 'Each size where it serves best, all five 1.00 m tubes in use. The turn at ch 60 and the slipway decide.',
    content: content(OPEN_LAYOUT, 45),
  },
  {
    key: 'edges-weighed',
    name: 'Edges weighed where needed',
    note: 'The same tubes; skirt edges weighed with sandbags at ch 40 to 60 and ch 90 to 120.',
    content: content(WEIGHED_LAYOUT, 45),
  },
  {
    key: 'upper-band',
    name: 'Upper band 3.54',
    note: 'The upper end of the forecast band on the best layout: what then, and when does everybody leave?',
    content: content(WEIGHED_LAYOUT, 45, {
      waterLevel: 3.54,
      forecast: { ...RESTS_ON, band: 'high' },
    }),
  },
]

export const BEHIND_THE_KERB_SCENARIOS: readonly DemoScenario[] = [
  {
    key: 'kerb',
    name: 'Behind the kerb, 0.70 m',
    note: 'The shorter way, on higher ground: does it do with the middle size?',
    content: content([run('tube-0.70', 0, 32.31)], 20),
  },
]
