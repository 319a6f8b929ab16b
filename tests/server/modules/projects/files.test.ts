import { createHash } from 'node:crypto'
import { readdirSync, readFileSync, utimesSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import sharp from 'sharp'
import { describe, expect, it } from 'vitest'
import { openFileStore } from '../../../../server/files/file-store'
import { sweepFiles } from '../../../../server/modules/files/files.service'
import { problemSchema } from '../../../../shared/schemas/problem'
import {
  type ProjectFile,
  projectFileSchema,
  projectFilesSchema,
} from '../../../../shared/schemas/project'
import { auditActions } from '../../../support/audit-trail'
import { as, projectServer, startedProject } from '../../../support/project-server'

const PDF = Buffer.from('%PDF-1.7\n%âãÏÓ\n1 0 obj\n<<>>\nendobj\n', 'latin1')

/** A photograph held upright by its camera alone, with the place where it was taken. */
function photograph(): Promise<Buffer> {
  return sharp({ create: { width: 1200, height: 800, channels: 3, background: '#1F6F8B' } })
    .withExif({ IFD0: { Copyright: 'Somebody' }, IFD3: { GPSLatitudeRef: 'N' } })
    .withMetadata({ orientation: 6 })
    .jpeg()
    .toBuffer()
}

async function started() {
  const server = projectServer()
  const { lead, projectPath } = await startedProject(server)
  const path = `${projectPath}/files`
  const send = (bytes: Buffer, name: string, caption = '') =>
    lead.post(path).field('caption', caption).attach('file', bytes, name)
  const add = async (bytes: Buffer, name: string) =>
    projectFileSchema.parse((await send(bytes, name).expect(201)).body)
  return { server, lead, path, projectPath, send, add }
}

describe('a photograph', { timeout: 30_000 }, () => {
  it('is kept upright, without its place, and with a small picture of it', async () => {
    const { server, lead, path, add } = await started()
    const sent = await photograph()
    expect((await sharp(sent).metadata()).exif?.toString('latin1')).toContain('Somebody')
    const file = await add(sent, 'quay.jpeg')
    expect(file).toMatchObject({ mediaType: 'image/jpeg', width: 800, height: 1200 })

    const { body, headers } = await lead.get(`${path}/${file.id}/content`).expect(200)
    const kept = body as Buffer
    const { exif, orientation, width } = await sharp(kept).metadata()
    expect({ exif, orientation, width }).toEqual({
      exif: undefined,
      orientation: undefined,
      width: 800,
    })
    expect(kept.toString('latin1')).not.toContain('Somebody')
    expect(headers).toMatchObject({
      'content-type': 'image/jpeg',
      'content-disposition': 'inline; filename=quay.jpeg',
      'x-content-type-options': 'nosniff',
      'cache-control': 'private, no-cache',
      etag: `"${createHash('sha256').update(kept).digest('hex')}"`,
    })
    expect(headers['content-security-policy']).toMatch(/^sandbox; default-src 'none'/)

    const preview = await lead.get(`${path}/${file.id}/preview`).expect(200)
    const small = await sharp(preview.body as Buffer).metadata()
    expect(small).toMatchObject({ format: 'webp', height: 640 })
    expect(readdirSync(server.filesFolder).sort()).toEqual([file.id, `${file.id}.preview`].sort())
  })

  it('is not sent twice to whoever has it', async () => {
    const { lead, path, add } = await started()
    const { id } = await add(await photograph(), 'quay.jpg')
    const { headers } = await lead.get(`${path}/${id}/content`)
    const again = lead.get(`${path}/${id}/content`).set('If-None-Match', String(headers.etag))
    await again.expect(304)
  })

  it.each(['png', 'webp'] as const)('may be %s, whatever its name says', async (format) => {
    const { add } = await started()
    const picture = sharp({ create: { width: 9, height: 9, channels: 4, background: '#0000' } })
    const file = await add(await picture.toFormat(format).toBuffer(), 'picture.exe')
    expect(file).toMatchObject({ name: 'picture.exe', mediaType: `image/${format}`, width: 9 })
  })
})

describe('a document', { timeout: 30_000 }, () => {
  it('is saved by its reader, and a PDF file looked at in a sandbox', async () => {
    const { lead, path, add } = await started()
    const { id } = await add(PDF, 'Übersicht "1".pdf')
    const content = await lead.get(`${path}/${id}/content`).expect(200)
    expect(content.headers['content-disposition']).toMatch(/^attachment; .*%C3%9Cbersicht/)
    expect(content.body).toEqual(PDF)
    const preview = await lead.get(`${path}/${id}/preview`).expect(200)
    expect(preview.headers['content-disposition']).toMatch(/^inline; /)
    expect(preview.headers['content-security-policy']).toMatch(/^sandbox; /)
  })

  it('of text is never shown as a page', async () => {
    const { lead, path, add } = await started()
    const file = await add(Buffer.from('<script>alert(1)</script>'), 'page.html')
    expect(file.mediaType).toBe('text/plain')
    const { headers } = await lead.get(`${path}/${file.id}/content`).expect(200)
    expect(headers['content-type']).toBe('text/plain; charset=utf-8')
    expect(headers['content-disposition']).toBe('attachment; filename=page.html.txt')
    await lead.get(`${path}/${file.id}/preview`).expect(404)
    expect((await add(Buffer.from('a,b\r\n'), 'levels.CSV')).mediaType).toBe('text/csv')
  })
})

describe('files', { timeout: 30_000 }, () => {
  it('say that their bytes are gone, and nothing of what they were', async () => {
    const { server, lead, path, add } = await started()
    const file = await add(await photograph(), 'quay.jpeg')
    await openFileStore(server.filesFolder).remove(file.id)
    for (const variant of ['content', 'preview']) {
      const { body, headers } = await lead.get(`${path}/${file.id}/${variant}`).expect(404)
      expect(problemSchema.parse(body)).toMatchObject({
        code: 'not-found',
        message: expect.stringContaining('the bytes of "quay.jpeg" are missing') as string,
      })
      expect(headers['content-type']).toContain('application/json')
      expect(headers).not.toHaveProperty('content-disposition')
    }
  })

  it('are listed, renamed, captioned and deleted, row and bytes', async () => {
    const { server, lead, path, send } = await started()
    const { id } = (await send(PDF, 'a.pdf', ' Plan ').expect(201)).body as ProjectFile
    const { files } = projectFilesSchema.parse((await lead.get(path)).body)
    expect(files).toMatchObject([{ id, name: 'a.pdf', caption: 'Plan', size: PDF.length }])
    const changed = await lead.patch(`${path}/${id}`, { name: 'b.pdf' }).expect(200)
    expect(changed.body).toMatchObject({ name: 'b.pdf', caption: 'Plan' })
    await lead.patch(`${path}/${id}`, {}).expect(200)
    await lead.delete(`${path}/${id}`).expect(204)
    await lead.get(`${path}/${id}/content`).expect(404)
    expect(readdirSync(server.filesFolder)).toEqual([])
    expect(auditActions(server.db).slice(-4)).toEqual([
      'file.added',
      'file.changed',
      'file.changed',
      'file.deleted',
    ])
  })

  it.each([
    ['a program', Buffer.from([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 0]), 'photo.jpg'],
    ['nothing', Buffer.alloc(0), 'empty.txt'],
    [
      'a picture that is broken off',
      Buffer.from('\xff\xd8\xff\xe0 not a picture', 'latin1'),
      'a.jpg',
    ],
    [
      'a drawing with scripts, as text with a control sign',
      Buffer.from('<svg>\u0000</svg>'),
      'a.svg',
    ],
    ['text that is not UTF-8', Buffer.from('\xe9t\xe9', 'latin1'), 'a.txt'],
  ])('are not %s', async (_what, bytes, name) => {
    const { server, send } = await started()
    const { body } = await send(bytes, name).expect(422)
    expect(problemSchema.parse(body).fields).toMatchObject([{ path: 'file', value: name }])
    expect(auditActions(server.db)).not.toContain('file.added')
  })

  it('are 15 MB at most, and come one at a time in a form', async () => {
    const { lead, path, send } = await started()
    const { body } = await send(Buffer.alloc(15_000_001, 0x20), 'big.txt').expect(413)
    expect(problemSchema.parse(body).message).toBe('file: it is larger than 15 MB.')
    await lead.post(path, {}).expect(415)
    await lead.post(path).field('caption', 'alone').expect(400)
    const two = lead.post(path).attach('file', PDF, 'a.pdf').attach('file', PDF, 'b.pdf')
    await two.expect(400)
    await lead.post(path).attach('other', PDF, 'a.pdf').expect(400)
    const broken = lead.post(path).set('Content-Type', 'multipart/form-data; boundary=x')
    await broken.send('--x\r\nbroken').expect(400)
    await send(PDF, 'a.pdf', 'c'.repeat(301)).expect(400)
  })

  it('never leave their folder, whatever name or id is asked for', async () => {
    const { server, lead, path, send } = await started()
    const { body } = await send(PDF, '..\\..\\../etc/pass\u202ewd.pdf').expect(201)
    expect((body as ProjectFile).name).toBe('passwd.pdf')
    for (const id of ['..%2F..%2Fetc%2Fpasswd', '%2e%2e', '..']) {
      await lead.get(`${path}/${id}/content`).expect(404)
    }
    const store = openFileStore(server.filesFolder)
    expect(() => store.nameOf('../toehold.sqlite', 'original')).toThrow('no id')
  })

  it('are not reached through another project', async () => {
    const { server, add } = await started()
    const { id } = await add(PDF, 'a.pdf')
    const other = await startedProject(server)
    await other.lead.get(`${other.projectPath}/files/${id}/content`).expect(404)
    await as(server, 'engineerB').get(`${other.projectPath}/files/${id}/content`).expect(404)
  })

  it('without a row are swept once no upload can be under way', async () => {
    const { server, add } = await started()
    const kept = await add(PDF, 'a.pdf')
    const orphan = '00000000-0000-4000-8000-000000000000'
    const unfinished = `${orphan}.x.part`
    for (const name of [orphan, `${orphan}.preview`, unfinished]) {
      writeFileSync(join(server.filesFolder, name), 'x')
    }
    const store = openFileStore(server.filesFolder)
    const work = { db: server.db, store, now: Date.now }
    expect(await sweepFiles(work)).toBe(0)
    for (const name of readdirSync(server.filesFolder)) {
      utimesSync(join(server.filesFolder, name), 0, 0)
    }
    expect(await sweepFiles(work)).toBe(1)
    expect(readdirSync(server.filesFolder)).toEqual([kept.id])
    expect(readFileSync(join(server.filesFolder, kept.id))).toEqual(PDF)
  })
})
