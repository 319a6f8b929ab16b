import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { healthSchema } from '../../../shared/schemas/health'
import { problemSchema } from '../../../shared/schemas/problem'
import { freshApp, SECRET } from '../../support/server-app'

const production = {
  NODE_ENV: 'production',
  APP_URL: 'http://localhost',
  SESSION_SECRET: SECRET,
}

describe('GET /api/health', () => {
  it('says which program runs, in which mode, and that it reaches its database', async () => {
    const { body } = await request(freshApp().app).get('/api/health').expect(200)
    expect(healthSchema.parse(body)).toEqual({
      status: 'ok',
      version: '1.2.3',
      mode: 'demonstration',
      database: 'reachable',
    })
  })

  it('names production as such', async () => {
    const { app } = freshApp({ environment: production })
    const { body } = await request(app).get('/api/health').expect(200)
    expect(healthSchema.parse(body).mode).toBe('production')
  })

  it('is a problem, and is never kept, when the database does not answer', async () => {
    const { app, close } = freshApp()
    close()
    const answer = await request(app).get('/api/health').expect(503)
    expect(problemSchema.parse(answer.body).code).toBe('unavailable')
    expect(answer.headers['cache-control']).toBe('no-store')
  })

  it('has no other method', async () => {
    const answer = await request(freshApp().app).post('/api/health').expect(405)
    expect(answer.headers.allow).toBe('GET, HEAD')
    expect(problemSchema.parse(answer.body).code).toBe('method-not-allowed')
  })
})
