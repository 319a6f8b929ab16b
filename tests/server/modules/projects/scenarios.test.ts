import { describe, expect, it } from 'vitest'
import { scenarioSummary } from '../../../../shared/checks/scenario-summary'
import { problemSchema } from '../../../../shared/schemas/problem'
import {
  type Line,
  type Scenario,
  scenarioConflictSchema,
  scenarioSchema,
  scenariosPageSchema,
  scenarioVersionContentSchema,
  scenarioVersionsSchema,
} from '../../../../shared/schemas/project'
import { scenarioContentSchema } from '../../../../shared/schemas/scenario'
import { sizeRun } from '../../../support/ferry-quay'
import {
  addMember,
  as,
  content,
  projectServer,
  startedProject,
} from '../../../support/project-server'
import { auditActions, auditOf } from '../../../support/audit-trail'

describe('a scenario', { timeout: 30_000 }, () => {
  it('carries figures that the server computed, whatever is sent', async () => {
    const { lead, line, linePath, scenario, scenarioPath } = await startedProject(projectServer())
    const expected = scenarioSummary(line, scenarioContentSchema.parse(content()))
    expect(scenario.summary).toEqual(expected)
    expect(scenario).toMatchObject({
      version: 1,
      archivedAt: null,
      createdBy: { name: 'Engineer A' },
    })
    const { body } = await lead.get(scenarioPath).expect(200)
    expect(scenarioSchema.parse(body)).toEqual(scenario)
    const forged = { name: 'Forged', content: content(), summary: expected }
    const refusal = await lead.post(`${linePath}/scenarios`, forged).expect(400)
    expect(problemSchema.parse(refusal.body).fields[0]?.path).toBe('summary')
  })

  it('is refused with every field that cannot be computed, and its range', async () => {
    const { lead, linePath } = await startedProject(projectServer())
    const [run] = content().sizes
    const barrier = { ...run!.barrier, diameter: 700 }
    const bad = content({ sizes: [{ ...run!, barrier }], place: 999 })
    const answer = await lead
      .post(`${linePath}/scenarios`, { name: 'Bad', content: bad })
      .expect(422)
    const problem = problemSchema.parse(answer.body)
    expect(problem.fields.map(({ path }) => path)).toEqual([
      'content.place',
      'content.sizes[0].barrier.diameter',
    ])
    expect(problem.fields[1]?.allowed).toBe('0.2 to 3 m')
  })

  it('answers sections without a size as not checked', async () => {
    const { lead, linePath } = await startedProject(projectServer())
    const body = { name: 'Gap', content: content({ sizes: [sizeRun(0, 10)] }) }
    const answer = await lead.post(`${linePath}/scenarios`, body).expect(201)
    expect((answer.body as Scenario).summary).toMatchObject({
      verdict: 'notChecked',
      failing: 1,
      holdsToLevel: null,
      weakest: { from: 10, check: null },
    })
  })

  it('saves its whole state as the next version, and keeps the one before', async () => {
    const server = projectServer()
    const { lead, scenario, scenarioPath } = await startedProject(server)
    server.clock.now += 60_000
    const save = { name: 'Deeper', note: 'n', version: 1, content: content({ waterLevel: 3.6 }) }
    const saved = (await lead.put(scenarioPath, save).expect(200)).body as Scenario
    expect(saved).toMatchObject({ name: 'Deeper', version: 2, updatedAt: server.clock.now })
    expect(saved.summary.waterLevel).toBe(3.6)
    const list = scenarioVersionsSchema.parse((await lead.get(`${scenarioPath}/versions`)).body)
    expect(list.versions.map(({ version, name }) => [version, name])).toEqual([
      [2, 'Deeper'],
      [1, 'As asked'],
    ])
    const { body } = await lead.get(`${scenarioPath}/versions/1`).expect(200)
    const first = scenarioVersionContentSchema.parse(body)
    expect(first.content).toEqual(scenario.content)
    expect(first.summary).toEqual(scenario.summary)
    for (const version of ['0', '3', 'x', '1e0', '01']) {
      await lead.get(`${scenarioPath}/versions/${version}`).expect(404)
    }
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'scenario.saved',
      fromVersion: 1,
      toVersion: 2,
      detail: { fields: ['name', 'note', 'waterLevel'] },
    })
  })

  it('never overwrites what somebody saved meanwhile: the answer shows it', async () => {
    const server = projectServer()
    const { lead, projectPath, scenarioPath } = await startedProject(server)
    await addMember(server, projectPath, 'engineerB', 'editor')
    const theirs = { name: 'Theirs', version: 1, content: content({ waterLevel: 3.3 }) }
    await as(server, 'engineerB').put(scenarioPath, theirs).expect(200)
    const mine = { name: 'Mine', version: 1, content: content({ waterLevel: 3.4 }) }
    const { body } = await lead.put(scenarioPath, mine).expect(409)
    const conflict = scenarioConflictSchema.parse(body)
    problemSchema.parse(body)
    expect(conflict.current).toMatchObject({ name: 'Theirs', version: 2 })
    expect(conflict.message).toContain('Engineer B saved "Theirs" meanwhile')
    expect((await lead.get(scenarioPath)).body).toEqual(conflict.current)
    await lead.put(scenarioPath, { ...mine, version: 2 }).expect(200)
    const versions = scenarioVersionsSchema.parse((await lead.get(`${scenarioPath}/versions`)).body)
    expect(versions.versions.map(({ name }) => name)).toEqual(['Mine', 'Theirs', 'As asked'])
  })

  it('takes a repeated save for the save that it repeats', async () => {
    const server = projectServer()
    const { lead, projectPath, scenarioPath } = await startedProject(server)
    await addMember(server, projectPath, 'engineerB', 'editor')
    const save = { name: 'Saved', version: 1, content: content({ waterLevel: 3.3 }) }
    const first = (await lead.put(scenarioPath, save).expect(200)).body as Scenario
    expect((await lead.put(scenarioPath, save).expect(200)).body).toEqual(first)
    // Somebody else who typed the same did not send this save.
    await as(server, 'engineerB').put(scenarioPath, save).expect(409)
    const later = { name: 'Later', version: 2, content: content({ waterLevel: 3.4 }) }
    await as(server, 'engineerB').put(scenarioPath, later).expect(200)
    // Even then the answer is what the lost one was, and the next save meets the conflict.
    expect((await lead.put(scenarioPath, save).expect(200)).body).toEqual(first)
    await lead.put(scenarioPath, { ...save, name: 'Next', version: 2 }).expect(409)
    expect(auditActions(server.db).filter((action) => action === 'scenario.saved')).toHaveLength(2)
  })

  it('makes no version of a save that changes nothing', async () => {
    const server = projectServer()
    const { lead, scenario, scenarioPath } = await startedProject(server)
    const { name, note, version } = scenario
    const same = { name, note, version, content: scenario.content }
    expect((await lead.put(scenarioPath, same).expect(200)).body).toEqual(scenario)
    expect(auditActions(server.db)).not.toContain('scenario.saved')
  })

  it('can be put back to an older version, which becomes the newest', async () => {
    const server = projectServer()
    const { lead, scenario, scenarioPath } = await startedProject(server)
    const save = { name: 'Deeper', version: 1, content: content({ waterLevel: 3.6 }) }
    await lead.put(scenarioPath, save).expect(200)
    const path = `${scenarioPath}/versions/1/restoration`
    const restored = (await lead.post(path).expect(200)).body as Scenario
    expect(restored).toMatchObject({ name: 'As asked', version: 3, content: scenario.content })
    expect(restored.summary).toEqual(scenario.summary)
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'scenario.version-restored',
      fromVersion: 2,
      toVersion: 3,
      detail: { restored: 1 },
    })
  })

  it('is copied without its history, put away, and taken up again', async () => {
    const server = projectServer()
    const { lead, linePath, scenario, scenarioPath } = await startedProject(server)
    const path = `${scenarioPath}/duplicates`
    const copy = (await lead.post(path, { name: 'Copy' }).expect(201)).body as Scenario
    expect(copy).toMatchObject({ name: 'Copy', version: 1, content: scenario.content })
    expect(copy.id).not.toBe(scenario.id)

    const away = (await lead.post(`${scenarioPath}/archive`).expect(200)).body as Scenario
    expect(away.archivedAt).toBe(server.clock.now)
    const save = { name: 'Late', version: 1, content: content({ waterLevel: 3.6 }) }
    const refusal = await lead.put(scenarioPath, save).expect(409)
    expect(scenarioConflictSchema.parse(refusal.body).current.archivedAt).not.toBeNull()
    const names = async (query: string) => {
      const { body } = await lead.get(`${linePath}/scenarios?${query}`).expect(200)
      return scenariosPageSchema.parse(body).items.map(({ name }) => name)
    }
    expect(await names('')).toEqual(['Copy'])
    expect(await names('archived=yes')).toEqual(['As asked'])
    await lead.post(`${scenarioPath}/restoration`).expect(200)
    expect((await names('sort=name&order=asc')).sort()).toEqual(['As asked', 'Copy'])
    expect(auditActions(server.db).slice(-3)).toEqual([
      'scenario.duplicated',
      'scenario.archived',
      'scenario.restored',
    ])
  })

  it('is not found through another line or project', async () => {
    const server = projectServer()
    const one = await startedProject(server)
    const two = await startedProject(server)
    const { lead } = one
    await lead.get(`${two.linePath}/scenarios/${one.scenario.id}`).expect(404)
    await lead.get(`${two.projectPath}/lines/${one.line.id}`).expect(404)
    await lead.get(`${two.projectPath}/lines/${one.line.id}/scenarios`).expect(404)
  })
})

describe('a changed survey', { timeout: 30_000 }, () => {
  it('computes the scenarios of the line again, and leaves their contents and versions', async () => {
    const server = projectServer()
    const { lead, line, linePath, scenario, scenarioPath } = await startedProject(server)
    const stations = line.stations.map((station) => ({ ...station, groundLevel: 2.6 }))
    const body = { version: 1, stations }
    const changed = (await lead.patch(linePath, body).expect(200)).body as Line
    expect(changed).toMatchObject({ version: 2, name: 'Low road', sectionLength: 10 })
    const after = (await lead.get(scenarioPath)).body as Scenario
    expect(after).toMatchObject({ version: 1, content: scenario.content })
    expect(after.summary).toEqual(scenarioSummary(changed, scenario.content))
    expect(after.summary.holdsToLevel).toBeLessThan(scenario.summary.holdsToLevel!)
    const { body: version } = await lead.get(`${scenarioPath}/versions/1`)
    expect(scenarioVersionContentSchema.parse(version).summary).toEqual(scenario.summary)
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'line.changed',
      fromVersion: 1,
      toVersion: 2,
      detail: { fields: ['stations'], recomputed: { scenarios: 1, changed: [scenario.id] } },
    })
  })

  it('turns a surface of which nothing is assumed into a section that is not checked', async () => {
    const { lead, line, linePath, scenarioPath } = await startedProject(projectServer())
    const stations = line.stations.map((station) => ({ ...station, surface: 'cobbles' }))
    const changed = await lead.patch(linePath, { version: 1, stations }).expect(200)
    expect((changed.body as Line).warnings).toMatchObject([{ path: 'stations[0].surface' }])
    const after = (await lead.get(scenarioPath)).body as Scenario
    expect(after.summary.verdict).toBe('notChecked')
    const save = { name: 'Again', version: 1, content: content() }
    const { body } = await lead.put(scenarioPath, save).expect(422)
    expect(problemSchema.parse(body).message).toContain('"cobbles"')
  })
})
