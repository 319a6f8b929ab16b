import { addMember, as, type ProjectServer, startedProject } from './project-server'
import type { Order } from '../../shared/schemas/order'
import type { OrderItem, OrderState } from '../../shared/schemas/order-api'
import { orders } from '../../server/db/schema'
import { eq } from 'drizzle-orm'

export const HOUR = 3_600_000

/** A project of Engineer A with a gauge that the crew sees, and everybody whom orders need. */
export async function startedOrders(server: ProjectServer) {
  const started = await startedProject(server)
  const { lead, projectPath, line, scenario } = started
  await addMember(server, projectPath, 'engineerB', 'editor')
  await addMember(server, projectPath, 'viewer', 'reader')
  const board = { name: 'Quay board', zero: 0.4, correction: -0.04 }
  const gauge = (await lead.post(`${projectPath}/gauges`, board).expect(201)).body as { id: string }
  const path = `${projectPath}/orders`
  const wanted = (changes: object = {}) => ({
    ...{ lineId: line.id, scenarioId: scenario.id, version: scenario.version },
    ...{ meetAt: 'Slipway head', gaugeId: gauge.id, expiresAt: server.clock.now + 12 * HOUR },
    ...changes,
  })
  const issue = async (changes: object = {}) => {
    const answer = await lead.post(path, wanted(changes))
    if (answer.status !== 201) throw new Error(answer.text)
    return answer.body as OrderItem
  }
  const list = async () =>
    ((await lead.get(path).expect(200)).body as { orders: OrderItem[] }).orders
  const crew = as(server, null)
  const state = async (token: string) =>
    (await crew.get(`/api/orders/${token}`).expect(200)).body as OrderState
  return { ...started, path, wanted, issue, list, crew, state }
}

/** What an order says, as it is kept. */
export function keptOrder({ db }: ProjectServer, id: string): Order {
  return db.select().from(orders).where(eq(orders.id, id)).get()!.content
}
