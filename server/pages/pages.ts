import type { Request, RequestHandler, Response } from 'express'
import { orderPageTexts } from '../../shared/texts/order-page.en'
import { NotFoundError, TooManyRequestsError } from '../errors'
import { senderOf } from '../http/sender'
import { orderOfToken } from '../modules/orders/open-order'
import { orderStateOf } from '../modules/orders/order-state'
import type { OrderWork } from '../modules/orders/order-work'
import { messagePage } from './order/document'
import { orderPage } from './order/order-page'
import { FILES_PATH, type PageFiles, readPageFiles, WORKER_PATH } from './page-files'

/**
 * Pages that the server writes itself, for phones with little signal: no application, no account. The
 * service worker of the whole origin is served here, at its root. As the built page of the program they
 * are no part of the API.
 */
export function pages(work: OrderWork): RequestHandler {
  const files = readPageFiles()
  return (req, res, next) => {
    const isRead = req.method === 'GET' || req.method === 'HEAD'
    const token = /^\/order\/([^/]+)$/.exec(req.path)?.[1]
    if (!isRead) next()
    else if (token !== undefined) sendOrder(work, files, { token, req, res })
    else if (req.path === WORKER_PATH) sendWorker(files, res)
    else if (req.path.startsWith(`${FILES_PATH}/`)) sendPageFile(files, req, res)
    else next()
  }
}

function sendWorker(files: PageFiles, res: Response): void {
  res.set({ 'Cache-Control': 'no-cache', 'Content-Type': 'text/javascript; charset=utf-8' })
  res.send(files.serviceWorker)
}

interface Opening {
  readonly token: string
  readonly req: Request
  readonly res: Response
}

/** Whoever opens an order gets a page, whatever is wrong: not everybody reads JSON. */
function sendOrder(work: OrderWork, files: PageFiles, { token, req, res }: Opening): void {
  res.set({ 'Cache-Control': 'no-cache', 'Referrer-Policy': 'no-referrer' })
  const { unknownTitle, unknown, slow } = orderPageTexts.page
  try {
    const row = orderOfToken(work, token, senderOf(req))
    const state = orderStateOf(work.db, row, work.now())
    res.type('html').send(orderPage({ order: row.content, token: row.token, state }, files))
  } catch (error) {
    if (error instanceof NotFoundError) {
      res
        .status(404)
        .type('html')
        .send(messagePage(unknownTitle, unknown, files))
    } else if (error instanceof TooManyRequestsError) {
      res.status(429).set('Retry-After', String(error.retryAfter))
      res.type('html').send(messagePage(unknownTitle, slow, files))
    } else {
      throw error
    }
  }
}

/** Files keep their address only while they stay as they are, so they are kept for ever. */
function sendPageFile(files: PageFiles, req: Request, res: Response): void {
  const [version = '', name = '', ...more] = req.path.slice(FILES_PATH.length + 1).split('/')
  const file = more.length === 0 ? files.find(name) : undefined
  if (!file) throw new NotFoundError(`${req.path}: there is nothing at this address`)
  const isThisVersion = version === files.version
  const keep = isThisVersion ? 'public, max-age=31536000, immutable' : 'no-cache'
  res.set({ 'Cache-Control': keep, 'Content-Type': file.mediaType })
  res.send(file.bytes)
}
