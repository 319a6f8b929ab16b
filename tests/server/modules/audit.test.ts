import { describe, expect, it } from 'vitest'
import { auditPageSchema } from '../../../shared/schemas/account'
import { auditEntries } from '../../../server/db/schema'
import { type AuditNote, recordAudit } from '../../../server/modules/audit/record-audit'
import { HOUR, movingClock } from '../../support/clock'
import { type Browser, makePerson, signedIn } from '../../support/people'
import { freshApp } from '../../support/server-app'

const START = Date.UTC(2031, 2, 3, 22)

async function start() {
  const clock = movingClock(START)
  const server = freshApp({ now: clock.now })
  const admin = makePerson(server.parts, { role: 'admin', name: 'Administrator' })
  const office = await signedIn(server.app, admin)
  const note = (name: string, change: Partial<AuditNote> = {}) => {
    const subject = { subjectType: 'scenario', subjectId: `id-${name}`, subjectName: name }
    const entry = { action: 'scenario.saved', ...subject, ...change }
    recordAudit(server.db, { accountId: 'a', name: 'Engineer A' }, clock.now(), entry)
  }
  return { ...server, clock, office, note }
}

async function audit(office: Browser, query = '') {
  const { body } = await office.get(`/api/admin/audit${query}`).expect(200)
  return auditPageSchema.parse(body)
}

describe('the audit trail', () => {
  it('shows who did what to what, from which version to which, the newest first', async () => {
    const { office, note } = await start()
    note('As asked', { fromVersion: 3, toVersion: 4, projectId: 'quay', detail: { a: 1 } })
    const { items, total } = await audit(office)
    expect(total).toBe(2)
    expect(items[0]).toEqual({
      ...{ id: 2, at: START, actorName: 'Engineer A', action: 'scenario.saved', detail: { a: 1 } },
      ...{ subjectType: 'scenario', subjectId: 'id-As asked', subjectName: 'As asked' },
      ...{ projectId: 'quay', fromVersion: 3, toVersion: 4 },
    })
  })

  it('is filtered by words, action and time, in pages', async () => {
    const { office, note, clock } = await start()
    for (let count = 0; count < 60; count++) note(`Scenario ${count}`)
    clock.advance(HOUR)
    note('Late', { action: 'scenario.archived' })
    expect((await audit(office, '?page=2')).items).toHaveLength(12)
    expect((await audit(office, '?search=scenario%207')).total).toBe(1)
    expect((await audit(office, '?search=engineer')).total).toBe(61)
    expect((await audit(office, '?action=scenario.')).total).toBe(61)
    expect((await audit(office, '?action=scenario.archived')).total).toBe(1)
    expect((await audit(office, `?from=${START + 1}`)).total).toBe(1)
    expect((await audit(office, `?to=${START}&search=late`)).total).toBe(0)
    await office.get('/api/admin/audit?from=yesterday').expect(400)
  })

  it('is a CSV file whose cells no spreadsheet runs', async () => {
    const { office, note } = await start()
    note('=HYPERLINK("http://elsewhere.example")')
    const answer = await office.get('/api/admin/audit.csv?action=scenario.').expect(200)
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8')
    expect(answer.headers['content-disposition']).toBe('attachment; filename=audit.csv')
    const [head, row, rest] = answer.text.split('\r\n')
    expect(head).toMatch(/Number,When \(UTC\),Who,Action/)
    expect(row).toContain('2031-03-03T22:00:00.000Z,Engineer A,scenario.saved,scenario,"\'=HYPER')
    expect(rest).toBe('')
  })

  it('can be neither changed nor shortened, not even by the program', async () => {
    const { db } = await start()
    expect(() => db.delete(auditEntries).run()).toThrow(/append-only/)
    expect(() => db.update(auditEntries).set({ action: 'x' }).run()).toThrow(/append-only/)
  })

  it('keeps nothing of a change that failed', async () => {
    const { db, office } = await start()
    const before = db.select().from(auditEntries).all().length
    await office.post('/api/admin/organisations').send({ name: 'Organisation of the tests' })
    expect(db.select().from(auditEntries).all()).toHaveLength(before)
  })
})
