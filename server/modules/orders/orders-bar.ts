import type { Clock } from '../../clock'
import type { DeletionBar } from '../projects/put-away-project.service'
import { countInForce } from './orders.queries'

/** Somebody may be out there working by an order that is in force, so its project stays until then. */
export function ordersBar(now: Clock): DeletionBar {
  return (db, projectId) => {
    const inForce = countInForce(db, projectId, now())
    if (inForce === 0) return null
    const what = inForce === 1 ? 'an order is' : `${inForce} orders are`
    return `This project is not deleted: ${what} in force. Withdraw or wait.`
  }
}
