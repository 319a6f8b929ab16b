import { z } from 'zod'
import { momentSchema } from './paging'
import { VERDICTS } from './section-result'

/** Where an order stands. */
export const ORDER_STATUSES = ['in-force', 'expired', 'replaced', 'withdrawn'] as const
export type OrderStatus = (typeof ORDER_STATUSES)[number]

/** An order lasts for so long at most [ms]: 30 days. */
export const LONGEST_ORDER = 30 * 24 * 3_600_000

/** Most ticks that one order keeps: each section taken and untaken many times over. */
export const MOST_TICKS = 5000

/** `POST /api/projects/:projectId/orders` */
export const newOrderSchema = z.strictObject({
  lineId: z.string().min(1).max(80),
  scenarioId: z.string().min(1).max(80),
  version: z
    .number()
    .int()
    .min(1)
    .meta({ description: 'Version of the scenario that was looked at' }),
  meetAt: z.string().trim().min(1).max(200).meta({ description: 'Where the crews meet' }),
  contact: z.string().trim().max(200).default('').meta({ description: 'Whom to call' }),
  gaugeId: z
    .string()
    .max(80)
    .nullable()
    .default(null)
    .meta({ description: 'Gauge that the crew can see; null: none' }),
  expiresAt: momentSchema,
  note: z.string().trim().max(1000).default(''),
})
export type NewOrder = z.output<typeof newOrderSchema>

/** What a tick is about: a section or a plug, by its place in the order. */
export const tickItemSchema = z.string().regex(/^(?:section|plug)-[1-9]\d{0,3}$/)

/** A tick as a phone sends it, again and again until it is taken. */
export const newTickSchema = z.strictObject({
  id: z
    .string()
    .regex(/^[\w-]{8,64}$/)
    .meta({ description: 'Made by the phone; the same tick comes with the same id' }),
  item: tickItemSchema,
  isDone: z.boolean(),
  at: momentSchema.min(0).max(4_102_444_800_000).meta({ description: 'By the clock of the phone' }),
})
export type NewTick = z.output<typeof newTickSchema>

/** `POST /api/orders/:token/ticks` */
export const newTicksSchema = z.strictObject({ ticks: z.array(newTickSchema).min(1).max(200) })

/** What was last said of an item. */
export const tickSchema = z.strictObject({
  item: z.string(),
  isDone: z.boolean(),
  at: momentSchema,
  receivedAt: momentSchema,
})
export type Tick = z.output<typeof tickSchema>

/** The order that came in place of another one. */
const successorSchema = z.strictObject({
  number: z.number().int(),
  at: momentSchema,
  token: z.string(),
})

/** `GET /api/orders/:token`: what a phone asks for again and again. */
export const orderStateSchema = z
  .strictObject({
    number: z.number().int(),
    status: z.enum(ORDER_STATUSES),
    expiresAt: momentSchema,
    withdrawnAt: momentSchema.nullable(),
    reason: z.string(),
    replacedBy: successorSchema.nullable(),
    ticks: z.array(tickSchema),
  })
  .meta({ id: 'OrderState' })
export type OrderState = z.output<typeof orderStateSchema>

/** Row of `GET /api/projects/:projectId/orders`. */
export const orderItemSchema = orderStateSchema
  .extend({
    id: z.string(),
    token: z.string(),
    address: z.string().meta({ description: 'Of the page for phones' }),
    lineId: z.string(),
    line: z.string(),
    scenarioId: z.string(),
    scenario: z.string(),
    scenarioVersion: z.number().int(),
    verdict: z.enum(VERDICTS),
    waterLevel: z.number().meta({ unit: 'm' }),
    leaveLevel: z.number().nullable().meta({ unit: 'm' }),
    meetAt: z.string(),
    sections: z.number().int(),
    pages: z.number().int(),
    issuedAt: momentSchema,
    issuedBy: z.strictObject({ id: z.string(), name: z.string() }),
  })
  .meta({ id: 'Order' })
export type OrderItem = z.output<typeof orderItemSchema>
export const ordersSchema = z.strictObject({ orders: z.array(orderItemSchema) })

/** `GET /api/projects/:projectId/orders`, newest first. */
export const ordersQuerySchema = z.object({
  lineId: z.string().max(80).default('').meta({ description: 'Orders of one line; empty: of all' }),
})

/** `POST /api/projects/:projectId/orders/:orderId/withdrawal` */
export const orderWithdrawalSchema = z.strictObject({
  reason: z.string().trim().min(1).max(300),
})
