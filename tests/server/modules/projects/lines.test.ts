import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../../server/demo/ferry-quay-lines'
import { problemSchema } from '../../../../shared/schemas/problem'
import {
  type Gauge,
  gaugesSchema,
  type Line,
  lineSchema,
  linesPageSchema,
  scenariosPageSchema,
} from '../../../../shared/schemas/project'
import { auditOf } from '../../../support/audit-trail'
import { SHORT_STATIONS } from '../../../support/ferry-quay'
import { as, projectServer, startedProject } from '../../../support/project-server'

describe('a line', { timeout: 30_000 }, () => {
  it('keeps its survey as it was sent, blanks filled in', async () => {
    const { lead, projectPath } = await startedProject(projectServer())
    const body = { name: 'Whole', stations: LOW_ROAD_STATIONS }
    const line = (await lead.post(`${projectPath}/lines`, body).expect(201)).body as Line
    expect(lineSchema.parse(line)).toMatchObject({ sectionLength: 10, warnings: [], scenarios: 0 })
    expect(line.stations).toEqual(LOW_ROAD_STATIONS)
    const { body: list } = await lead.get(`${projectPath}/lines?search=whole`).expect(200)
    expect(linesPageSchema.parse(list).items).toMatchObject([{ stationCount: 28, length: 180 }])
  })

  it('may have 5000 stations in one request', async () => {
    const { lead, projectPath } = await startedProject(projectServer())
    const stations = Array.from({ length: 5000 }, (_, i) => ({
      ...LOW_ROAD_STATIONS[11]!,
      chainage: i,
      x: i,
      y: 0,
    }))
    const body = { name: 'Long', stations }
    const line = (await lead.post(`${projectPath}/lines`, body).expect(201)).body as Line
    expect(line.stations).toHaveLength(5000)
    const tooMany = {
      name: 'Too long',
      stations: [...stations, { ...stations[0]!, chainage: 5000 }],
    }
    await lead.post(`${projectPath}/lines`, tooMany).expect(400)
  })

  it('is refused with every station at fault', async () => {
    const { lead, projectPath } = await startedProject(projectServer())
    const [a, b, c] = SHORT_STATIONS
    const stations = [a!, { ...b!, groundLevel: 28_000 }, { ...c!, chainage: 10 }]
    const answer = await lead.post(`${projectPath}/lines`, { name: 'x', stations }).expect(422)
    expect(problemSchema.parse(answer.body).fields.map(({ path }) => path)).toEqual([
      'stations[1].groundLevel',
      'stations[2].chainage',
    ])
    const texts = [{ ...a!, chainage: '0' }]
    const refusal = await lead
      .post(`${projectPath}/lines`, { name: 'x', stations: texts })
      .expect(400)
    expect(problemSchema.parse(refusal.body).fields[0]?.path).toBe('stations[0].chainage')
  })

  it('warns of a place that does not fit its chainage, and takes it', async () => {
    const { lead, linePath } = await startedProject(projectServer())
    const stations = SHORT_STATIONS.map((station, i) => ({ ...station, x: 10.5 * i, y: 0 }))
    const line = (await lead.patch(linePath, { version: 1, stations }).expect(200)).body as Line
    expect(line.warnings.map(({ path }) => path)).toEqual([
      'stations[1].chainage',
      'stations[2].chainage',
    ])
    expect((await lead.get(linePath)).body).toEqual(line)
  })

  it('is renamed without computing anything again', async () => {
    const server = projectServer()
    const { lead, linePath } = await startedProject(server)
    const line = (await lead.patch(linePath, { version: 1, name: 'New' }).expect(200)).body as Line
    expect(line).toMatchObject({ name: 'New', sectionLength: 10, version: 2 })
    expect(line.stations).toHaveLength(3)
    expect(auditOf(server.db).at(-1)?.detail).toEqual({ fields: ['name'] })
    await lead.patch(linePath, { version: 1, name: 'Stale' }).expect(409)
  })

  it('is copied with its scenarios, put away with them, and taken up again', async () => {
    const server = projectServer()
    const { lead, projectPath, linePath, scenarioPath } = await startedProject(server)
    const copy = (await lead.post(`${linePath}/duplicates`, { name: 'Copy' }).expect(201))
      .body as Line
    expect(copy).toMatchObject({ name: 'Copy', scenarios: 1, version: 1 })
    const { body } = await lead.get(`${projectPath}/lines/${copy.id}/scenarios`).expect(200)
    expect(scenariosPageSchema.parse(body).items).toMatchObject([{ name: 'As asked', version: 1 }])

    await lead.post(`${linePath}/archive`).expect(200)
    const refusal = await lead.post(`${scenarioPath}/duplicates`, { name: 'x' }).expect(409)
    expect(problemSchema.parse(refusal.body).message).toContain('The line "Low road" is archived')
    const { body: list } = await lead.get(`${projectPath}/lines`)
    expect(linesPageSchema.parse(list).items.map(({ name }) => name)).toEqual(['Copy'])
    await lead.post(`${linePath}/restoration`).expect(200)
    await lead.post(`${scenarioPath}/duplicates`, { name: 'x' }).expect(201)
  })
})

describe('a gauge', { timeout: 30_000 }, () => {
  it('is added, changed on the version that was read, and deleted with its figures on record', async () => {
    const server = projectServer()
    const { lead, projectPath } = await startedProject(server)
    const path = `${projectPath}/gauges`
    const lock = { name: 'Lock', zero: 0.6, correction: -0.04 }
    const gauge = (await lead.post(path, lock).expect(201)).body as Gauge
    const one = `${path}/${gauge.id}`
    const changed = await lead.patch(one, { version: 1, zero: 0.61 }).expect(200)
    expect(changed.body).toMatchObject({ name: 'Lock', zero: 0.61, correction: -0.04, version: 2 })
    await lead.patch(one, { version: 1, zero: 0.62 }).expect(409)
    await lead.patch(one, { version: 2, zero: 99_999 }).expect(422)
    await lead.delete(one).expect(204)
    await lead.delete(one).expect(404)
    expect(gaugesSchema.parse((await lead.get(path)).body).gauges).toEqual([])
    expect(auditOf(server.db).at(-1)).toMatchObject({
      action: 'gauge.deleted',
      fromVersion: 2,
      detail: { zero: 0.61, correction: -0.04 },
    })
  })

  it('is not reached through another project', async () => {
    const server = projectServer()
    const one = await startedProject(server)
    const two = await startedProject(server)
    const answer = await one.lead.post(`${one.projectPath}/gauges`, { name: 'Lock', zero: 0 })
    const { id } = answer.body as Gauge
    await as(server, 'engineerA').delete(`${two.projectPath}/gauges/${id}`).expect(404)
  })
})
