import express from 'express'
import request from 'supertest'
import { expect, it } from 'vitest'
import { createKeyedHash } from '../../../server/auth/keyed-hash'
import { openFileStore } from '../../../server/files/file-store'
import { errorHandler } from '../../../server/http/error-handler'
import { readPageFiles } from '../../../server/pages/page-files'
import { pages } from '../../../server/pages/pages'
import { freshDatabase, SECRET } from '../../support/server-app'

const files = readPageFiles()

/** The pages alone, on a database of their own. */
function pageServer() {
  const { db } = freshDatabase()
  const keyedHash = createKeyedHash(SECRET)
  const parts = { now: () => 0, store: openFileStore('/nowhere'), appUrl: 'https://toehold.test' }
  return express()
    .use(pages({ db, keyedHash, ...parts }))
    .use(errorHandler)
}

it('answers a token that opens nothing with a page, and slows down whoever tries many', async () => {
  const app = pageServer()
  const open = (token: string) => request(app).get(`/order/${token}`)
  for (const token of ['7Q4K-19XM-3TRP-8C2D', '%E0%A4%A', '..%2Fup', 'a'.repeat(300)]) {
    const answer = await open(token)
    expect(answer.status, token).toBe(404)
    expect(answer.type).toBe('text/html')
    expect(answer.text).toContain('No such order')
  }
  const statuses = []
  for (let i = 0; i < 40; i += 1) statuses.push((await open(`0000-0000-0000-${1000 + i}`)).status)
  expect(statuses.at(-1)).toBe(429)
})

it('serves files for ever under an address that changes with them, and asks anew for the worker', async () => {
  const app = pageServer()
  const style = await request(app).get(files.addressOf('order.css')).expect(200)
  expect(style.headers['cache-control']).toContain('immutable')
  const older = await request(app).get('/order-page/older/order.js').expect(200)
  expect(older.headers['cache-control']).toBe('no-cache')
  await request(app).get('/order-page/older/order.css/more').expect(404)
  await request(app).get('/order-page/older/secret').expect(404)
  const worker = await request(app).get('/service-worker.js').expect(200)
  expect(worker.headers['cache-control']).toBe('no-cache')
  expect(worker.type).toBe('text/javascript')
  expect(worker.text).toContain(`const VERSION = '${files.version}'`)
})
