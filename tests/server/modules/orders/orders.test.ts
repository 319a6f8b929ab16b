import { execFileSync } from 'node:child_process'
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { describe, expect, it, onTestFinished } from 'vitest'
import type { OrderItem, OrderState } from '../../../../shared/schemas/order-api'
import { bodyBytes } from '../../../support/body-bytes'
import { HOUR, keptOrder, startedOrders } from '../../../support/orders'
import { as, projectServer } from '../../../support/project-server'

const tick = (id: string, changes: object = {}) => ({
  ...{ id, item: 'section-1', isDone: true, at: 1_930_000_000_000 },
  ...changes,
})

function textOf(pdf: Buffer): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-order-'))
  onTestFinished(() => rmSync(folder, { recursive: true }))
  const file = join(folder, 'order.pdf')
  writeFileSync(file, pdf)
  // Spaces that do not break come out of some readers as they are.
  return execFileSync('pdftotext', ['-layout', file, '-'], { encoding: 'utf8' }).replaceAll(
    '\u00a0',
    ' ',
  )
}

describe('orders of a project', () => {
  it('are issued by editors, read by members, and hidden from everybody else', async () => {
    const server = projectServer()
    const { path, wanted, issue } = await startedOrders(server)
    await as(server, 'viewer').post(path, wanted()).expect(403)
    await as(server, 'checker').get(path).expect(404)
    const order = await issue()
    expect(order).toMatchObject({
      number: 1,
      status: 'in-force',
      sections: 2,
      meetAt: 'Slipway head',
    })
    expect(order.address).toBe(`https://toehold.test/order/${order.token}`)
    expect(order.token).toMatch(/^([0-9A-HJKMNP-TV-Z]{4}-){3}[0-9A-HJKMNP-TV-Z]{4}$/)
    await as(server, 'viewer').get(path).expect(200)
    await as(server, 'engineerB').get(`${path}/${order.id}/order.pdf`).expect(200)
    const qr = await as(server, 'viewer').get(`${path}/${order.id}/qr.svg`).expect(200)
    expect(qr.type).toBe('image/svg+xml')
  })

  it('are numbered, and the new one of a line replaces the former', async () => {
    const server = projectServer()
    const { issue, list, state } = await startedOrders(server)
    const first = await issue()
    server.clock.now += HOUR
    const second = await issue({ meetAt: 'Car park' })
    expect(second.number).toBe(2)
    expect((await list()).map(({ number, status }) => [number, status])).toEqual([
      [2, 'in-force'],
      [1, 'replaced'],
    ])
    const { status, replacedBy } = await state(first.token)
    expect(status).toBe('replaced')
    expect(replacedBy).toEqual({ number: 2, at: server.clock.now, token: second.token })
  })

  it('stay as they were issued while their scenario changes', async () => {
    const server = projectServer()
    const { lead, scenarioPath, scenario, issue, path } = await startedOrders(server)
    const order = await issue()
    const before = keptOrder(server, order.id)
    const pdf = () => bodyBytes(lead.get(`${path}/${order.id}/order.pdf`))
    const bytes = await pdf()
    const content = { ...scenario.content, waterLevel: 3.3 }
    await lead.put(scenarioPath, { name: scenario.name, note: '', content, version: 1 }).expect(200)
    expect(keptOrder(server, order.id)).toEqual(before)
    expect((await pdf()).equals(bytes)).toBe(true)
    await lead.post(path, {}).expect(400)
    const stale = await lead.post(path, { ...wantedOf(order), expiresAt: server.clock.now + HOUR })
    expect(stale.status).toBe(409)
    expect(stale.body).toMatchObject({ message: expect.stringContaining('version 2 is there') })
  })

  it('expire, are withdrawn once, and say why', async () => {
    const server = projectServer()
    const { lead, path, issue, state } = await startedOrders(server)
    const order = await issue()
    server.clock.now += 12 * HOUR
    expect((await state(order.token)).status).toBe('expired')
    const withdrawal = `${path}/${order.id}/withdrawal`
    await lead.post(withdrawal, { reason: '' }).expect(400)
    await as(server, 'viewer').post(withdrawal, { reason: 'No' }).expect(403)
    const answer = await lead.post(withdrawal, { reason: 'The river falls' }).expect(200)
    expect((answer.body as OrderItem).status).toBe('withdrawn')
    expect(await state(order.token)).toMatchObject({
      status: 'withdrawn',
      reason: 'The river falls',
    })
    await lead.post(withdrawal, { reason: 'Again' }).expect(409)
  })

  it.each([
    ['in the past', -1],
    ['more than 30 days ahead', 31 * 24 * HOUR],
  ])('do not expire %s', async (_what, after) => {
    const server = projectServer()
    const { lead, path, wanted } = await startedOrders(server)
    const answer = await lead.post(path, wanted({ expiresAt: server.clock.now + after }))
    expect(answer.status).toBe(422)
    expect(answer.body).toMatchObject({ fields: [{ path: 'expiresAt' }] })
  })

  it('keep their archived project from being deleted until they have run out', async () => {
    const server = projectServer()
    const { lead, projectPath, issue } = await startedOrders(server)
    await issue()
    await lead.post(`${projectPath}/archive`).expect(200)
    const refused = await lead.delete(projectPath)
    expect(refused.status).toBe(409)
    expect(refused.body).toMatchObject({ message: expect.stringContaining('in force') })
    server.clock.now += 13 * HOUR
    await lead.delete(projectPath).expect(204)
  })
})

function wantedOf({ lineId, scenarioId }: OrderItem) {
  return { lineId, scenarioId, version: 1, meetAt: 'Slipway head' }
}

describe('ticks of a phone', () => {
  it('count once however often they are sent, and the last one of an item counts', async () => {
    const server = projectServer()
    const { issue, crew, list } = await startedOrders(server)
    const { token } = await issue()
    const send = async (ticks: object[]) =>
      (await crew.post(`/api/orders/${token}/ticks`, { ticks }).expect(200)).body as OrderState
    const first = tick('phone-a-0001')
    expect((await send([first])).ticks).toHaveLength(1)
    expect((await send([first, first])).ticks).toHaveLength(1)
    const later = tick('phone-a-0002', { isDone: false, at: first.at + 1000 })
    const early = tick('phone-b-0001', { at: first.at - 1000 })
    await send([later])
    await send([early])
    const [order] = await list()
    expect(order!.ticks).toEqual([
      { item: 'section-1', isDone: false, at: later.at, receivedAt: server.clock.now },
    ])
  })

  it('are refused for what the order does not have, and slowed down when they pour in', async () => {
    const server = projectServer()
    const { issue, crew } = await startedOrders(server)
    const { token } = await issue()
    const send = (ticks: object[]) => crew.post(`/api/orders/${token}/ticks`, { ticks })
    const refused = await send([tick('phone-a-0001', { item: 'section-3' })])
    expect(refused.status).toBe(422)
    expect(refused.body).toMatchObject({ fields: [{ path: 'ticks[0].item', value: 'section-3' }] })
    await send([tick('short')]).expect(400)
    const statuses = []
    for (let i = 0; i < 60; i += 1) statuses.push((await send([tick('phone-a-0002')])).status)
    expect(statuses.at(-1)).toBe(429)
    server.clock.now += 2000
    await send([tick('phone-a-0002')]).expect(200)
  })

  it('need a token that exists: guessing is slowed down, asking with a token is not', async () => {
    const server = projectServer()
    const { issue, crew, state } = await startedOrders(server)
    const { token } = await issue()
    const statuses = []
    for (let i = 0; i < 40; i += 1) {
      statuses.push((await crew.get(`/api/orders/0000-0000-0000-${1000 + i}`)).status)
    }
    expect(statuses[0]).toBe(404)
    expect(statuses.at(-1)).toBe(429)
    expect((await state(token.toLowerCase().replaceAll('-', ''))).number).toBe(1)
  })
})

describe('the file of an order', () => {
  it('says when to start, what to lay and at which reading everybody leaves', async () => {
    const server = projectServer()
    const { issue, crew } = await startedOrders(server)
    const order = await issue({ contact: 'Duty desk, channel 4' })
    const pdf = await bodyBytes(crew.get(`/api/orders/${order.token}/order.pdf`))
    const text = textOf(pdf)
    expect(text).toContain('Deployment order 1')
    expect(text).toContain('Slipway head')
    expect(text).toContain('Duty desk, channel 4')
    expect(text).toContain('tube-0.70')
    const { leave } = keptOrder(server, order.id)
    const read = (Math.floor(leave.stage! * 100 + 1e-9) / 100).toFixed(2)
    expect(text).toContain(`${read} m on Quay board`)
    expect(leave.stage).toBeCloseTo(leave.level! - 0.4 + 0.04, 9)
    expect(text.replaceAll('\u2011', '-')).toContain(order.token)
  })
})
