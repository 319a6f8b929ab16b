import type { DeploymentPlan, PlannedLaying, WorstMargin } from '../schemas/deployment'
import type { ForecastBand } from '../schemas/forecast'
import { orderOf } from './chosen-order'
import { byBand, groundwork, moment, type DeploymentInput } from './groundwork'
import type { SectionWork } from './laying-jobs'
import { layInOrder, type LaidJob } from './laying-run'
import type { Comer } from './mobilisation'
import { plannedLaying } from './planned-laying'
import { bagsInStore, windFactor, type BallastInput } from './wind-ballast'
import { leastMargin } from './worst-margin'

/**
 * The deployment plan of a scenario: who lays which section when, the hour at which the water comes
 * to each, and the margins.
 *
 *     T1 = T2 − closure,   T0 = T1 − mobilisation
 *
 * @remarks Nobody begins before the line is cleared, which the first pair does. Everything moves with
 * the decision while the hours of the water stay, so that the latest decision with a wanted margin is
 * exact: decision + worst margin − wanted margin.
 * @throws OutOfRangeError for a gust outside 0 to 60 m/s.
 * @see Environment Agency, Temporary and Demountable Flood Protection Guide (SC080019), for T0 to T2.
 */
export function deploymentPlan(input: DeploymentInput): DeploymentPlan {
  const { settings } = input
  const ground = groundwork(input)
  const { works, unlaid, moved, deadlines, force } = ground
  const { order, outwardFrom } = orderOf(settings, ground)
  const laid = layInOrder(order, works, force)
  const wind = windOf(input)
  const sections = laid.map((one, i) =>
    plannedLaying(one, { position: i + 1, work: works[one.job]!, deadlines, wind }),
  )
  const worst = byBand((band) => worstOf(laid, works, deadlines[band]))
  const latest = (band: ForecastBand, since: number) =>
    worst[band] && moment(since + worst[band].margin - settings.wantedMargin)
  const { depot, callOutTime, loadTime, driveTime } = moved
  return {
    decidedAt: settings.decidedAt,
    mobilisation: { depot, callOutTime, loadTime, driveTime },
    onSite: moment(ground.onSite),
    layingFrom: moment(ground.layingFrom),
    finish: moment(Math.max(ground.layingFrom, ...laid.map(({ finish }) => finish))),
    pairs: shownComers(ground.pairs, settings.decidedAt),
    blowers: shownComers(ground.blowers, settings.decidedAt),
    order: settings.order,
    outwardFrom,
    sections,
    unlaid: unlaid.map(({ from, to }) => ({ from, to })),
    judgedBy: settings.judgedBy,
    worst,
    wantedMargin: settings.wantedMargin,
    decideBy: byBand((band) => latest(band, settings.decidedAt / 1000)),
    layFrom: byBand((band) => latest(band, ground.onSite)),
    ballast: wind && ballastOf(wind, sections),
    crewTime: sum(works.map(({ before, fill, after }) => before + fill + after)),
    waiting: sum(laid.map(({ waited }) => waited)),
  }
}

type Wind = BallastInput & { readonly inStore: number }

function windOf({ survey, content, settings, depots }: DeploymentInput): Wind | null {
  if (settings.gust === null) return null
  const items = depots.flatMap((depot) => depot.items)
  const { sectionLength } = survey
  return { content, sectionLength, gust: settings.gust, ...bagsInStore(items, 'ballast-bag') }
}

function ballastOf({ content, gust, bagMass, inStore }: Wind, sections: readonly PlannedLaying[]) {
  const bags = bagMass === null ? null : sum(sections.map(({ ballast }) => ballast?.bags ?? 0))
  return { gust, requiredFactor: windFactor(content), bagMass, bags, inStore }
}

function sum(values: readonly number[]): number {
  return values.reduce((all, value) => all + value, 0)
}

function shownComers(all: readonly Comer[], decidedAt: number) {
  return all.map(({ after, depot }, i) => ({
    number: i + 1,
    onSite: decidedAt + moment(after),
    depot,
  }))
}

function worstOf(
  laid: readonly LaidJob[],
  works: readonly SectionWork[],
  deadlines: readonly number[],
): WorstMargin | null {
  const least = leastMargin(laid, deadlines)
  if (!least) return null
  const { section, lowest } = works[least.job]!
  return {
    margin: least.margin,
    position: laid.findIndex(({ job }) => job === least.job) + 1,
    from: section.from,
    to: section.to,
    lowestAt: lowest.lowestAt,
  }
}
