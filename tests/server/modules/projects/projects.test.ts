import { existsSync, readdirSync } from 'node:fs'
import { describe, expect, it } from 'vitest'
import { deleteProjectForGood } from '../../../../server/modules/projects/put-away-project.service'
import { openFileStore } from '../../../../server/files/file-store'
import { problemSchema } from '../../../../shared/schemas/problem'
import {
  deskSchema,
  gaugesSchema,
  linesPageSchema,
  membersSchema,
  type Project,
  projectSchema,
  projectsPageSchema,
  scenariosPageSchema,
} from '../../../../shared/schemas/project'
import { auditActions, auditOf } from '../../../support/audit-trail'
import {
  addMember,
  as,
  content,
  type Person,
  projectServer,
  type ProjectServer,
  startedProject,
} from '../../../support/project-server'

async function namesOf(server: ProjectServer, person: Person, query = ''): Promise<string[]> {
  const { body } = await as(server, person).get(`/api/projects${query}`).expect(200)
  return projectsPageSchema.parse(body).items.map(({ name }) => name)
}

async function made(server: ProjectServer, name: string): Promise<Project> {
  server.clock.now += 1000
  const body = { name, datum: 'QD' }
  return (await as(server, 'engineerA').post('/api/projects', body).expect(201)).body as Project
}

describe('projects', { timeout: 30_000 }, () => {
  it('are made by engineers, who then lead them', async () => {
    const server = projectServer()
    const project = await made(server, 'Quay')
    expect(projectSchema.parse(project)).toMatchObject({
      name: 'Quay',
      timeZone: 'UTC',
      myRole: 'lead',
      version: 1,
      createdBy: { name: 'Engineer A' },
    })
    for (const person of ['viewer', 'trainer', 'checker', 'administrator'] as const) {
      const answer = await as(server, person).post('/api/projects', { name: 'x', datum: 'y' })
      expect(answer.status).toBe(403)
    }
    await as(server, null).post('/api/projects', { name: 'x', datum: 'y' }).expect(401)
  })

  it('are listed for their members alone, and an organisation in common gives nothing', async () => {
    const server = projectServer()
    await made(server, 'Quay')
    expect(await namesOf(server, 'engineerA')).toEqual(['Quay'])
    expect(await namesOf(server, 'engineerB')).toEqual([])
    expect(await namesOf(server, 'administrator')).toEqual([])
  })

  it('are searched as typed, sorted and paged', async () => {
    const server = projectServer()
    for (const name of ['beta 100%', 'Alpha', 'gamma_1']) await made(server, name)
    const names = (query: string) => namesOf(server, 'engineerA', query)
    expect(await names('')).toEqual(['gamma_1', 'Alpha', 'beta 100%'])
    expect(await names('?sort=name&order=asc')).toEqual(['Alpha', 'beta 100%', 'gamma_1'])
    expect(await names('?search=%25')).toEqual(['beta 100%'])
    expect(await names('?search=_')).toEqual(['gamma_1'])
    expect(await names('?search=ALPHA')).toEqual(['Alpha'])
    expect(await names('?page=2')).toEqual([])
    for (const query of ['?page=0', '?page=x', '?sort=password', '?order=up', '?archived=1']) {
      const answer = await as(server, 'engineerA').get(`/api/projects${query}`)
      expect([400, 422], query).toContain(answer.status)
      problemSchema.parse(answer.body)
    }
  })

  it('change on the version that was read, and leave alone what is not named', async () => {
    const server = projectServer()
    const { lead, projectPath } = await startedProject(server)
    await lead.patch(projectPath, { version: 1, note: 'n', timeZone: 'Europe/Oslo' }).expect(200)
    const { body } = await lead.patch(projectPath, { version: 2, name: 'New' }).expect(200)
    expect(body).toMatchObject({ name: 'New', note: 'n', timeZone: 'Europe/Oslo', version: 3 })
    const stale = await lead.patch(projectPath, { version: 2, name: 'Stale' }).expect(409)
    expect(problemSchema.parse(stale.body).message).toContain('version 3 is there')
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'project.changed',
      fromVersion: 2,
      toVersion: 3,
      detail: { fields: ['name'] },
    })
  })

  it('are read and not changed while they are archived', async () => {
    const server = projectServer()
    const { lead, projectPath, linePath, scenarioPath } = await startedProject(server)
    await lead.post(`${projectPath}/archive`).expect(200)
    expect(await namesOf(server, 'engineerA')).toEqual([])
    expect(await namesOf(server, 'engineerA', '?archived=yes')).toEqual(['Quay'])
    await lead.get(scenarioPath).expect(200)
    const save = { name: 'Late', version: 1, content: content({ waterLevel: 3.3 }) }
    await lead.put(scenarioPath, save).expect(409)
    await lead.patch(projectPath, { version: 1, name: 'Late' }).expect(409)
    await lead.patch(linePath, { version: 1, name: 'Late' }).expect(409)
    await lead.post(`${projectPath}/gauges`, { name: 'Late', zero: 0 }).expect(409)
    const body = (await lead.post(`${projectPath}/restoration`).expect(200)).body as Project
    expect(body).toMatchObject({ archivedAt: null, version: 1 })
    await lead.put(scenarioPath, save).expect(200)
  })

  it('are copied with gauges, lines and scenarios, without members, files and histories', async () => {
    const server = projectServer()
    const { lead, projectPath, linePath, scenarioPath } = await startedProject(server)
    await addMember(server, projectPath, 'engineerB', 'editor')
    await lead.post(`${projectPath}/gauges`, { name: 'Lock', zero: 0.6 }).expect(201)
    const save = { name: 'Second', version: 1, content: content({ waterLevel: 3.3 }) }
    await lead.put(scenarioPath, save).expect(200)
    await lead.post(`${linePath}/scenarios`, { name: 'Away', content: content() }).expect(201)
    const { body: list } = await lead.get(`${linePath}/scenarios?search=Away`)
    await lead.post(`${linePath}/scenarios/${scenariosPageSchema.parse(list).items[0]!.id}/archive`)

    const b = as(server, 'engineerB')
    const copy = (await b.post(`${projectPath}/duplicates`, { name: 'Copy' }).expect(201))
      .body as Project
    const copyPath = `/api/projects/${copy.id}`
    expect(copy).toMatchObject({ name: 'Copy', myRole: 'lead', lines: 1, scenarios: 1 })
    const { members } = membersSchema.parse((await b.get(`${copyPath}/members`)).body)
    expect(members.map(({ name }) => name)).toEqual(['Engineer B'])
    const { gauges } = gaugesSchema.parse((await b.get(`${copyPath}/gauges`)).body)
    expect(gauges).toMatchObject([{ name: 'Lock', zero: 0.6, version: 1 }])
    const { items } = linesPageSchema.parse((await b.get(`${copyPath}/lines`)).body)
    const rows = await b.get(`${copyPath}/lines/${items[0]!.id}/scenarios`).expect(200)
    expect(scenariosPageSchema.parse(rows.body).items).toMatchObject([
      { name: 'Second', version: 1, createdBy: { name: 'Engineer B' } },
    ])
    await lead.get(copyPath).expect(404)
  })

  it('are deleted for good by their lead once they are archived, bytes and all', async () => {
    const server = projectServer()
    const { lead, projectPath, project } = await startedProject(server)
    await addMember(server, projectPath, 'engineerB', 'editor')
    const sent = lead.post(`${projectPath}/files`).attach('file', Buffer.from('a,b\n'), 'a.csv')
    await sent.expect(201)
    await lead.delete(projectPath).expect(409)
    await lead.post(`${projectPath}/archive`).expect(200)
    await as(server, 'engineerB').delete(projectPath).expect(403)
    await lead.delete(projectPath).expect(204)
    await lead.get(projectPath).expect(404)
    expect(readdirSync(server.filesFolder)).toEqual([])
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'project.deleted',
      subjectId: project.id,
      subjectName: 'Quay',
      detail: { files: 1 },
    })
  })

  it('are not deleted where something in them must outlive them', async () => {
    const server = projectServer()
    const { lead, project, projectPath } = await startedProject(server)
    await lead.post(`${projectPath}/archive`).expect(200)
    const work = { db: server.db, now: () => server.clock.now }
    const actor = { accountId: 'demo-engineer-a', name: 'Engineer A' } as Parameters<
      typeof deleteProjectForGood
    >[1]
    const bars = [() => null, () => 'It holds an issued sheet.']
    const files = openFileStore(server.filesFolder)
    await expect(deleteProjectForGood(work, actor, project.id, { files, bars })).rejects.toThrow(
      'It holds an issued sheet.',
    )
    await lead.get(projectPath).expect(200)
    expect(existsSync(server.filesFolder)).toBe(false)
    expect(auditActions(server.db)).not.toContain('project.deleted')
  })
})

describe('the desk', { timeout: 30_000 }, () => {
  it('shows my projects, the last changed first, and what changed in them', async () => {
    const server = projectServer()
    const { line, scenario, scenarioPath } = await startedProject(server)
    await made(server, 'Newer')
    server.clock.now += 1000
    const lead = as(server, 'engineerA')
    const save = { name: 'Deeper', version: 1, content: content({ waterLevel: 3.3 }) }
    await lead.put(scenarioPath, save).expect(200)
    const desk = deskSchema.parse((await lead.get('/api/desk').expect(200)).body)
    expect(desk.projects.map(({ name }) => name)).toEqual(['Quay', 'Newer'])
    expect(desk.changes.map(({ action }) => action)).toEqual([
      'scenario.saved',
      'project.created',
      'scenario.created',
      'line.created',
      'project.created',
    ])
    expect(desk.changes[0]).toMatchObject({
      actorName: 'Engineer A',
      subjectName: 'Deeper',
      project: { name: 'Quay' },
      lineId: line.id,
      scenarioId: scenario.id,
    })
    expect(desk.changes[3]).toMatchObject({ lineId: line.id, scenarioId: null })
  })

  it('shows nothing of others', async () => {
    const server = projectServer()
    await startedProject(server)
    for (const person of ['engineerB', 'administrator', 'viewer'] as const) {
      const { body } = await as(server, person).get('/api/desk').expect(200)
      expect(deskSchema.parse(body)).toEqual({ projects: [], waiting: [], changes: [] })
    }
    await as(server, null).get('/api/desk').expect(401)
  })
})
