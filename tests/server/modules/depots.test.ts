import { describe, expect, it } from 'vitest'
import { ferryQuaySeed, FERRY_QUAY } from '../../../server/demo/ferry-quay'
import { ferryQuayStoreSeed, MILL_LANE } from '../../../server/demo/ferry-quay-store'
import { depotSchema, storeSchema } from '../../../shared/schemas/depot'
import { as, NOON, projectServer } from '../../support/project-server'

function seeded() {
  const server = projectServer()
  ferryQuayStoreSeed(() => NOON).run(server.db)
  return server
}

describe('depots', () => {
  it('are read by everybody of the organisation, and by nobody else', async () => {
    const server = seeded()
    const { depots } = storeSchema.parse((await as(server, 'approver').get('/api/depots')).body)
    expect(depots.map(({ name }) => name)).toEqual(['Mill Lane', 'Works yard'])
    expect(depots[0]).toMatchObject({ items: MILL_LANE.items, crews: MILL_LANE.crews })
    const other = storeSchema.parse((await as(server, 'checker').get('/api/depots')).body)
    expect(other.depots).toEqual([])
  })

  it('count in a project for every member as those of whoever made it', async () => {
    const server = seeded()
    ferryQuaySeed(() => NOON).run(server.db)
    const path = `/api/projects/${FERRY_QUAY.project}/store`
    for (const person of ['engineerA', 'checker', 'viewer'] as const) {
      const store = storeSchema.parse((await as(server, person).get(path).expect(200)).body)
      expect(store.organisation.name).toBe('Mill Lane Engineers')
      expect(store.depots).toHaveLength(2)
    }
    await as(server, 'trainer').get(path).expect(404)
  })

  it('are kept by engineers: made, changed on their version, removed', async () => {
    const server = seeded()
    const lead = as(server, 'engineerA')
    const items = [{ kind: 'closure', serviceable: 3 }]
    const answer = await lead.post('/api/depots', { name: 'Quay', items }).expect(201)
    const made = depotSchema.parse(answer.body)
    const path = `/api/depots/${made.id}`
    const changed = await lead
      .patch(path, { version: 1, items: [{ kind: 'blower', serviceable: 2, inRepair: 1 }] })
      .expect(200)
    expect(depotSchema.parse(changed.body)).toMatchObject({
      name: 'Quay',
      version: 2,
      items: [{ kind: 'blower', serviceable: 2, inRepair: 1 }],
    })
    await lead.patch(path, { version: 1, name: 'Late' }).expect(409)
    await as(server, 'checker').patch(path, { version: 2, name: 'No' }).expect(403)
    await lead.delete(path).expect(204)
    await lead.delete(path).expect(404)
  })

  it.each([
    [
      'a tube that nobody knows',
      { kind: 'tube', barrierId: 'tube-9', serviceable: 1 },
      'barrierId',
    ],
    ['a tube without its size', { kind: 'tube', serviceable: 1 }, 'barrierId'],
    ['a plug without its pipe', { kind: 'plug', serviceable: 1 }, 'diameter'],
    ['bags without their mass', { kind: 'edge-bag', serviceable: 1 }, 'mass'],
  ])('refuse %s', async (_what, item, field) => {
    const body = { name: 'Quay', items: [item] }
    const answer = await as(seeded(), 'engineerA').post('/api/depots', body).expect(422)
    const { fields } = answer.body as { fields: { path: string }[] }
    expect(fields.map(({ path }) => path)).toEqual([`items[0].${field}`])
  })
})
