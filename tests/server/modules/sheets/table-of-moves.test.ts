import { createServer, type RequestListener } from 'node:http'
import type { AddressInfo } from 'node:net'
import { sql } from 'drizzle-orm'
import { describe, expect, it, onTestFinished, vi } from 'vitest'
import { SHEET_MOVES, type SheetMove } from '../../../../shared/access/sheet-moves'
import { deskSchema } from '../../../../shared/schemas/project'
import { SHEET_STATUSES, type SheetStatus } from '../../../../shared/schemas/sheet-status'
import { DEMO_PEOPLE } from '../../../../server/demo/demo-people'
import { as, type Person, projectServer } from '../../../support/project-server'
import { startedSheet } from '../../../support/sheets'

/** Setting a document is another test's; here only its place in the table counts. */
vi.mock('../../../../server/modules/sheets/composing', () => ({
  assertDerives: () => undefined,
  linesOf: () => new Map(),
  frozenDocument: () => ({ pdf: Buffer.from('%PDF-'), pages: 1 }),
}))

const PEOPLE = ['engineerA', 'engineerB', 'approver', 'checker', 'viewer', 'trainer'] as const

/** Where each move begins, as people say it: once more, beside the table of the program. */
const BEGINS: Readonly<Record<SheetMove, readonly SheetStatus[]>> = {
  submit: ['draft', 'returned'],
  check: ['in-checking'],
  return: ['in-checking', 'checked'],
  approve: ['checked'],
  'issue-for-information': ['draft'],
  withdraw: ['checked', 'approved', 'issued-for-information'],
  revise: ['approved', 'issued-for-information', 'withdrawn'],
  delete: ['draft'],
  supersede: [],
}

/** Engineer A leads and prepared, Engineer B edits, the approver is of the same firm, the checker is not. */
function makers(move: SheetMove, status: SheetStatus, case_: Case): readonly Person[] {
  const { category, checkedBy, separate } = case_
  const mayApprove = (['approver', 'checker'] as const).filter((person) => {
    const isOwnCheck = person === checkedBy
    return !(isOwnCheck && (separate === 'always' || (separate === 'by-category' && category >= 2)))
  })
  switch (move) {
    case 'submit':
    case 'issue-for-information':
    case 'delete':
      return ['engineerA']
    case 'check':
      return ['checker']
    case 'return':
      return status === 'in-checking' ? ['checker'] : mayApprove
    case 'approve':
      return mayApprove
    case 'withdraw':
      return ['engineerA', 'approver', 'checker']
    case 'revise':
      return ['engineerA', 'engineerB']
    case 'supersede':
      return []
  }
}

interface Case {
  readonly category: number
  readonly checkedBy: Person
  readonly separate: 'by-category' | 'always' | 'never'
}

function expected(move: SheetMove, status: SheetStatus, person: Person, case_: Case): number {
  if (person === 'trainer') return 404
  if (!BEGINS[move].includes(status)) return 409
  return makers(move, status, case_).includes(person) ? 200 : 403
}

/** One connection for all: hundreds of requests are sent. */
async function listening(app: RequestListener): Promise<string> {
  const listener = createServer(app)
  await new Promise<void>((resolve) => listener.listen(0, '127.0.0.1', resolve))
  onTestFinished(() => {
    listener.closeAllConnections()
    listener.close()
  })
  return `http://127.0.0.1:${(listener.address() as AddressInfo).port}`
}

/** Everybody where a move begins; elsewhere whoever could do the most, and a reader. */
function askers(move: SheetMove, status: SheetStatus): readonly Person[] {
  return BEGINS[move].includes(status) ? PEOPLE : ['engineerA', 'checker', 'viewer']
}

interface Walk {
  readonly moves: readonly SheetMove[]
  readonly statuses: readonly SheetStatus[]
}

async function walk(case_: Case, { moves, statuses }: Walk) {
  const server = projectServer()
  const { path, projectPath, sheet } = await startedSheet(server, { category: case_.category })
  const settings = { numberPattern: 'S-###', separateApprover: case_.separate }
  await as(server, 'engineerA').put(`${projectPath}/sheet-settings`, settings).expect(200)
  const address = await listening(server.app)
  const wrong: string[] = []
  let asked = 0
  for (const status of statuses) {
    const isEarly = ['draft', 'in-checking'].includes(status)
    const checkedBy = isEarly ? null : DEMO_PEOPLE[case_.checkedBy].id
    server.db.run(
      sql`update sheets set status = ${status}, checked_by = ${checkedBy} where id = ${sheet.id}`,
    )
    for (const move of moves) {
      for (const person of askers(move, status)) {
        server.db.run(sql`begin immediate`)
        const answer = await fetch(`${address}${path}/moves`, {
          method: 'POST',
          headers: { 'content-type': 'application/json', 'x-test-person': person },
          body: JSON.stringify({ move, version: 1, reason: 'because' }),
        })
        await answer.arrayBuffer()
        server.db.run(sql`rollback`)
        asked += 1
        const wanted = expected(move, status, person, case_)
        if (answer.status !== wanted) {
          wrong.push(`${move} of ${status} by ${person}: ${answer.status}, not ${wanted}`)
        }
      }
    }
  }
  return { wrong, asked }
}

describe('the table of moves, walked through the API', { timeout: 60_000 }, () => {
  it('holds for every move from every status by everybody', async () => {
    const case_ = { category: 2, checkedBy: 'checker', separate: 'by-category' } as const
    const { wrong, asked } = await walk(case_, { moves: SHEET_MOVES, statuses: SHEET_STATUSES })
    expect(wrong).toEqual([])
    const begins = Object.values(BEGINS).flat().length
    expect(asked).toBe(begins * PEOPLE.length + (8 * 9 - begins) * 3)
  })

  it.each([
    { category: 1, checkedBy: 'checker', separate: 'by-category' },
    { category: 3, checkedBy: 'checker', separate: 'never' },
    { category: 0, checkedBy: 'checker', separate: 'always' },
  ] as const)('asks in category $category for an approver apart: $separate', async (case_) => {
    const part: Walk = {
      moves: ['check', 'return', 'approve'],
      statuses: ['in-checking', 'checked'],
    }
    const { wrong } = await walk(case_, part)
    expect(wrong).toEqual([])
  })

  it('lets nobody of the same organisation check a sheet of category 3', async () => {
    const server = projectServer()
    const { moved, move, sheet } = await startedSheet(server, { category: 3 })
    await moved('engineerA', 'submit')
    const { organisationId } = DEMO_PEOPLE.checker
    server.db.run(sql`update sheets set prepared_for = ${organisationId} where id = ${sheet.id}`)
    const answer = await move('checker', 'check')
    expect(answer.status).toBe(403)
    expect(answer.text).toContain('another organisation')
  })

  it('asks for a reason where the table says so, and for the version that is there', async () => {
    const server = projectServer()
    const { moved, move, path } = await startedSheet(server)
    const stale = { move: 'submit', version: 9, reason: '' }
    await as(server, 'engineerA').post(`${path}/moves`, stale).expect(409)
    await moved('engineerA', 'submit')
    const answer = await move('checker', 'return')
    expect(answer.status).toBe(400)
    expect(answer.text).toContain('reason')
  })

  it('puts a sheet on the desk of whoever can take it on, and of nobody else', async () => {
    const server = projectServer()
    const { moved, sheet, projectPath } = await startedSheet(server)
    const desks = async () => {
      const waiting = await Promise.all(
        PEOPLE.map(async (person) => {
          const { body } = await as(server, person).get('/api/desk').expect(200)
          return deskSchema.parse(body).waiting.map(({ id, what }) => {
            expect(id).toBe(sheet.id)
            return `${person}: ${what}`
          })
        }),
      )
      return waiting.flat()
    }
    expect(await desks()).toEqual([])
    await moved('engineerA', 'submit')
    expect(await desks()).toEqual(['checker: check'])
    await moved('checker', 'return', 'No source')
    expect(await desks()).toEqual(['engineerA: submit'])
    await moved('engineerA', 'submit')
    await moved('checker', 'check')
    // In category 2 whoever checked does not approve as well.
    expect(await desks()).toEqual(['approver: approve'])
    await as(server, 'engineerA').post(`${projectPath}/archive`).expect(200)
    expect(await desks()).toEqual([])
  })

  it('lets nobody move a sheet of an archived project', async () => {
    const server = projectServer()
    const { move, projectPath } = await startedSheet(server)
    await as(server, 'engineerA').post(`${projectPath}/archive`).expect(200)
    expect((await move('engineerA', 'submit')).status).toBe(409)
  })
})
