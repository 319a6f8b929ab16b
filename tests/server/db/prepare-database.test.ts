import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { eq, sql } from 'drizzle-orm'
import { describe, expect, it, onTestFinished } from 'vitest'
import { type Db, IN_MEMORY, openDatabase } from '../../../server/db/client'
import type { DemoSeed } from '../../../server/db/demo-seed'
import { prepareDatabase } from '../../../server/db/prepare-database'
import { barriers, checkBases, grounds, meta } from '../../../server/db/schema'
import { BARRIERS } from '../../../shared/catalogue/barriers'
import { CHECK_BASES } from '../../../shared/catalogue/check-bases'
import { GROUNDS } from '../../../shared/catalogue/grounds'
import { freshDatabase } from '../../support/server-app'

const production = { mode: 'production', demoSeeds: [] } as const

function temporaryFile(): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-db-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true })
  })
  return join(folder, 'deep', 'toehold.sqlite')
}

function pragma(db: Db, name: string): unknown {
  return Object.values(db.get<Record<string, unknown>>(sql.raw(`pragma ${name}`)))[0]
}

function turf(db: Db) {
  return db.select().from(grounds).where(eq(grounds.id, 'turf')).get()
}

describe('a database', () => {
  it('is built from nothing by the migrations', () => {
    const { db, close } = openDatabase(IN_MEMORY)
    onTestFinished(close)
    expect(() => db.select().from(barriers).all()).toThrow(/no such table/)
    prepareDatabase(db, production)
    expect(db.select().from(barriers).all()).toHaveLength(BARRIERS.length)
  })

  it('holds the reference data in both modes', () => {
    for (const mode of ['demonstration', 'production'] as const) {
      const { db } = freshDatabase({ mode })
      expect(db.select().from(barriers).all()).toHaveLength(BARRIERS.length)
      expect(db.select().from(grounds).all()).toHaveLength(GROUNDS.length)
      expect(db.select().from(checkBases).all()).toHaveLength(CHECK_BASES.length)
    }
  })

  it('keeps what it holds when the server starts again', () => {
    const file = temporaryFile()
    const first = openDatabase(file)
    prepareDatabase(first.db, production)
    first.db.insert(meta).values({ key: 'kept', value: 'yes' }).run()
    const before = first.db.select().from(grounds).all()
    first.close()

    const { db } = freshDatabase({ mode: 'production' }, file)
    expect(db.select().from(meta).where(eq(meta.key, 'kept')).get()?.value).toBe('yes')
    expect(db.select().from(grounds).all()).toEqual(before)
  })

  it('is opened so that an answered write is safe and references hold', () => {
    const { db } = freshDatabase({}, temporaryFile())
    expect(pragma(db, 'journal_mode')).toBe('wal')
    expect(pragma(db, 'foreign_keys')).toBe(1)
    expect(pragma(db, 'synchronous')).toBe(2)
    expect(pragma(db, 'busy_timeout')).toBe(5000)
  })
})

describe('reference data', () => {
  it('brings a row that nobody changed up to date, with the next revision', () => {
    const { db } = freshDatabase()
    db.update(grounds).set({ friction: 0.3 }).where(eq(grounds.id, 'turf')).run()
    prepareDatabase(db, production)
    expect(turf(db)).toMatchObject({ friction: 0.45, revision: 2, origin: 'reference' })
    prepareDatabase(db, production)
    expect(turf(db)?.revision).toBe(2)
  })

  it('never overwrites a row that somebody changed', () => {
    const { db } = freshDatabase()
    const own = { friction: 0.31, source: 'Drag test, 4 pulls', origin: 'user' } as const
    db.update(grounds).set(own).where(eq(grounds.id, 'turf')).run()
    prepareDatabase(db, production)
    expect(turf(db)).toMatchObject({ ...own, revision: 1 })
  })

  it('leaves a row that somebody added', () => {
    const { db } = freshDatabase()
    const own = { ...turf(db)!, id: 'own-yard', origin: 'user' } as const
    db.insert(grounds).values(own).run()
    prepareDatabase(db, production)
    expect(db.select().from(grounds).where(eq(grounds.id, 'own-yard')).get()).toEqual(own)
  })
})

describe('demo data', () => {
  const key = 'demo_seeded:greeting'
  const greeting: DemoSeed = {
    name: 'greeting',
    run: (db) => {
      db.insert(meta).values({ key: 'greeting', value: 'hello' }).run()
    },
  }
  const seeded = (db: Db) => db.select().from(meta).all()

  it('is written once, and what was deleted stays deleted', () => {
    const { db } = freshDatabase({ demoSeeds: [greeting] })
    expect(seeded(db).map((row) => row.key)).toEqual(expect.arrayContaining([key, 'greeting']))
    db.delete(meta).where(eq(meta.key, 'greeting')).run()
    prepareDatabase(db, { mode: 'demonstration', demoSeeds: [greeting] })
    expect(seeded(db).map((row) => row.key)).toEqual([key])
  })

  it('never reaches a production database', () => {
    const { db } = freshDatabase({ mode: 'production', demoSeeds: [greeting] })
    expect(seeded(db)).toEqual([])
  })

  it('leaves nothing behind when a seed fails', () => {
    const { db } = freshDatabase()
    const broken: DemoSeed = {
      name: 'broken',
      run: (tx) => {
        greeting.run(tx)
        throw new Error('no')
      },
    }
    const attempt = () => {
      prepareDatabase(db, { mode: 'demonstration', demoSeeds: [broken] })
    }
    expect(attempt).toThrow('no')
    expect(seeded(db)).toEqual([])
  })
})
