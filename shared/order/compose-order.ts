import type { Order } from '../schemas/order'
import { forecastOf, headOf, keysOf, timesOf, verdictOf } from './compose-head'
import { airOf, layOf, loadOf, plugsOf, skirtOf } from './compose-laying'
import { ballastOf, cautionsOf, leaveOf, retrieveOf, roundsOf } from './compose-standing'
import type { OrderDocument } from './order-document'
import { orderWords } from './order-words'

/** A frozen order in words, in the order in which they are needed. Same order, same words. */
export function composeOrder(order: Order): OrderDocument {
  const work = { order, words: orderWords(order) }
  return {
    ...headOf(work),
    keys: keysOf(work),
    verdict: verdictOf(work),
    forecast: forecastOf(work),
    times: timesOf(work),
    load: loadOf(work),
    plugs: plugsOf(work),
    skirt: skirtOf(work),
    lay: layOf(work),
    air: airOf(work),
    ballast: ballastOf(work),
    leave: leaveOf(work),
    rounds: roundsOf(work),
    retrieve: retrieveOf(work),
    cautions: cautionsOf(work),
  }
}
