import type { OrderForecast, OrderGauge, OrderInput } from '../../../shared/order/order-input'
import { planOfScenario } from '../../../shared/order/plan-of-scenario'
import type { NewOrder } from '../../../shared/schemas/order-api'
import type { ScenarioContent } from '../../../shared/schemas/scenario'
import type { Db } from '../../db/client'
import { ConflictError, NotFoundError } from '../../errors'
import { findShownAccount } from '../accounts/accounts.queries'
import { readProjectStore } from '../depots/depots.service'
import { findForecast } from '../forecasts/forecasts.queries'
import { findGauge } from '../gauges/gauges.queries'
import { openProject } from '../projects/open-project'
import { openScenario } from '../scenarios/open-scenario'
import { shortDatum } from '../sheets/sheet-content'
import { lastOrderNumber } from './orders.queries'

export interface OrderSource {
  readonly input: OrderInput
  readonly scenarioVersion: number
}

/**
 * Reads everything that an order is made from, as it stands now.
 *
 * @throws NotFoundError; ConflictError while something of it is archived, or where the scenario was
 * saved since somebody looked at it.
 */
export function orderSource(
  db: Db,
  { projectId, accountId, at }: { projectId: string; accountId: string; at: number },
  { lineId, scenarioId, version, gaugeId, expiresAt, ...words }: NewOrder,
): OrderSource {
  const project = openProject(db, projectId)
  const { line, scenario } = openScenario(db, { projectId, lineId, scenarioId })
  if (scenario.version !== version) {
    throw new ConflictError(
      `"${scenario.name}" was changed meanwhile: version ${scenario.version} is there, you looked ` +
        `at ${version}. Look at it again, then issue the order.`,
    )
  }
  const { organisation, unitSystem } = findShownAccount(db, accountId)!
  const { stations, sectionLength, marks, ends } = line
  const survey = { stations, sectionLength, marks, ends }
  const { content } = scenario
  const resting = restingOf(db, content)
  const { depots } = readProjectStore(db, projectId)
  return {
    scenarioVersion: scenario.version,
    input: {
      head: {
        number: lastOrderNumber(db, projectId) + 1,
        organisation: organisation.name,
        project: { name: project.name, site: project.site },
        line: line.name,
        scenario: scenario.name,
        datum: shortDatum(project.datum),
        timeZone: project.timeZone,
        units: unitSystem,
        issuedAt: at,
        expiresAt,
        ...words,
      },
      ...{ survey, content, resting },
      gauge: gaugeOf(db, projectId, gaugeId),
      plan: planOfScenario({
        ...{ survey, content, depots, now: at },
        forecast: resting?.forecast ?? null,
      }),
    },
  }
}

/**
 * The issue that the scenario rests on, as it is now: with every level that was observed since. Null
 * where the level was entered, or the issue is gone.
 */
function restingOf(db: Db, { forecast: rest = null }: ScenarioContent): OrderForecast | null {
  const forecast = rest === null ? undefined : findForecast(db, rest.gaugeId, rest.forecastId)
  return rest !== null && forecast ? { forecast, band: rest.band } : null
}

function gaugeOf(db: Db, projectId: string, gaugeId: string | null): OrderGauge | null {
  if (gaugeId === null) return null
  const gauge = findGauge(db, projectId, gaugeId)
  if (!gauge) throw new NotFoundError(`gauge: "${gaugeId}" does not exist in this project`)
  const { name, zero, correction } = gauge
  return { name, zero, correction }
}
