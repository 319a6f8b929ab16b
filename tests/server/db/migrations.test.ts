import { readdirSync, readFileSync } from 'node:fs'
import { generateSQLiteDrizzleJson, generateSQLiteMigration } from 'drizzle-kit/api'
import { expect, it } from 'vitest'
import * as schema from '../../../server/db/schema'

type Snapshot = Parameters<typeof generateSQLiteMigration>[0]

function lastSnapshot(): Snapshot {
  const folder = 'drizzle/meta'
  const files = readdirSync(folder).filter((file) => file.endsWith('_snapshot.json'))
  return JSON.parse(readFileSync(`${folder}/${files.sort().at(-1)!}`, 'utf8')) as Snapshot
}

it('the generated migrations lead to exactly the tables of the schema', async () => {
  const wanted = await generateSQLiteDrizzleJson(schema)
  expect(await generateSQLiteMigration(lastSnapshot(), wanted)).toEqual([])
})
