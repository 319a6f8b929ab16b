import { describe, expect, it } from 'vitest'
import {
  type Scenario,
  type ScenarioListItem,
  scenariosPageSchema,
} from '../../../../shared/schemas/project'
import { sizeRun } from '../../../support/ferry-quay'
import { content, projectServer, startedProject } from '../../../support/project-server'

async function table() {
  const server = projectServer()
  const { lead, linePath, scenarioPath } = await startedProject(server)
  await lead.post(`${scenarioPath}/archive`).expect(200)
  const path = `${linePath}/scenarios`
  const rows = [
    { name: 'beta', note: '=1+1', content: content({ waterLevel: 3.1 }) },
    { name: 'Alpha 100%', note: '', content: content({ waterLevel: 3.9, basis: 'extreme' }) },
    { name: '=cmd|calc', note: 'x, "y"', content: content({ sizes: [sizeRun(0, 10)] }) },
  ]
  for (const row of rows) {
    server.clock.now += 1000
    await lead.post(path, row).expect(201)
  }
  const read = async (query: string) => {
    const { body } = await lead.get(`${path}${query}`).expect(200)
    return scenariosPageSchema.parse(body)
  }
  const names = async (query: string) => (await read(query)).items.map(({ name }) => name)
  return { server, lead, path, linePath, read, names }
}

describe('the table of scenarios', { timeout: 30_000 }, () => {
  it('shows level, basis, edge, verdict, weakest place and holds-to level of each', async () => {
    const { read, lead, path } = await table()
    const { items, total } = await read('?search=alpha')
    expect(total).toBe(1)
    const item: ScenarioListItem = items[0]!
    const { body } = await lead.get(`${path}/${item.id}`).expect(200)
    const { content: kept, ...rest } = body as Scenario
    expect(item).toEqual({
      ...rest,
      basis: 'extreme',
      forecast: null,
      edges: { least: kept.uplift.edgeFactor, most: kept.uplift.edgeFactor },
      upliftModel: 'linear',
    })
  })

  it('is sorted by every column, with ties in a fixed order', async () => {
    const { names } = await table()
    expect(await names('')).toEqual(['=cmd|calc', 'Alpha 100%', 'beta'])
    expect(await names('?sort=name&order=asc')).toEqual(['=cmd|calc', 'Alpha 100%', 'beta'])
    expect(await names('?sort=level')).toEqual(['Alpha 100%', '=cmd|calc', 'beta'])
    expect(await names('?sort=verdict')).toEqual(['Alpha 100%', '=cmd|calc', 'beta'])
    expect(await names('?sort=holdsTo&order=asc')).toEqual(['=cmd|calc', 'beta', 'Alpha 100%'])
  })

  it('is searched in name and note, and filtered by verdict', async () => {
    const { names } = await table()
    expect(await names('?search=%25')).toEqual(['Alpha 100%'])
    expect(await names('?search=x,')).toEqual(['=cmd|calc'])
    expect(await names('?verdict=notChecked')).toEqual(['=cmd|calc'])
    expect(await names('?verdict=fails')).toEqual(['Alpha 100%'])
    expect(await names('?archived=yes')).toEqual(['As asked'])
  })

  it('comes in pages', async () => {
    const { lead, path, read } = await table()
    for (let i = 0; i < 49; i += 1) {
      await lead.post(path, { name: `n ${100 + i}`, content: content() }).expect(201)
    }
    const first = await read('?sort=name&order=asc')
    const second = await read('?sort=name&order=asc&page=2')
    expect([first.items.length, second.items.length, second.total]).toEqual([50, 2, 52])
    const ids = [...first.items, ...second.items].map(({ id }) => id)
    expect(new Set(ids).size).toBe(52)
  })

  it('is a file in which no cell is a formula', async () => {
    const { lead, path } = await table()
    const answer = await lead.get(`${path}.csv?sort=name&order=asc`).expect(200)
    expect(answer.headers['content-type']).toBe('text/csv; charset=utf-8')
    expect(answer.headers['content-disposition']).toBe('attachment; filename=scenarios.csv')
    const [head, ...rows] = answer.text.replace('\uFEFF', '').trimEnd().split('\r\n')
    expect(head!.startsWith('Scenario,Level (m),Check basis,')).toBe(true)
    expect(rows).toHaveLength(3)
    expect(rows[0]!.startsWith("'=cmd|calc,3.2,Factor 1.5 throughout,")).toBe(true)
    expect(rows[0]).toContain(',Not checked,10,20,')
    expect(rows[0]!.endsWith('"x, ""y"""')).toBe(true)
    expect(rows[2]!.endsWith(",'=1+1")).toBe(true)
    const filtered = await lead.get(`${path}.csv?verdict=fails`).expect(200)
    expect(filtered.text.trimEnd().split('\r\n')).toHaveLength(2)
  })
})
