import { gzipSync } from 'node:zlib'
import { describe, expect, it } from 'vitest'
import { markup } from '../../../server/pages/markup'
import { orderPage } from '../../../server/pages/order/order-page'
import { readPageFiles } from '../../../server/pages/page-files'
import { buildOrder } from '../../../shared/order/build-order'
import type { OrderState } from '../../../shared/schemas/order-api'
import { ferryQuayOrder, floodHour } from '../../support/order-input'

const files = readPageFiles()
const order = buildOrder(ferryQuayOrder())
const token = '7Q4K-19XM-3TRP-8C2D'
const inForce: OrderState = {
  ...{ number: 3, status: 'in-force', expiresAt: order.expiresAt, withdrawnAt: null, reason: '' },
  ...{ replacedBy: null, ticks: [] },
}
const page = (state: Partial<OrderState> = {}) =>
  orderPage({ order, token, state: { ...inForce, ...state } }, files)

describe('the page of an order', () => {
  it('loads 60 kB gzipped at most, with everything that it loads', () => {
    const loaded = [...page().matchAll(/(?:src|href)="(\/order-page\/[^"]+)"/g)].map(
      ([, path]) => path!,
    )
    const style = files.find('order.css')!.bytes.toString('utf8')
    const fonts = [...style.matchAll(/url\('([^']+)'\)/g)].map(([, name]) => files.addressOf(name!))
    const all = [...new Set([...loaded, ...fonts])]
    expect(all.length).toBeGreaterThanOrEqual(3)
    const sizes = all.map((path) => {
      const file = files.find(path.split('/').at(-1)!)
      expect(file, path).toBeDefined()
      return gzipSync(file!.bytes).length
    })
    const state = gzipSync(JSON.stringify(inForce)).length
    const own = gzipSync(page()).length + gzipSync(files.serviceWorker).length + state
    // Headers of seven answers besides, generously.
    const total = own + sizes.reduce((sum, size) => sum + size, 0) + 7 * 600
    expect(total).toBeLessThanOrEqual(60_000)
  })

  it('runs and styles nothing inline, as the policy of the server asks', () => {
    expect(page()).not.toMatch(/<style|<script>|\son[a-z]+=|\sstyle=/)
    expect(page()).not.toMatch(/https?:\/\/(?!www\.w3\.org)/)
  })

  it('says what to lay in which order, when, and at which reading everybody leaves', () => {
    const html = page()
    expect(html).toContain('3.39\u00a0m on Quay board')
    expect(html).toContain('Ch 40 to 50')
    expect(html.indexOf('Ch 40 to 50')).toBeLessThan(html.indexOf('Ch 0 to 10'))
    expect(html).toContain('Tue 01:41')
    expect(html.match(/data-item="section-/g)).toHaveLength(18)
    expect(html.match(/data-item="plug-/g)).toHaveLength(2)
  })

  it.each([
    [{ status: 'expired' } as const, 'This order ran out at Tue 18:00'],
    [
      { status: 'withdrawn', withdrawnAt: floodHour(23.5), reason: 'The river falls' } as const,
      'Withdrawn at Mon 23:30: The river falls',
    ],
    [
      {
        status: 'replaced',
        replacedBy: { number: 4, at: floodHour(23 + 2 / 3), token: 'AAAA-BBBB-CCCC-DDDD' },
      } as const,
      'Replaced by order 4 at Mon 23:40',
    ],
  ])('says so when it is not to be worked by: %o', (state, text) => {
    const html = page(state)
    expect(html).toContain(text)
    if (state.status === 'replaced') expect(html).toContain('href="/order/AAAA-BBBB-CCCC-DDDD"')
  })

  it('prints what somebody typed as words, never as markup', () => {
    const input = ferryQuayOrder()
    const head = { ...input.head, meetAt: '<b onclick="x">Slipway</b>', note: `'"&` }
    const html = orderPage({ order: buildOrder({ ...input, head }), token, state: inForce }, files)
    expect(html).not.toContain('<b onclick')
    expect(html).toContain('&lt;b onclick=&quot;x&quot;&gt;Slipway')
    expect(markup`${`'"&<`}`.toString()).toBe('&#39;&quot;&amp;&lt;')
  })
})
