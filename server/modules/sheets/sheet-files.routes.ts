import type { Request, Response } from 'express'
import { z } from 'zod'
import { sheetChangesSchema } from '../../../shared/schemas/sheet-api'
import { defineOperation, type Operation } from '../../http/operation'
import { parseQuery, pathPart } from '../../http/parse-input'
import { sendFile } from '../files/send-file'
import { sheetAt } from './open-sheet'
import { fileName, pdfOf } from './sheet-files.service'
import { readChanges } from './sheet-record.service'
import { tableOf } from './composing'
import type { SheetWork } from './sheet-work'

const ONE = '/api/projects/:projectId/sheets/:sheetId'

const pdfQuery = z.object({
  marked: z
    .enum(['no', 'yes'])
    .default('no')
    .meta({ description: 'yes: with the present status across every page, not the frozen file' }),
})

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  sheetId: pathPart(req, 'sheetId'),
})

function send(res: Response, name: string, mediaType: string, bytes: Buffer | string): void {
  res.attachment(name)
  res.set({ 'Content-Type': mediaType, 'X-Content-Type-Options': 'nosniff' })
  res.send(typeof bytes === 'string' ? Buffer.from(bytes) : bytes)
}

/** A sheet as PDF, JSON and CSV, and what is new in it. */
export function sheetFilesOperations(work: SheetWork): readonly Operation[] {
  return [
    pdfOperation(work),
    ...dataOperations(work),
    defineOperation({
      method: 'get',
      path: `${ONE}/changes`,
      id: 'readSheetChanges',
      summary: 'What is new against the revision before, inputs and results side by side',
      rule: 'read-project',
      response: sheetChangesSchema,
      problems: [],
      handle: ({ req }) => readChanges(work.db, placeOf(req)),
    }),
  ]
}

function pdfOperation(work: SheetWork): Operation {
  return defineOperation({
    method: 'get',
    path: `${ONE}/sheet.pdf`,
    id: 'readSheetPdf',
    summary: 'A sheet as PDF; once issued, the very file that was issued',
    rule: 'read-project',
    query: pdfQuery,
    mediaType: 'application/pdf',
    problems: ['conflict'],
    handle: async ({ req, res }) => {
      const { marked } = parseQuery(pdfQuery, req)
      const pdf = await pdfOf(work, placeOf(req), marked === 'yes')
      const { name } = pdf
      if (pdf.kind === 'made') return send(res, name, 'application/pdf', pdf.bytes)
      const { id, checksum } = pdf
      const common = {
        mediaType: 'application/pdf',
        variant: 'original',
        shown: 'attachment',
      } as const
      return sendFile(res, work.store, { id, name, checksum, ...common })
    },
  })
}

function dataOperations({ db }: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: `${ONE}/sheet.json`,
      id: 'readSheetJson',
      summary: 'Inputs, results and words of a sheet; the batch command sets it again',
      rule: 'read-project',
      mediaType: 'application/json',
      problems: [],
      handle: ({ req, res }) => {
        const row = sheetAt(db, placeOf(req))
        const text = `${JSON.stringify(row.content, null, 2)}\n`
        send(res, fileName(row, 'json'), 'application/json', text)
      },
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/sheet.csv`,
      id: 'readSheetCsv',
      summary: 'The derivation of a sheet as CSV, printed and unrounded figures',
      rule: 'read-project',
      mediaType: 'text/csv',
      problems: ['conflict'],
      handle: async ({ req, res }) => {
        const row = sheetAt(db, placeOf(req))
        send(res, fileName(row, 'csv'), 'text/csv; charset=utf-8', await tableOf(row.content))
      },
    }),
  ]
}
