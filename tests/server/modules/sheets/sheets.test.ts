import { createHash } from 'node:crypto'
import { sql } from 'drizzle-orm'
import { describe, expect, it } from 'vitest'
import type { SheetRecord } from '../../../../shared/schemas/sheet-api'
import { sheetRecordSchema } from '../../../../shared/schemas/sheet-api'
import { sheetSchema } from '../../../../shared/schemas/sheet'
import type { VerifiedFile, VerifiedSheet } from '../../../../shared/schemas/verification'
import { verifiedSheetSchema } from '../../../../shared/schemas/verification'
import { digestText } from '../../../../shared/sheet/sheet-digest'
import { readAttachment } from '../../../../server/typesetting/read-attachment'
import { frozenDocument } from '../../../../server/modules/sheets/composing'
import { bodyBytes } from '../../../support/body-bytes'
import { as, type Person, projectServer, type ProjectServer } from '../../../support/project-server'
import { startedSheet, stepsOf } from '../../../support/sheets'

const sha256 = (bytes: string | Buffer) => createHash('sha256').update(bytes).digest('hex')

const pdfOf = (server: ProjectServer, path: string, person: Person = 'viewer') =>
  bodyBytes(as(server, person).get(`${path}/sheet.pdf`))

const recipients = ({ db }: ProjectServer, subject: string) =>
  db
    .all<{ recipient: string }>(
      sql`select recipient from mails where subject like ${`%${subject}%`} order by recipient`,
    )
    .map(({ recipient }) => recipient)

async function approved(server: ProjectServer) {
  const started = await startedSheet(server)
  const { moved } = started
  await moved('engineerA', 'submit')
  await moved('checker', 'check')
  await moved('approver', 'approve')
  return started
}

describe('a sheet in checking', { timeout: 60_000 }, () => {
  it('takes ticks, own figures and comments of its checker, and of nobody else', async () => {
    const server = projectServer()
    const { path, moved, read } = await startedSheet(server)
    const checker = as(server, 'checker')
    const tick = { isTicked: true, figure: null }
    await checker.put(`${path}/marks/2.1`, tick).expect(409)
    await moved('engineerA', 'submit')
    await as(server, 'engineerA').put(`${path}/marks/2.1`, tick).expect(403)
    await as(server, 'approver').put(`${path}/marks/2.1`, tick).expect(403)
    await checker.put(`${path}/marks/99.1`, tick).expect(404)
    await checker.put(`${path}/marks/2.1`, tick).expect(200)
    const own = { isTicked: true, figure: 0.8, note: 'by hand' }
    await checker.put(`${path}/marks/2.2`, own).expect(200)
    expect((await read()).marks.map(({ line, figure, by }) => [line, figure, by])).toEqual([
      ['2.1', null, 'Checker'],
      ['2.2', 0.8, 'Checker'],
    ])

    const comments = `${path}/comments`
    await as(server, 'viewer').post(comments, { text: 'Why?' }).expect(403)
    await checker.post(comments, { line: '2.1', text: 'Where is the friction from?' }).expect(201)
    const [comment] = (await read()).comments
    const one = `${comments}/${comment!.id}`
    await as(server, 'engineerA').patch(one, { isResolved: true }).expect(403)
    await as(server, 'engineerA').patch(one, { answer: 'Drag test of May.' }).expect(200)
    await checker.patch(one, { isResolved: true }).expect(200)
    expect((await read()).comments[0]).toMatchObject({
      ...{ line: '2.1', answer: 'Drag test of May.', answeredBy: 'Engineer A' },
      resolvedBy: 'Checker',
    })
  })

  it('goes back with a reason, loses its ticks with new figures, and tells who waits', async () => {
    const server = projectServer()
    const { path, moved, read, sheet } = await startedSheet(server)
    await moved('engineerA', 'submit')
    await as(server, 'checker').put(`${path}/marks/2.1`, { isTicked: true, figure: null })
    await moved('checker', 'return', 'The friction has no source')
    const { lineId, scenarioId } = sheet.source
    const { version, history } = await read()
    expect(history.at(-1)).toMatchObject({
      ...{ move: 'return', from: 'in-checking', to: 'returned', by: 'Checker' },
      reason: 'The friction has no source',
    })
    const source = { lineId, scenarioId, place: 12 }
    await as(server, 'engineerB').patch(path, { version, source }).expect(403)
    const answer = await as(server, 'engineerA').patch(path, { version, source }).expect(200)
    const changed = sheetRecordSchema.parse(answer.body)
    expect(changed.marks).toEqual([])
    expect(changed.source.place).toBe(12)
    expect(changed.content.place).toBe('Low road, chainage 12')
    expect(recipients(server, 'waits for a check')).toEqual(['checker@demo.invalid'])
    expect(recipients(server, 'was returned')).toEqual(['engineer.a@demo.invalid'])
  })

  it('opens as a copy for whoever checks, and for no reader', async () => {
    const server = projectServer()
    const { path, sheet, linePath } = await startedSheet(server)
    await as(server, 'viewer').post(`${path}/scenarios`, { name: 'Mine' }).expect(403)
    const copy = await as(server, 'checker').post(`${path}/scenarios`, { name: 'Mine' }).expect(201)
    const { id } = copy.body as { id: string }
    const { body } = await as(server, 'engineerB').get(`${linePath}/scenarios/${id}`).expect(200)
    expect((body as { content: object }).content).toEqual(sheet.content.line!.content)
  })
})

describe('an approved sheet', { timeout: 60_000 }, () => {
  it('is frozen byte for byte, prints its digest, and verifies for anybody', async () => {
    const server = projectServer()
    const { path, read, scenarioPath, lead, scenario } = await approved(server)
    const record = await read()
    const pdf = await pdfOf(server, path)
    expect(sha256(pdf)).toBe(record.fileSha256)
    const attached = sheetSchema.parse(JSON.parse(readAttachment(pdf)!))
    expect(attached).toEqual(record.content)
    expect(sha256(digestText(attached))).toBe(record.digest)
    expect(record.content.people).toMatchObject({
      prepared: { name: 'Engineer A', organisation: 'Mill Lane Engineers' },
      checked: { name: 'Checker', organisation: 'Second Look Checking' },
      approved: { name: 'Approver' },
    })
    expect(record.drift.differences).toEqual([])

    // Whatever happens to the scenario, nothing frozen changes.
    const { name, note, version } = scenario
    const changed = { ...scenario.content, waterLevel: 3.3 }
    await lead.put(scenarioPath, { name, note, version, content: changed }).expect(200)
    expect((await pdfOf(server, path)).equals(pdf)).toBe(true)

    const open = await as(server, null).get(`/api/verify/${record.code!.toLowerCase()}`)
    const verified: VerifiedSheet = verifiedSheetSchema.parse(open.body)
    expect(verified).toMatchObject({ number: 'S-001', revision: 'A', status: 'approved' })
    expect(verified.signatures.map(({ organisation }) => organisation)).toEqual([
      'Mill Lane Engineers',
      'Second Look Checking',
      'Mill Lane Engineers',
    ])
    expect(open.text).not.toContain('Engineer A')
    const last = `/api/verify/${record.code}/pages/${record.pages}`
    const page = await as(server, null).get(last).expect(200)
    expect((page.body as Buffer).subarray(1, 4).toString()).toBe('PNG')
    await as(server, null).get(`/api/verify/${record.code}/pages/0`).expect(404)
    await as(server, null)
      .get(`/api/verify/${record.code}/pages/${record.pages + 1}`)
      .expect(404)
  })

  it('keeps its project, its signatures, and is superseded by the next revision', async () => {
    const server = projectServer()
    const { path, projectPath, moved, read } = await approved(server)
    await as(server, 'approver')
      .post(`${path}/issues`, { recipient: 'Council <clerk@council.test>' })
      .expect(201)
    const next = await moved('engineerB', 'revise', 'Level of the new forecast')
    const second = stepsOf(server, `${projectPath}/sheets/${next}`)
    const draft = await second.read('engineerB')
    expect(draft).toMatchObject({ revision: 'B', status: 'draft', number: 'S-001' })
    expect(draft.content.people.approved).toBeNull()
    const again = as(server, 'engineerA').post(`${path}/moves`, {
      ...{ move: 'revise', reason: 'again', version: (await read()).version },
    })
    await again.expect(409)
    const changes = await as(server, 'viewer').get(`${projectPath}/sheets/${next}/changes`)
    expect(changes.body).toMatchObject({ against: 'A' })
    expect(JSON.stringify(changes.body)).toContain('revisionReason')

    await second.moved('engineerB', 'issue-for-information')
    const before = await read()
    expect(before.status).toBe('superseded')
    expect(before.content.status).toBe('approved')
    const { body } = await as(server, null).get(`/api/verify/${before.code}`).expect(200)
    expect(body as VerifiedSheet).toMatchObject({ supersededBy: { revision: 'B' } })
    expect(recipients(server, 'was superseded')).toContain('clerk@council.test')

    server.db.run(sql`update accounts set deactivated_at = 1, email = null where name = 'Approver'`)
    expect((await read()).approved?.person.name).toBe('Approver')
    await as(server, 'engineerA').post(`${projectPath}/archive`).expect(200)
    const deletion = await as(server, 'engineerA').delete(projectPath).expect(409)
    expect(deletion.text).toContain('2 sheets were issued')
  })
})

describe('a file that somebody holds', { timeout: 60_000 }, () => {
  const upload = async (server: ProjectServer, bytes: Buffer) => {
    const sent = as(server, null).post('/api/verify').attach('file', bytes, 'sheet.pdf')
    return (await sent.expect(200)).body as VerifiedFile
  }

  it('is the one that was issued, saved again, changed, or none of ours', async () => {
    const server = projectServer()
    const { path, read } = await approved(server)
    const pdf = await pdfOf(server, path)
    expect(await upload(server, pdf)).toMatchObject({ answer: 'issued', differences: [] })

    // Bytes behind the end of a file: what programs that add a note or a signature leave.
    const saved = Buffer.concat([pdf, Buffer.from('\n% saved again\n')])
    const same = await upload(server, saved)
    expect(same).toMatchObject({ answer: 'not-the-file', differences: [] })
    expect(same.sheet?.number).toBe('S-001')

    const { content } = await read()
    const louder = { ...content, conditions: [], groundLevel: content.groundLevel! + 0.1 }
    const tampered = await upload(server, (await frozenDocument(louder)).pdf)
    expect(tampered.answer).toBe('changed')
    expect(tampered.differences).toContainEqual({
      where: 'Ground level at the weld line',
      issued: `${content.groundLevel!.toFixed(3)}\u00a0m`,
      found: `${louder.groundLevel.toFixed(3)}\u00a0m`,
    })
    expect(tampered.differences.some(({ where }) => /^Page \d/.test(where))).toBe(true)

    const other = { ...content, verification: null }
    expect(await upload(server, (await frozenDocument(other)).pdf)).toEqual({
      ...{ answer: 'unknown', sheet: null, differences: [] },
    })
    expect((await upload(server, Buffer.from('no PDF at all'))).answer).toBe('unknown')
  })

  it('and its code cannot be guessed: whoever tries is slowed down', async () => {
    const server = projectServer()
    const codes = Array.from({ length: 31 }, (_, i) => `0000-0000-${String(i).padStart(4, '0')}`)
    const answers: number[] = []
    for (const code of codes) {
      answers.push((await as(server, null).get(`/api/verify/${code}`)).status)
    }
    expect(answers.slice(0, 30).every((status) => status === 404)).toBe(true)
    expect(answers[30]).toBe(429)
  })
})

it('numbers by the pattern of the project, and gives no number twice', async () => {
  const server = projectServer()
  const { projectPath, moved, sheet, line, scenario, lead } = await startedSheet(server)
  expect(sheet.number).toBe('S-001')
  await moved('engineerA', 'delete')
  const settings = { numberPattern: 'FQ-####/C', separateApprover: 'always' }
  await as(server, 'engineerB').put(`${projectPath}/sheet-settings`, settings).expect(403)
  await lead.put(`${projectPath}/sheet-settings`, settings).expect(200)
  await lead.put(`${projectPath}/sheet-settings`, { ...settings, numberPattern: 'FQ' }).expect(400)
  const body = { lineId: line.id, scenarioId: scenario.id }
  const next = (await lead.post(`${projectPath}/sheets`, body).expect(201)).body as SheetRecord
  expect(next.number).toBe('FQ-0002/C')
  const off = await lead.post(`${projectPath}/sheets`, { ...body, place: 900 }).expect(422)
  expect(off.text).toContain('place: 900')
})
