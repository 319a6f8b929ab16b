import type { OrderStatus } from '../schemas/order-api'

/** What of an order decides where it stands. */
export interface OrderDates {
  readonly expiresAt: number
  readonly withdrawnAt: number | null
  readonly replacedAt: number | null
}

/** Where an order stands at a moment [ms]: taken back counts before replaced, and both before expired. */
export function orderStatus(
  { expiresAt, withdrawnAt, replacedAt }: OrderDates,
  at: number,
): OrderStatus {
  if (withdrawnAt !== null) return 'withdrawn'
  if (replacedAt !== null) return 'replaced'
  return at >= expiresAt ? 'expired' : 'in-force'
}
