import type { Request } from 'express'
import {
  newOrderSchema,
  newTicksSchema,
  orderItemSchema,
  orderStateSchema,
  ordersQuerySchema,
  ordersSchema,
  orderWithdrawalSchema,
} from '../../../shared/schemas/order-api'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import { qrCode } from '../../typesetting/qr-code'
import { sendFile } from '../files/send-file'
import { issueOrder } from './issue-order.service'
import { orderOfToken } from './open-order'
import { orderStateOf } from './order-state'
import { takeTicks } from './order-ticks.service'
import { orderAddress, type OrderWork } from './order-work'
import { orderAt, pdfOf, readOrder, readOrders, withdrawOrder } from './orders.service'
import { createTickLimit } from './tick-limit'

const PATH = '/api/projects/:projectId/orders'
const ONE = `${PATH}/:orderId`
const OPEN = '/api/orders/:token'

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  orderId: pathPart(req, 'orderId'),
})

/** Deployment orders: issued in a project, read by whoever holds the token. */
export function ordersOperations(work: OrderWork): readonly Operation[] {
  return [...listOperations(work), ...oneOperations(work), ...openOperations(work)]
}

function listOperations(work: OrderWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listOrders',
      summary: 'Deployment orders, the newest first, with what was ticked off',
      rule: 'read-project',
      query: ordersQuerySchema,
      response: ordersSchema,
      problems: [],
      handle: ({ req }) =>
        readOrders(work, pathPart(req, 'projectId'), parseQuery(ordersQuerySchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'issueOrder',
      summary: 'Issue an order of a scenario in place of the one that stands on its line',
      rule: 'edit-project',
      request: newOrderSchema,
      response: orderItemSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: async ({ req, actor }) => {
        const projectId = pathPart(req, 'projectId')
        const orderId = await issueOrder(work, actor, projectId, parseBody(newOrderSchema, req))
        return readOrder(work, { projectId, orderId })
      },
    }),
  ]
}

function oneOperations(work: OrderWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: `${ONE}/withdrawal`,
      id: 'withdrawOrder',
      summary: 'Take an order back, with the reason that its page then shows',
      rule: 'edit-project',
      request: orderWithdrawalSchema,
      response: orderItemSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) => {
        withdrawOrder(work, actor, placeOf(req), parseBody(orderWithdrawalSchema, req))
        return readOrder(work, placeOf(req))
      },
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/order.pdf`,
      id: 'readOrderPdf',
      summary: 'The order as PDF, the very file that was issued',
      rule: 'read-project',
      mediaType: 'application/pdf',
      problems: [],
      handle: ({ req, res }) =>
        sendFile(res, work.store, pdfOf(orderAt(work.db, placeOf(req)), 'attachment')),
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/qr.svg`,
      id: 'readOrderQr',
      summary: 'The address of the page of an order as a QR symbol',
      rule: 'read-project',
      mediaType: 'image/svg+xml',
      problems: [],
      handle: ({ req, res }) => {
        const { token } = orderAt(work.db, placeOf(req))
        res.type('image/svg+xml').send(qrCode(orderAddress(work.appUrl, token)))
      },
    }),
  ]
}

/** For phones: no account, only the token. */
function openOperations(work: OrderWork): readonly Operation[] {
  const takeOne = createTickLimit(work.now)
  const orderOf = (req: Request) => orderOfToken(work, pathPart(req, 'token'), senderOf(req))
  return [
    defineOperation({
      method: 'get',
      path: OPEN,
      id: 'readOrderState',
      summary: 'Where an order stands, what came in its place, and what was ticked off',
      rule: 'open',
      response: orderStateSchema,
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req }) => orderStateOf(work.db, orderOf(req), work.now()),
    }),
    defineOperation({
      method: 'post',
      path: `${OPEN}/ticks`,
      id: 'sendOrderTicks',
      summary: 'Ticks of a phone; one that is sent again counts once',
      rule: 'open',
      request: newTicksSchema,
      response: orderStateSchema,
      problems: ['not-found', 'conflict', 'out-of-range', 'too-many-requests'],
      handle: ({ req }) => {
        const row = orderOf(req)
        takeOne(row.token)
        return takeTicks(work, row, parseBody(newTicksSchema, req).ticks)
      },
    }),
    defineOperation({
      method: 'get',
      path: `${OPEN}/order.pdf`,
      id: 'readOpenOrderPdf',
      summary: 'The order as PDF for whoever holds its token',
      rule: 'open',
      mediaType: 'application/pdf',
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req, res }) => sendFile(res, work.store, pdfOf(orderOf(req), 'inline')),
    }),
  ]
}
