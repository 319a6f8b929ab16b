import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { letterheadRecordSchema } from '../../../shared/schemas/letterhead'
import type { Project, Line, Scenario } from '../../../shared/schemas/project'
import type { SheetRecord } from '../../../shared/schemas/sheet-api'
import { auditTrail } from '../../support/audit-trail'
import { content } from '../../support/project-server'
import { SHORT_STATIONS } from '../../support/ferry-quay'
import { makePerson, signedIn } from '../../support/people'
import { freshApp } from '../../support/server-app'

const PATH = '/api/admin/organisations/tests/letterhead'

async function start() {
  const server = freshApp()
  const admin = makePerson(server.parts, { id: 'admin', role: 'admin', name: 'Administrator' })
  return { ...server, office: await signedIn(server.app, admin) }
}

async function picture(type: 'png' | 'jpeg') {
  const blank = sharp({ create: { width: 40, height: 20, channels: 3, background: '#6b3f63' } })
  const mediaType = type === 'png' ? ('image/png' as const) : ('image/jpeg' as const)
  return { mediaType, base64: (await blank[type]().toBuffer()).toString('base64') }
}

const words = { name: 'Firm A', address: '1 Mill Lane', disclaimer: 'For the client only.' }

describe('a letterhead', () => {
  it('is blank at first, changed by an administrator, and names both versions on a collision', async () => {
    const { office, db } = await start()
    const first = letterheadRecordSchema.parse((await office.get(PATH).expect(200)).body)
    expect(first).toEqual({ name: '', address: '', disclaimer: '', logo: null, version: 1 })
    const logo = await picture('png')
    const changed = await office
      .put(PATH)
      .send({ ...words, logo, version: 1 })
      .expect(200)
    expect(changed.body).toMatchObject({ ...words, version: 2, logo: { mediaType: 'image/png' } })
    const late = await office
      .put(PATH)
      .send({ ...words, name: 'B', logo, version: 1 })
      .expect(409)
    expect(late.body).toMatchObject({ current: { ...words, version: 2 } })
    expect(auditTrail(db).at(-1)).toContain('organisation.letterhead-changed')
    await office.get('/api/admin/organisations/nowhere/letterhead').expect(404)
  })

  it('takes no logo that cannot be read, or is too large', async () => {
    const { office } = await start()
    const send = (base64: string) =>
      office.put(PATH).send({ ...words, logo: { mediaType: 'image/png', base64 }, version: 1 })
    const answer = await send(Buffer.from('no picture').toString('base64')).expect(422)
    expect(answer.text).toContain('logo: this file is not allowed')
    await send('A'.repeat(200_004)).expect(400)
  })

  it('is nobody else’s to change, and stands on the next sheet of the organisation', async () => {
    const { office, app, parts } = await start()
    const engineer = await signedIn(app, makePerson(parts, { id: 'engineer' }))
    await engineer
      .put(PATH)
      .send({ ...words, logo: null, version: 1 })
      .expect(403)
    const logo = await picture('jpeg')
    await office
      .put(PATH)
      .send({ ...words, logo, version: 1 })
      .expect(200)
    const post = async (path: string, body: object) =>
      (await engineer.post(path).send(body).expect(201)).body as unknown
    const project = (await post('/api/projects', { name: 'Quay', datum: 'QD' })) as Project
    const projectPath = `/api/projects/${project.id}`
    const lineBody = { name: 'Low road', stations: SHORT_STATIONS }
    const line = (await post(`${projectPath}/lines`, lineBody)) as Line
    const scenarioBody = { name: 'As asked', content: content() }
    const scenarios = `${projectPath}/lines/${line.id}/scenarios`
    const scenario = (await post(scenarios, scenarioBody)) as Scenario
    const source = { lineId: line.id, scenarioId: scenario.id }
    const sheet = (await post(`${projectPath}/sheets`, source)) as SheetRecord
    expect(sheet.content.letterhead).toMatchObject({ ...words, logo: { mediaType: 'image/jpeg' } })
  })
})
