import { expect, test, type APIRequestContext } from '@playwright/test'
import { DEMO_PASSWORD, DEMO_PEOPLE } from '../../server/demo/demo-people'
import { FERRY_QUAY } from '../../server/demo/ferry-quay'
import type { OrderItem } from '../../shared/schemas/order-api'

const ORDERS = `/api/projects/${FERRY_QUAY.project}/orders`

/** An order of Ferry Quay, issued as the program itself would have it. */
async function issuedOrder(request: APIRequestContext, baseURL: string): Promise<OrderItem> {
  const headers = { Origin: baseURL }
  const { email } = DEMO_PEOPLE.engineerA
  const data = { email, password: DEMO_PASSWORD }
  expect((await request.post('/api/session', { headers, data })).ok()).toBe(true)
  const lineId = FERRY_QUAY.offTheGravel
  const scenarioId = `${lineId}-edges-weighed`
  const path = `/api/projects/${FERRY_QUAY.project}/lines/${lineId}/scenarios/${scenarioId}`
  const { version } = (await (await request.get(path)).json()) as { version: number }
  const wanted = {
    ...{ lineId, scenarioId, version, meetAt: 'Slipway head' },
    ...{ gaugeId: FERRY_QUAY.boardGauge, expiresAt: Date.now() + 12 * 3_600_000 },
  }
  const answer = await request.post(ORDERS, { headers, data: wanted })
  expect(answer.status(), await answer.text()).toBe(201)
  return (await answer.json()) as OrderItem
}

test('an order is used on a phone with the network cut, and its ticks arrive afterwards', async ({
  browser,
  request,
  baseURL,
}) => {
  const order = await issuedOrder(request, baseURL!)
  const phone = await browser.newContext({ viewport: { width: 390, height: 844 }, hasTouch: true })
  const page = await phone.newPage()
  await page.goto(`/order/${order.token}`)
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(
    `Deployment order ${order.number}`,
  )
  await expect(page.locator('#kept')).toHaveText('Kept on this phone')
  expect(await page.evaluate(() => document.documentElement.scrollWidth)).toBe(390)
  await page.getByLabel('Section 1 is done').tap()
  await expect(page.locator('#signal')).toHaveText('Connected')

  await phone.setOffline(true)
  await page.reload()
  await expect(page.getByLabel('Section 1 is done')).toBeChecked()
  await page.getByLabel('Section 2 is done').tap()
  await page.getByLabel('Section 3 is done').tap()
  await expect(page.locator('#signal')).toContainText('No signal')
  await expect(page.locator('#progress')).toContainText('3 of')
  const second = page.locator('.tick', { has: page.getByLabel('Section 2 is done') })
  await expect(second).toContainText(/done \w{3} \d\d:\d\d.* not sent yet/)
  await page.reload()
  await expect(second).toContainText('not sent yet')

  await phone.setOffline(false)
  await expect(second).not.toContainText('not sent yet')
  await expect(page.locator('#signal')).toHaveText('Connected')
  const { orders } = (await (await request.get(ORDERS)).json()) as { orders: OrderItem[] }
  const { ticks } = orders.find(({ id }) => id === order.id)!
  expect(ticks.map(({ item }) => item).sort()).toEqual(['section-1', 'section-2', 'section-3'])

  const next = await issuedOrder(request, baseURL!)
  await page.reload()
  await expect(page.getByRole('alert')).toContainText(`Replaced by order ${next.number} at`)
  await page.getByRole('link', { name: `Open order ${next.number}` }).tap()
  await expect(page.getByRole('heading', { level: 1 })).toHaveText(
    `Deployment order ${next.number}`,
  )
  await phone.close()
})
