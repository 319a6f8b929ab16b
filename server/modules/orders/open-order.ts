import { readToken } from '../../../shared/order/order-token'
import { beginAttempt } from '../../auth/attempts/attempts'
import { NotFoundError } from '../../errors'
import type { OrderWork } from './order-work'
import { findOrderByToken, type OrderRow } from './orders.queries'

/**
 * The order of a token. Whoever guesses is slowed down; whoever holds one asks as often as they like.
 *
 * @throws NotFoundError; TooManyRequestsError after many tokens that do not exist.
 */
export function orderOfToken(work: OrderWork, typed: string, sender: string): OrderRow {
  const token = readToken(typed.slice(0, 80))
  const row = token === null ? undefined : findOrderByToken(work.db, token)
  if (row) return row
  beginAttempt(work, { purpose: 'order', target: typed.slice(0, 40), sender })
  throw new NotFoundError(
    `token: "${typed.slice(0, 40)}" opens no order. It has sixteen signs in groups of four.`,
  )
}
