import { describe, expect, it } from 'vitest'
import { LOW_ROAD_STATIONS } from '../../../../server/demo/ferry-quay-lines'
import { LOW_ROAD_MARKS } from '../../../../server/demo/ferry-quay-marks'
import type { Line } from '../../../../shared/schemas/project'
import { matchColumns } from '../../../../src/survey/match-columns'
import { readStations } from '../../../../src/survey/read-stations'
import { readTable } from '../../../../src/survey/read-table'
import { as, projectServer, startedProject } from '../../../support/project-server'

async function withLine(change: object = {}) {
  const server = projectServer()
  const { lead, projectPath } = await startedProject(server)
  const stations = LOW_ROAD_STATIONS.map((row, i) => (i === 1 ? { ...row, note: '=1+1' } : row))
  const body = { name: 'Low road', stations, marks: LOW_ROAD_MARKS, ...change }
  const line = (await lead.post(`${projectPath}/lines`, body).expect(201)).body as Line
  return { server, lead, stations, line, path: `${projectPath}/lines/${line.id}` }
}

describe('the files of a line', () => {
  it('hold the survey as CSV, which the import reads back whole', async () => {
    const { lead, path, stations } = await withLine()
    const { text, headers } = await lead.get(`${path}/stations.csv`).expect(200)
    expect(headers['content-type']).toContain('text/csv')
    expect(text).toContain('"Ground level (m, QD)"')
    expect(text).toContain(",'=1+1")
    const table = readTable(text.replace(/^\ufeff/, ''))
    const { hasHeading, match } = matchColumns(table)
    const choice = { hasHeading, match, decimal: '.', unit: 'm', surface: '' } as const
    expect(readStations(table, choice, 10).stations).toEqual(stations)
  })

  it('hold the line as GeoJSON that says whose coordinates they are', async () => {
    const { lead, path } = await withLine()
    const { text, headers } = await lead.get(`${path}/line.geojson`).expect(200)
    expect(headers['content-type']).toContain('application/geo+json')
    const file = JSON.parse(text) as {
      type: string
      coordinateReference: { isWgs84: boolean; identifier: null; statement: string }
      verticalDatum: string
      features: { geometry: { type: string; coordinates: unknown[] }; properties: object }[]
    }
    expect(file).toMatchObject({ type: 'FeatureCollection', verticalDatum: 'QD' })
    expect(file.coordinateReference).toMatchObject({ isWgs84: false, identifier: null })
    expect(file.coordinateReference.statement).toMatch(/not known.*not WGS 84/)
    expect('crs' in file).toBe(false)
    expect(file.features).toHaveLength(29)
    expect(file.features[0]!.geometry.coordinates).toHaveLength(28)
    expect(file.features[5]).toMatchObject({
      geometry: { type: 'Point', coordinates: [40, 0] },
      properties: { kind: 'station', chainage: 40, groundLevel: 3.03 },
    })
  })

  it('are none as GeoJSON without x and y, and none for strangers', async () => {
    const bare = LOW_ROAD_STATIONS.map((row) => ({ ...row, x: null, y: null }))
    const { server, lead, path } = await withLine({ stations: bare })
    const { body } = await lead.get(`${path}/line.geojson`).expect(409)
    expect((body as { message: string }).message).toContain('has no plan')
    await as(server, 'trainer').get(`${path}/stations.csv`).expect(404)
  })
})

describe('marks, ends and picture of a line', () => {
  it('are kept, and turns of marks cut a line without x and y', async () => {
    const { lead, path, line } = await withLine()
    expect(line.marks).toEqual(LOW_ROAD_MARKS)
    expect(line.ends.start.kind).toBe('ground')
    const ends = { start: { kind: 'wall', level: 4.4 }, end: { kind: 'open', width: 2 } }
    const saved = await lead.patch(path, { version: 1, ends }).expect(200)
    expect((saved.body as Line).ends).toMatchObject(ends)
  })

  it.each([
    [
      'a well without its flow',
      { marks: [{ kind: 'well', chainage: 10, fromLevel: 2.7 }] },
      'marks[0].flow',
    ],
    [
      'a mark off the line',
      { marks: [{ kind: 'kerb', chainage: 200, level: 3 }] },
      'marks[0].chainage',
    ],
    [
      'a pipe in millimetres',
      { marks: [{ kind: 'pipe', chainage: 10, diameter: 150, level: 2 }] },
      'marks[0].diameter',
    ],
    [
      'a wall without its top',
      { ends: { start: { kind: 'wall' }, end: { kind: 'ground' } } },
      'ends.start.level',
    ],
    [
      'a picture that is not there',
      {
        background: {
          fileId: 'none',
          first: { u: 0, v: 0, x: 0, y: 0 },
          second: { u: 1, v: 1, x: 9, y: 9 },
        },
      },
      'background.fileId',
    ],
    [
      'a picture placed by one point',
      {
        background: {
          fileId: 'none',
          first: { u: 0, v: 0, x: 0, y: 0 },
          second: { u: 0, v: 0, x: 9, y: 9 },
        },
      },
      'background.second',
    ],
  ])('refuse %s, and what was there stays', async (_what, change, field) => {
    const { lead, path } = await withLine()
    const { body } = await lead.patch(path, { version: 1, ...change }).expect(422)
    expect((body as { fields: { path: string }[] }).fields[0]!.path).toBe(field)
    const { body: after } = await lead.get(path).expect(200)
    expect((after as Line).marks).toEqual(LOW_ROAD_MARKS)
    expect((after as Line).version).toBe(1)
  })
})
