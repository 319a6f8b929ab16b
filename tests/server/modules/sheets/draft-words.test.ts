import sharp from 'sharp'
import { expect, it } from 'vitest'
import type { ProjectFile } from '../../../../shared/schemas/project'
import { sheetRecordSchema } from '../../../../shared/schemas/sheet-api'
import { as, projectServer } from '../../../support/project-server'
import { startedSheet } from '../../../support/sheets'

it(
  'words of a draft, its settings and photographs are written by its preparer',
  { timeout: 60_000 },
  async () => {
    const server = projectServer()
    const { path, projectPath, sheet } = await startedSheet(server)
    const lead = as(server, 'engineerA')
    const upload = async (name: string, bytes: Buffer) =>
      (await lead.post(`${projectPath}/files`).attach('file', bytes, name).expect(201))
        .body as ProjectFile
    const blank = { width: 2000, height: 1500, channels: 3 as const, background: '#8ba37f' }
    const photograph = await upload('bank.png', await sharp({ create: blank }).png().toBuffer())
    const note = await upload('note.txt', Buffer.from('Low road'))

    const words = {
      title: 'Low road, at the gully',
      project: {
        ...{ name: 'Quay flood plan', client: 'Town Council', site: 'Low road' },
        documents: [{ label: 'Flood plan', number: 'FQ-FP-02' }],
      },
      ...{ category: 3, purpose: 'For the flood plan.', paper: 'us-letter', units: 'us' },
      conditions: ['the gully is plugged', 'the edge is weighed'],
      assumptions: [{ text: 'Turf is mown', isToBeConfirmed: true }],
      photographs: [{ fileId: photograph.id, caption: 'The bank' }],
    }
    const refused = await lead
      .patch(path, { version: 1, photographs: [{ fileId: note.id, caption: '' }] })
      .expect(422)
    expect(refused.text).toContain('photographs: \\"note.txt\\" is not allowed')

    const answer = await lead.patch(path, { version: sheet.version, ...words }).expect(200)
    const { content, version } = sheetRecordSchema.parse(answer.body)
    const { title: place, photographs: _, ...others } = words
    expect(content).toMatchObject({ place, ...others })
    expect(content.result).toEqual(sheet.content.result)
    const [printed] = content.photographs
    expect(printed).toMatchObject({ caption: 'The bank', fileId: photograph.id })
    const { width } = await sharp(Buffer.from(printed!.picture.base64, 'base64')).metadata()
    expect(width).toBe(1280)

    // A caption changes, its picture stays; a save on the older version names what is there now.
    const caption = { photographs: [{ fileId: photograph.id, caption: 'The bank at ch 5' }] }
    const again = await lead.patch(path, { version, ...caption }).expect(200)
    const [kept] = sheetRecordSchema.parse(again.body).content.photographs
    expect(kept!.picture).toEqual(printed!.picture)
    const late = await lead.patch(path, { version, purpose: 'Late' }).expect(409)
    expect(late.body).toMatchObject({
      current: { version: version + 1, title: place, purpose: 'For the flood plan.', ...caption },
    })
  },
)
