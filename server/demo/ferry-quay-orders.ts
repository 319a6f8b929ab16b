import { LONGEST_ORDER } from '../../shared/schemas/order-api'
import type { SlowDemoSeed } from '../db/demo-seed'
import { issueOrder } from '../modules/orders/issue-order.service'
import type { OrderWork } from '../modules/orders/order-work'
import { DEMO_PEOPLE } from './demo-people'
import { FERRY_QUAY } from './ferry-quay'

/** The order of the demonstration, issued as any other. Seed project, store and forecast first. */
export function ferryQuayOrdersSeed(work: OrderWork): SlowDemoSeed {
  const { id: accountId, name } = DEMO_PEOPLE.engineerA
  const lineId = FERRY_QUAY.offTheGravel
  return {
    name: 'ferry-quay-orders',
    run: async () => {
      await issueOrder(work, { accountId, name }, FERRY_QUAY.project, {
        ...{ lineId, scenarioId: `${lineId}-edges-weighed`, version: 1 },
        meetAt: 'Slipway head, car park side',
        contact: 'Duty desk, channel 4',
        gaugeId: FERRY_QUAY.boardGauge,
        expiresAt: work.now() + LONGEST_ORDER,
        note: 'The line swings 3 m landward at chainage 142 to 148: stay off the gravel.',
      })
    },
  }
}
