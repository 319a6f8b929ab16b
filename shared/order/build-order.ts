import { laidSections, layoutBill } from '../checks/layout/layout-bill'
import { checkLine, type HoldingProfiles, type LineAnswer } from '../checks/line-check'
import { waterWays } from '../checks/water-ways'
import { OutOfRangeError } from '../errors'
import type { DeploymentPlan } from '../schemas/deployment'
import { orderSchema, type Order } from '../schemas/order'
import { orderAir } from './order-air'
import { orderForecast, staged } from './order-forecast'
import type { OrderInput } from './order-input'
import { orderLeave } from './order-leave'
import { orderSections, unlaidStretches } from './order-sections'

/** Time between two rounds along a standing line: 30 min [s]. Common practice, no source. */
export const ROUND_EVERY = 1800

/**
 * What a deployment order says: scenario, layout and plan computed once more, here, and put into the
 * order of the work. Same input, same order.
 *
 * @param profiles See `checkLine`.
 * @throws OutOfRangeError where nothing at all is laid.
 */
export function buildOrder(input: OrderInput, profiles?: HoldingProfiles): Order {
  const { head, survey, content, gauge, resting, plan } = input
  const laid = laidSections(survey, content)
  if (laid.every(({ run }) => run === null)) throw nothingLaid()
  const answer = checkLine(survey, content, profiles)
  const { sectionLength } = survey
  const answers = answer.sections
  const leave = orderLeave(content, answer, resting)
  return orderSchema.parse({
    ...head,
    waterLevel: staged(content.waterLevel, gauge),
    forecast: orderForecast(resting, gauge),
    gauge: gauge && { name: gauge.name, zero: gauge.zero },
    times: timesOf(plan),
    store: storeOf(input),
    air: orderAir(content, laid, answers),
    plugs: plugsOf(input),
    sections: orderSections({ content, sectionLength, laid, answers, plan }),
    unlaid: unlaidStretches(laid),
    ...verdictOf(answer, gauge),
    leave: { ...leave, stage: leave.level === null ? null : staged(leave.level, gauge).stage },
    rounds: { every: ROUND_EVERY },
  })
}

function nothingLaid(): OutOfRangeError {
  const allowed = 'a size on one section of the line or more'
  const message = `content.sizes: no section is laid; it must be ${allowed}`
  return new OutOfRangeError([{ path: 'content.sizes', value: [], allowed, unit: '–', message }])
}

function verdictOf({ verdict, weakest }: LineAnswer, gauge: OrderInput['gauge']) {
  const { holdsToLevel, place } = weakest
  const holdsTo = holdsToLevel === null ? null : staged(holdsToLevel, gauge)
  return { verdict, holdsTo, weakestAt: place }
}

const NO_TIMES = {
  ...{ decideBy: null, onSite: null, startBy: null, layingFrom: null, finish: null },
  ...{ firstWater: null, wantedMargin: null, worstMargin: null, worstAt: null },
}

function timesOf(plan: DeploymentPlan | null): Order['times'] {
  if (!plan) return NO_TIMES
  const { judgedBy: band, onSite, layingFrom, finish, wantedMargin } = plan
  const arrivals = plan.sections.flatMap(({ deadline }) => deadline[band] ?? [])
  const worst = plan.worst[band]
  return {
    decideBy: plan.decideBy[band],
    startBy: plan.layFrom[band],
    ...{ onSite, layingFrom, finish, wantedMargin },
    firstWater: arrivals.length === 0 ? null : Math.min(...arrivals),
    worstMargin: worst?.margin ?? null,
    worstAt: worst?.from ?? null,
  }
}

function storeOf({ survey, content, plan }: OrderInput): Order['store'] {
  const bill = layoutBill(survey, content)
  return {
    depot: plan?.mobilisation.depot ?? null,
    pairs: plan?.pairs.length ?? null,
    blowers: plan?.blowers.length ?? null,
    closures: bill.closures,
    edgeBags: bill.edgeBags,
    ballastBags: plan?.ballast?.bags ?? null,
    ballastInStore: plan?.ballast?.inStore ?? null,
    gust: plan?.ballast?.gust ?? null,
  }
}

function plugsOf({ survey, content }: OrderInput): Order['plugs'] {
  return waterWays(survey, content).map(({ at, mark, kind, chainage, standing, shortBy }) => {
    const found = mark === null ? null : survey.marks[mark]!
    return {
      kind,
      isEnd: at !== 'mark',
      chainage,
      offset: found?.offset ?? null,
      diameter: found?.diameter ?? null,
      shortBy,
      flows: standing === 'flows',
      note: found?.note ?? '',
    }
  })
}
