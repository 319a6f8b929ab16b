import { expect, it } from 'vitest'
import { ferryQuaySeed, FERRY_QUAY } from '../../../server/demo/ferry-quay'
import { ferryQuaySheetsSeed } from '../../../server/demo/ferry-quay-sheets'
import { seedSlowlyOnce } from '../../../server/db/demo-seed'
import {
  sheetRecordSchema,
  sheetsPageSchema,
  type SheetRecord,
} from '../../../shared/schemas/sheet-api'
import { as, NOON, projectServer } from '../../support/project-server'

const PATH = `/api/projects/${FERRY_QUAY.project}/sheets`

it('Ferry Quay has its six sheets, made as people make them', { timeout: 120_000 }, async () => {
  const server = projectServer()
  ferryQuaySeed(() => NOON).run(server.db)
  const seed = ferryQuaySheetsSeed(server.sheetWork)
  await seedSlowlyOnce(server.db, seed)
  // Once in the life of a database.
  await seedSlowlyOnce(server.db, seed)
  const lead = as(server, 'engineerA')
  const { items } = sheetsPageSchema.parse((await lead.get(`${PATH}?order=asc`)).body)
  const told = items.map(({ number, revision, status, openComments }) =>
    [number, revision, status, openComments].join(' '),
  )
  expect([...told].sort()).toEqual([
    'FQ-001 A superseded 0',
    'FQ-001 B approved 0',
    'FQ-002 A in-checking 2',
    'FQ-003 A returned 0',
    'FQ-004 A withdrawn 0',
    'FQ-005 A issued-for-information 0',
    'FQ-006 A draft 1',
  ])
  const read = async (number: string, revision: string): Promise<SheetRecord> => {
    const { id } = items.find((one) => one.number === number && one.revision === revision)!
    return sheetRecordSchema.parse((await lead.get(`${PATH}/${id}`)).body)
  }
  const [before, after] = [await read('FQ-001', 'A'), await read('FQ-001', 'B')]
  expect(before.content.case.barrier.diameter).toBe(0.7)
  expect(before.content.result.verdict).toBe('fails')
  expect(after.content.case.barrier.diameter).toBe(1)
  expect(after.content.result.verdict).not.toBe('fails')
  expect(after.drift.differences).toEqual([])
  expect(after.pages).toBeGreaterThan(8)
  const checking = await read('FQ-002', 'A')
  expect(checking.marks.length).toBe(4)
  expect(checking.comments.map(({ line }) => line).sort()).toEqual(['5.1', null])
  const verified = await as(server, null).get(`/api/verify/${before.code}`).expect(200)
  expect(verified.body).toMatchObject({ supersededBy: { revision: 'B' } })
})
