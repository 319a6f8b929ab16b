import { eq } from 'drizzle-orm'
import request from 'supertest'
import { describe, expect, it } from 'vitest'
import { grounds } from '../../../server/db/schema'
import { BARRIERS } from '../../../shared/catalogue/barriers'
import { CHECK_BASES } from '../../../shared/catalogue/check-bases'
import { GROUNDS } from '../../../shared/catalogue/grounds'
import { catalogueSchema } from '../../../shared/schemas/catalogue'
import { freshApp } from '../../support/server-app'

async function readCatalogue(app = freshApp().app) {
  const { body } = await request(app).get('/api/catalogue').expect(200)
  return catalogueSchema.parse(body)
}

describe('GET /api/catalogue', () => {
  it('gives the tubes, grounds and bases that the page computes with', async () => {
    const { barriers, grounds: surfaces, bases } = await readCatalogue()
    expect(barriers).toMatchObject(BARRIERS)
    expect(surfaces).toMatchObject(GROUNDS)
    expect(bases).toMatchObject(CHECK_BASES)
    expect([barriers.length, surfaces.length, bases.length]).toEqual([
      BARRIERS.length,
      GROUNDS.length,
      CHECK_BASES.length,
    ])
  })

  it('gives a source and a revision with every entry', async () => {
    const { barriers, grounds: surfaces, bases } = await readCatalogue()
    for (const entry of [...barriers, ...surfaces, ...bases]) {
      expect(entry.source.length, entry.id).toBeGreaterThan(20)
      expect(entry.revision, entry.id).toBe(1)
    }
  })

  it('reads the database, not the program', async () => {
    const { app, db } = freshApp()
    db.update(grounds).set({ friction: 0.31, revision: 2 }).where(eq(grounds.id, 'turf')).run()
    const { grounds: surfaces } = await readCatalogue(app)
    const turf = surfaces.find(({ id }) => id === 'turf')
    expect(turf).toMatchObject({ friction: 0.31, revision: 2 })
  })
})
