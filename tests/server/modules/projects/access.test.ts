import { describe, expect, it } from 'vitest'
import {
  addMember,
  as,
  content,
  projectServer,
  startedProject,
} from '../../../support/project-server'
import { auditOf } from '../../../support/audit-trail'
import { SHORT_STATIONS } from '../../../support/ferry-quay'

type Started = Awaited<ReturnType<typeof startedProject>>

const reads = ({ projectPath, linePath, scenarioPath }: Started) => [
  projectPath,
  `${projectPath}/members`,
  `${projectPath}/gauges`,
  `${projectPath}/lines`,
  `${projectPath}/files`,
  linePath,
  `${linePath}/scenarios`,
  `${linePath}/scenarios.csv`,
  scenarioPath,
  `${scenarioPath}/versions`,
  `${scenarioPath}/versions/1`,
]

type Write = readonly ['post' | 'put' | 'patch' | 'delete', string, object?]

const writes = ({ projectPath, linePath, scenarioPath }: Started): readonly Write[] => [
  ['patch', projectPath, { version: 1, name: 'x' }],
  ['post', `${projectPath}/archive`],
  ['post', `${projectPath}/restoration`],
  ['post', `${projectPath}/duplicates`, { name: 'x' }],
  ['delete', projectPath],
  ['post', `${projectPath}/members`, { email: 'viewer@demo.invalid', role: 'reader' }],
  ['patch', `${projectPath}/members/demo-engineer-a`, { role: 'reader' }],
  ['delete', `${projectPath}/members/demo-engineer-a`],
  ['post', `${projectPath}/gauges`, { name: 'x', zero: 0 }],
  ['post', `${projectPath}/lines`, { name: 'x', stations: SHORT_STATIONS }],
  ['patch', linePath, { version: 1, name: 'x' }],
  ['post', `${linePath}/duplicates`, { name: 'x' }],
  ['post', `${linePath}/archive`],
  ['post', `${linePath}/restoration`],
  ['post', `${linePath}/scenarios`, { name: 'x', content: content() }],
  ['put', scenarioPath, { name: 'x', version: 1, content: content() }],
  ['post', `${scenarioPath}/duplicates`, { name: 'x' }],
  ['post', `${scenarioPath}/archive`],
  ['post', `${scenarioPath}/restoration`],
  ['post', `${scenarioPath}/versions/1/restoration`],
  ['post', `${projectPath}/files`],
]

describe('a project', { timeout: 30_000 }, () => {
  it('does not exist for an outsider, even of the same organisation or an administrator', async () => {
    const server = projectServer()
    const started = await startedProject(server)
    for (const person of ['engineerB', 'administrator', 'viewer'] as const) {
      for (const path of reads(started)) await as(server, person).get(path).expect(404)
    }
    for (const [method, path, body = {}] of writes(started)) {
      const expected = path.endsWith('/duplicates') && path.split('/').length === 5 ? 403 : 404
      await as(server, 'viewer')[method](path, body).expect(expected)
    }
    for (const path of reads(started)) await as(server, null).get(path).expect(401)
  })

  it('is read and never written by a reader and by a viewer', async () => {
    const server = projectServer()
    const started = await startedProject(server)
    await addMember(server, started.projectPath, 'engineerB', 'reader')
    await addMember(server, started.projectPath, 'viewer', 'reader')
    const before = auditOf(server.db).length
    for (const person of ['engineerB', 'viewer'] as const) {
      for (const path of reads(started)) await as(server, person).get(path).expect(200)
      for (const [method, path, body = {}] of writes(started)) {
        const { status } = await as(server, person)[method](path, body)
        expect(status, `${person}: ${method} ${path}`).toBe(403)
      }
    }
    expect(auditOf(server.db)).toHaveLength(before)
  })

  it('is led by its lead, not by an editor', async () => {
    const server = projectServer()
    const { projectPath } = await startedProject(server)
    await addMember(server, projectPath, 'engineerB', 'editor')
    const editor = as(server, 'engineerB')
    await editor.patch(projectPath, { version: 1, name: 'By the editor' }).expect(200)
    await editor.post(`${projectPath}/archive`).expect(403)
    await editor.delete(projectPath).expect(403)
    await editor.patch(`${projectPath}/members/demo-engineer-b`, { role: 'lead' }).expect(403)
  })
})
