import type { z } from 'zod'
import type { newOrderSchema, OrderItem } from '@shared/schemas/order-api'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

export type NewOrder = z.input<typeof newOrderSchema>

/** Where an order is. */
export interface OrderRef {
  readonly projectId: string
  readonly orderId: string
}

const path = (projectId: string) => `${projectPath(projectId)}/orders`
const one = ({ projectId, orderId }: OrderRef) =>
  `${path(projectId)}/${encodeURIComponent(orderId)}`

/** Orders of a line, the newest first. */
export async function fetchOrders(
  projectId: string,
  lineId: string,
  signal?: AbortSignal,
): Promise<readonly OrderItem[]> {
  const query = new URLSearchParams({ lineId }).toString()
  const answer = (await getJson(`${path(projectId)}?${query}`, signal)) as { orders: OrderItem[] }
  return answer.orders
}

export async function issueOrder(projectId: string, order: NewOrder): Promise<OrderItem> {
  return (await sendJson('POST', path(projectId), order)) as OrderItem
}

export async function withdrawOrder(order: OrderRef, reason: string): Promise<OrderItem> {
  return (await sendJson('POST', `${one(order)}/withdrawal`, { reason })) as OrderItem
}

/** Address of the file of an order, and of its QR code. */
export function orderFile(order: OrderRef, form: 'order.pdf' | 'qr.svg'): string {
  return `${one(order)}/${form}`
}
