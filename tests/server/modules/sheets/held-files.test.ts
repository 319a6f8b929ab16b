import { spawnSync } from 'node:child_process'
import { mkdtempSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { afterAll, describe, expect, it } from 'vitest'
import type { VerifiedFile } from '../../../../shared/schemas/verification'
import { frozenDocument } from '../../../../server/modules/sheets/composing'
import { readAttachment } from '../../../../server/typesetting/read-attachment'
import { as, projectServer, type ProjectServer } from '../../../support/project-server'
import { startedSheet } from '../../../support/sheets'

const folder = mkdtempSync(join(tmpdir(), 'toehold-held-'))
afterAll(() => rmSync(folder, { recursive: true, force: true }))

function written(name: string, bytes: Buffer): string {
  const file = join(folder, name)
  writeFileSync(file, bytes)
  return file
}

/** What a tool of poppler makes of files; it wrote none of our code. */
function madeBy(tool: string, ...words: readonly string[]): Buffer {
  const target = join(folder, `${tool}.pdf`)
  const { status, error } = spawnSync(tool, [...words, target])
  if (error) throw error
  expect(status).toBe(0)
  return readFileSync(target)
}

/** A page of somebody else's report. */
const REPORT = `%PDF-1.4
1 0 obj<</Type/Catalog/Pages 2 0 R>>endobj
2 0 obj<</Type/Pages/Kids[3 0 R]/Count 1>>endobj
3 0 obj<</Type/Page/Parent 2 0 R/MediaBox[0 0 595 842]/Contents 4 0 R/Resources<</Font<</F 5 0 R>>>>>>endobj
4 0 obj<</Length 62>>stream
BT /F 12 Tf 72 720 Td (Appendix C of the flood plan: 3.99 m) Tj ET
endstream endobj
5 0 obj<</Type/Font/Subtype/Type1/BaseFont/Helvetica>>endobj
trailer<</Root 1 0 R>>
`

/** The file with the sheet inside it exchanged for another, as an editor of PDF files saves it. */
function withOtherSheet(pdf: Buffer, change: (json: string) => string): Buffer {
  const text = pdf.toString('latin1')
  const [, number = ''] = /(\d+) 0 obj\s*<<(?:(?!endobj)[\s\S])*?\/EmbeddedFile/.exec(text) ?? []
  const start = /startxref\s+(\d+)/.exec(text.slice(-200))?.[1] ?? ''
  const [, trailer = ''] = /trailer\s*<<([\s\S]*?)>>\s*startxref/.exec(text.slice(-2000)) ?? []
  const json = Buffer.from(change(readAttachment(pdf)!))
  const object = Buffer.concat([
    Buffer.from(`\n${number} 0 obj\n<</Type /EmbeddedFile /Length ${json.length}>>\nstream\n`),
    json,
    Buffer.from('\nendstream\nendobj\n'),
  ])
  const offset = String(pdf.length + 1).padStart(10, '0')
  const table = `xref\n${number} 1\n${offset} 00000 n \ntrailer\n<<${trailer}/Prev ${start}>>\n`
  const end = `startxref\n${pdf.length + object.length}\n%%EOF\n`
  return Buffer.concat([pdf, object, Buffer.from(table + end)])
}

async function upload(server: ProjectServer, bytes: Buffer): Promise<VerifiedFile> {
  const sent = as(server, null).post('/api/verify').attach('file', bytes, 'report.pdf')
  return (await sent.expect(200)).body as VerifiedFile
}

async function issued(server: ProjectServer) {
  const { path, moved, read } = await startedSheet(server)
  await moved('engineerA', 'issue-for-information')
  const { content } = await read()
  const answer = await as(server, 'viewer').get(`${path}/sheet.pdf`).buffer().expect(200)
  return { content, pdf: answer.body as Buffer }
}

describe('a report that a sheet went into', { timeout: 120_000 }, () => {
  it('is compared when it was merged or printed, and names what was changed', async () => {
    const server = projectServer()
    const { pdf, content } = await issued(server)
    const report = written('cover.pdf', Buffer.from(REPORT, 'latin1'))
    const sheet = written('issued.pdf', pdf)
    const number = content.number

    const merged = await upload(server, madeBy('pdfunite', report, sheet))
    expect(merged).toMatchObject({ answer: 'not-the-file', differences: [], sheet: { number } })
    const printed = await upload(server, madeBy('pdftocairo', '-pdf', sheet))
    expect(printed).toMatchObject({ answer: 'not-the-file', differences: [], sheet: { number } })

    const lower = { ...content, groundLevel: content.groundLevel! - 0.2 }
    const tampered = written('tampered.pdf', (await frozenDocument(lower)).pdf)
    const answer = await upload(server, madeBy('pdfunite', report, tampered))
    expect(answer).toMatchObject({ answer: 'changed', sheet: { number } })
    const ours = content.groundLevel!.toFixed(3)
    expect(answer.differences.map(({ issued: was }) => was)).toContain(ours)
    expect(answer.differences.map(({ found }) => found)).toContain(lower.groundLevel.toFixed(3))
  })

  it('is changed when only the figures inside it were exchanged', async () => {
    const server = projectServer()
    const { pdf, content } = await issued(server)
    const friction = content.case.ground.friction
    const edited = withOtherSheet(pdf, (json) =>
      json.replace(`"friction": ${friction}`, '"friction": 0.75'),
    )
    const answer = await upload(server, edited)
    expect(answer.answer).toBe('changed')
    expect(answer.differences).toContainEqual({
      where: 'Friction, skirt on ground',
      issued: String(friction),
      found: '0.75',
    })
    expect((await upload(server, Buffer.from(REPORT, 'latin1'))).answer).toBe('unknown')
  })
})
