import { and, eq } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import { type Person, peoplePageSchema, personSchema } from '../../../shared/schemas/account'
import type { MemberRole } from '../../../shared/access/roles'
import type { Db } from '../../../server/db/client'
import {
  auditEntries,
  invitations,
  mails,
  projectMembers,
  projects,
} from '../../../server/db/schema'
import { createOrganisation } from '../../../server/modules/organisations/organisations.service'
import { insertMail } from '../../../server/modules/mails/mails.queries'
import { auditTrail } from '../../support/audit-trail'
import { browser, makePerson, PASSWORD, signedIn, type Browser } from '../../support/people'
import { freshApp } from '../../support/server-app'

async function start() {
  const server = freshApp()
  const admin = makePerson(server.parts, { id: 'admin', role: 'admin', name: 'Administrator' })
  return { ...server, admin, office: await signedIn(server.app, admin) }
}

async function people(office: Browser, query = '') {
  const { body } = await office.get(`/api/admin/people${query}`).expect(200)
  return peoplePageSchema.parse(body)
}

const names = ({ items }: { items: readonly Person[] }) => items.map(({ name }) => name)

function makeProject(db: Db, id: string, members: Record<string, MemberRole>): void {
  const [author] = Object.keys(members) as [string]
  const kept = { createdAt: 0, createdBy: author, updatedAt: 0, updatedBy: author }
  db.insert(projects)
    .values({ id, name: `Project ${id}`, datum: 'QD', timeZone: 'UTC', ...kept })
    .run()
  for (const [accountId, role] of Object.entries(members)) {
    db.insert(projectMembers).values({ projectId: id, accountId, role, addedAt: 0 }).run()
  }
}

function memberRole(db: Db, projectId: string, accountId: string) {
  const { projectId: project, accountId: account } = projectMembers
  const wanted = and(eq(project, projectId), eq(account, accountId))
  return db.select().from(projectMembers).where(wanted).get()?.role
}

const deactivate = (office: Browser, id: string, handOverTo: string | null = null) =>
  office.post(`/api/admin/people/${id}/deactivation`).send({ handOverTo })

describe('the list of people', () => {
  it('is by name, in pages, and can be searched', async () => {
    const { office, parts } = await start()
    for (let count = 0; count < 60; count++) {
      const name = `Engineer ${String(count).padStart(2, '0')}`
      makePerson(parts, { name, email: `engineer-${count}@people.test` })
    }
    const first = await people(office)
    expect(first).toMatchObject({ page: 1, pageSize: 50, total: 61 })
    expect(names(first).slice(0, 2)).toEqual(['Administrator', 'Engineer 00'])
    expect(names(await people(office, '?page=2'))).toHaveLength(11)
    expect(names(await people(office, '?search=engineer%2007'))).toEqual(['Engineer 07'])
    expect(names(await people(office, '?search=ENGINEER-59%40people'))).toEqual(['Engineer 59'])
    expect((await people(office, '?search=%25')).total).toBe(0)
  })

  it('tells active from deactivated people', async () => {
    const { office, parts } = await start()
    const { id } = makePerson(parts, { name: 'Gone' })
    await deactivate(office, id).expect(200)
    expect(names(await people(office, '?state=deactivated'))).toEqual(['Gone'])
    expect(names(await people(office, '?state=active'))).toEqual(['Administrator'])
    await office.get('/api/admin/people?state=asleep').expect(400)
    await office.get('/api/admin/people?page=0').expect(422)
  })

  it('says how many projects only this person leads', async () => {
    const { office, parts, db } = await start()
    const [a, b, viewer] = [
      makePerson(parts, { name: 'A' }),
      makePerson(parts, { name: 'B' }),
      makePerson(parts, { name: 'V', role: 'viewer' }),
    ]
    makeProject(db, 'alone', { [a.id]: 'lead', [b.id]: 'editor' })
    makeProject(db, 'together', { [a.id]: 'lead', [b.id]: 'lead' })
    makeProject(db, 'with-viewer', { [a.id]: 'lead', [viewer.id]: 'lead' })
    const { items } = await people(office)
    expect(items.map(({ name, leads }) => [name, leads])).toEqual([
      ['A', 2],
      ['Administrator', 0],
      ['B', 0],
      ['V', 0],
    ])
  })
})

describe('a person', () => {
  it('gets another role, permissions and organisation, with what was before in the trail', async () => {
    const { office, parts, admin, db } = await start()
    const author = { accountId: admin.id, name: admin.name }
    const { id: organisationId } = createOrganisation(parts, author, 'Second Look')
    const { id } = makePerson(parts, { name: 'A' })
    const change = { role: 'trainer', mayApprove: true, organisationId }
    const { body } = await office.patch(`/api/admin/people/${id}`).send(change).expect(200)
    expect(personSchema.parse(body)).toMatchObject({
      role: 'trainer',
      mayCheck: false,
      mayApprove: true,
      organisation: { name: 'Second Look' },
    })
    expect(db.select().from(auditEntries).all().at(-1)).toMatchObject({
      action: 'person.changed',
      subjectName: 'A',
      detail: {
        role: { from: 'engineer', to: 'trainer' },
        mayApprove: { from: false, to: true },
        organisation: { from: 'Organisation of the tests', to: 'Second Look' },
      },
    })
  })

  it('who becomes a checker has both permissions', async () => {
    const { office, parts } = await start()
    const { id } = makePerson(parts)
    const { body } = await office.patch(`/api/admin/people/${id}`).send({ role: 'checker' })
    expect(body).toMatchObject({ mayCheck: true, mayApprove: true })
  })

  it('who leads a project alone does not become a viewer', async () => {
    const { office, parts, db } = await start()
    const { id } = makePerson(parts)
    makeProject(db, 'quay', { [id]: 'lead' })
    const change = office.patch(`/api/admin/people/${id}`).send({ role: 'viewer' })
    expect((await change.expect(409)).body.message).toMatch(/alone leads a project/)
  })

  it('who is the last administrator stays one', async () => {
    const { office, admin, parts } = await start()
    const step = () => office.patch(`/api/admin/people/${admin.id}`).send({ role: 'engineer' })
    await step().expect(409)
    makePerson(parts, { role: 'admin' })
    await step().expect(200)
    await office.get('/api/admin/people').expect(403)
  })

  it.each([
    ['an unknown role', { role: 'owner' }, 400],
    ['an unknown organisation', { organisationId: 'nowhere' }, 422],
    ['another name', { name: 'X' }, 400],
  ])('is not given %s', async (_what, change, status) => {
    const { office, parts } = await start()
    const { id } = makePerson(parts)
    await office.patch(`/api/admin/people/${id}`).send(change).expect(status)
    await office.patch('/api/admin/people/nobody').send({ mayCheck: true }).expect(404)
  })
})

describe('deactivating somebody', () => {
  it('hands every project that they lead to a named person, and keeps the rest', async () => {
    const { office, parts, db } = await start()
    const [leaving, successor] = [
      makePerson(parts, { name: 'A' }),
      makePerson(parts, { name: 'B' }),
    ]
    makeProject(db, 'alone', { [leaving.id]: 'lead' })
    makeProject(db, 'shared', { [leaving.id]: 'lead', [successor.id]: 'reader' })
    makeProject(db, 'edited', { [successor.id]: 'lead', [leaving.id]: 'editor' })
    const { body } = await deactivate(office, leaving.id, successor.id).expect(200)
    expect(personSchema.parse(body).deactivatedAt).not.toBeNull()
    expect(memberRole(db, 'alone', successor.id)).toBe('lead')
    expect(memberRole(db, 'shared', successor.id)).toBe('lead')
    expect(memberRole(db, 'alone', leaving.id)).toBe('reader')
    expect(memberRole(db, 'edited', leaving.id)).toBe('editor')
    expect(auditTrail(db).slice(-3)).toEqual([
      'Administrator: project.handed-over: Project alone',
      'Administrator: project.handed-over: Project shared',
      'Administrator: person.deactivated: A',
    ])
  })

  it('ends their sessions, their sign-in and their open links', async () => {
    const { app, office, parts } = await start()
    const person = makePerson(parts)
    const agent = await signedIn(app, person)
    await deactivate(office, person.id).expect(200)
    await agent.get('/api/account/sessions').expect(401)
    const credentials = { email: person.email, password: PASSWORD }
    await browser(app).post('/api/session').send(credentials).expect(401)
  })

  it('needs a successor where a project would have no lead', async () => {
    const { office, parts, db } = await start()
    const { id } = makePerson(parts)
    makeProject(db, 'quay', { [id]: 'lead' })
    const { body } = await deactivate(office, id).expect(409)
    expect(body.message).toMatch(/^handOverTo: /)
  })

  it.each(['viewer', 'admin', 'gone', 'self', 'nobody'] as const)(
    'takes no successor who cannot lead: %s',
    async (who) => {
      const { office, parts } = await start()
      const { id } = makePerson(parts, { id: 'self' })
      makePerson(parts, { id: 'viewer', role: 'viewer' })
      makePerson(parts, { id: 'gone' })
      await deactivate(office, 'gone').expect(200)
      const { body } = await deactivate(office, id, who).expect(422)
      expect(body.fields[0]).toMatchObject({ path: 'handOverTo', value: who })
    },
  )

  it('is not for oneself, nor for somebody gone, nor for nobody', async () => {
    const { office, parts, admin } = await start()
    makePerson(parts, { role: 'admin' })
    await deactivate(office, admin.id).expect(409)
    const { id } = makePerson(parts)
    await deactivate(office, id).expect(200)
    await deactivate(office, id).expect(409)
    await deactivate(office, 'nobody').expect(404)
  })
})

describe('the address of somebody deactivated', () => {
  it('is erased wherever it stands; the name stays', async () => {
    const { office, parts, db } = await start()
    const person = makePerson(parts, { name: 'A' })
    const mail = { recipient: person.email, subject: '', text: '', html: '' }
    insertMail(db, { id: 'mail', ...mail, state: 'sent', createdAt: 0 })
    db.insert(invitations)
      .values({
        ...{ id: 'invitation', tokenHash: 'hash', email: person.email, role: 'engineer' },
        ...{ organisationId: 'tests', createdAt: 0, expiresAt: 1, acceptedAt: 1 },
      })
      .run()
    const address = `/api/admin/people/${person.id}/address`
    await office.delete(address).expect(409)
    await deactivate(office, person.id).expect(200)
    const { body } = await office.delete(address).expect(200)
    expect(body).toMatchObject({ email: null, name: 'A' })
    await office.delete(address).expect(409)
    for (const table of [mails, invitations, auditEntries]) {
      expect(JSON.stringify(db.select().from(table).all())).not.toContain(person.email)
    }
  })

  it('is free for a new invitation afterwards', async () => {
    const { office, parts } = await start()
    const { id, email } = makePerson(parts)
    const again = { email, role: 'engineer', organisationId: 'tests' }
    await deactivate(office, id).expect(200)
    const refused = await office.post('/api/admin/invitations').send(again).expect(409)
    expect(refused.body.message).toContain('deactivated')
    await office.delete(`/api/admin/people/${id}/address`).expect(200)
    await office.post('/api/admin/invitations').send(again).expect(201)
  })
})

describe('organisations', () => {
  it('are made, renamed and listed with their people', async () => {
    const { office, db } = await start()
    const made = await office.post('/api/admin/organisations').send({ name: 'Crew school' })
    expect(made.status).toBe(201)
    const renamed = { name: 'Crew School' }
    await office.patch(`/api/admin/organisations/${made.body.id}`).send(renamed).expect(200)
    const { body } = await office.get('/api/admin/organisations').expect(200)
    expect(body.organisations).toEqual([
      { id: made.body.id, name: 'Crew School', people: 0 },
      { id: 'tests', name: 'Organisation of the tests', people: 1 },
    ])
    expect(auditTrail(db).slice(1)).toEqual([
      'Administrator: organisation.created: Crew school',
      'Administrator: organisation.renamed: Crew School',
    ])
  })

  it('have a name of their own each', async () => {
    const { office } = await start()
    const name = 'organisation of the TESTS'
    await office.post('/api/admin/organisations').send({ name }).expect(409)
    await office.patch('/api/admin/organisations/nowhere').send({ name: 'X' }).expect(404)
  })
})
