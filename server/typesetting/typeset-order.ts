import { sceneToSvg } from '../../shared/drawing/scene-to-svg'
import { localText } from '../../shared/forecast/project-time'
import { composeOrder } from '../../shared/order/compose-order'
import { orderResolver } from '../../shared/order/order-words'
import type { Order } from '../../shared/schemas/order'
import { orderPageTexts } from '../../shared/texts/order-page.en'
import { qrCode } from './qr-code'
import type { Typesetter } from './typesetter'

/** An order, and where its page is. */
export interface IssuedOrder {
  readonly order: Order
  readonly token: string
  /** Address of its page. */
  readonly address: string
}

/** A deployment order as PDF, one or two pages. Same order, same address, same bytes. */
export function typesetOrder(typesetter: Typesetter, issued: IssuedOrder): Buffer {
  return typesetter.typeset('order', { data: orderData(issued) })
}

/** An order as its template reads it: words, the picture as SVG, the address as a QR symbol. */
export function orderData({ order, token, address }: IssuedOrder): unknown {
  const { lay, skirt, ...document } = composeOrder(order)
  const { scene, ...picture } = skirt
  const resolve = orderResolver(order.units)
  return {
    ...document,
    author: order.organisation,
    date: localText(order.issuedAt, order.timeZone).slice(0, 10),
    paper: order.units === 'us' ? 'us-letter' : 'a4',
    language: 'en',
    words: orderPageTexts.word,
    lay: { ...lay, hasTimes: lay.rows.some(({ times }) => times !== '') },
    skirt: {
      ...picture,
      svg: sceneToSvg(scene, { resolve, theme: 'light' }),
      alt: scene.description.map(resolve).join(' '),
    },
    qr: qrCode(address),
    token,
  }
}
