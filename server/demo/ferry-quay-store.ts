import type { NewDepot, StoreItem } from '../../shared/schemas/depot'
import { newDepotSchema, storeItemSchema } from '../../shared/schemas/depot'
import type { Clock } from '../clock'
import type { DemoSeed } from '../db/demo-seed'
import { makeDepot } from '../modules/depots/depots.service'
import { recordAudit } from '../modules/audit/record-audit'
import { change } from '../modules/projects/deed'
import { DEMO_ORGANISATIONS, DEMO_PEOPLE } from './demo-people'

const MINUTE = 60

function tube(barrierId: string, serviceable: number, inRepair = 0): StoreItem {
  return storeItemSchema.parse({ kind: 'tube', barrierId, serviceable, inRepair })
}

function item(kind: StoreItem['kind'], serviceable: number, more: Partial<StoreItem> = {}) {
  return storeItemSchema.parse({ kind, serviceable, ...more })
}

/** Invented, as everything at Ferry Quay. */
export const MILL_LANE: NewDepot = newDepotSchema.parse({
  name: 'Mill Lane',
  callOutTime: 30 * MINUTE,
  loadTime: 25 * MINUTE,
  driveTime: 15 * MINUTE,
  crews: [
    { crews: 2, people: 2 },
    { crews: 1, people: 2, delay: 60 * MINUTE, note: 'On call' },
  ],
  items: [
    tube('tube-0.50', 6),
    tube('tube-0.70', 10, 1),
    tube('tube-1.00', 5),
    item('closure', 22),
    item('blower', 1),
    item('ballast-bag', 60, { mass: 20 }),
    item('edge-bag', 120, { mass: 20, note: '2 per metre: 60 m of edge' }),
    item('plug', 1, { diameter: 0.15 }),
  ],
})

export const WORKS_YARD: NewDepot = newDepotSchema.parse({
  name: 'Works yard',
  callOutTime: 30 * MINUTE,
  loadTime: 25 * MINUTE,
  driveTime: 35 * MINUTE,
  items: [item('blower', 1)],
  note: '20 minutes more than Mill Lane',
})

/** Ids that other seeds of the demonstration refer to. */
export const FERRY_QUAY_DEPOTS = {
  millLane: 'demo-depot-mill-lane',
  worksYard: 'demo-depot-works-yard',
} as const

/** The store of the firm that leads the demonstration. Seed the people first. */
export function ferryQuayStoreSeed(now: Clock): DemoSeed {
  const { engineerA } = DEMO_PEOPLE
  const keeper = { accountId: engineerA.id, name: engineerA.name }
  return {
    name: 'ferry-quay-store',
    run: (db) =>
      change({ db, now }, keeper, (deed) => {
        const depots = [
          [FERRY_QUAY_DEPOTS.millLane, MILL_LANE],
          [FERRY_QUAY_DEPOTS.worksYard, WORKS_YARD],
        ] as const
        for (const [id, depot] of depots) {
          makeDepot(deed, DEMO_ORGANISATIONS.firm.id, depot, id)
          const subject = { subjectType: 'depot', subjectId: id, subjectName: depot.name }
          recordAudit(deed.tx, deed.by, deed.at, {
            action: 'depot.created',
            ...subject,
            toVersion: 1,
            detail: { seed: 'ferry-quay-store' },
          })
        }
      }),
  }
}
