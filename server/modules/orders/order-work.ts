import type { SheetWork } from '../sheets/sheet-work'

/** What the services of orders work with. */
export type OrderWork = Pick<SheetWork, 'db' | 'now' | 'store' | 'appUrl' | 'keyedHash'>

export interface OrderPlace {
  readonly projectId: string
  readonly orderId: string
}

/** Address of the page of an order, as its QR code holds it. */
export function orderAddress(appUrl: string, token: string): string {
  return new URL(`/order/${token}`, appUrl).href
}
