import type { Request } from 'express'
import {
  newSheetSchema,
  sheetChangeSchema,
  sheetMoveSchema,
  sheetPlaceSchema,
  sheetRecordSchema,
  sheetSettingsSchema,
  sheetsPageSchema,
  sheetsQuerySchema,
} from '../../../shared/schemas/sheet-api'
import { z } from 'zod'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import { settingsOf } from './open-sheet'
import { checkingOperations } from './checking.routes'
import { sheetFilesOperations } from './sheet-files.routes'
import { makeMove } from './sheet-moves.service'
import { readSheet } from './sheet-record.service'
import type { SheetWork } from './sheet-work'
import {
  changeSettings,
  changeSheet,
  createSheet,
  placeOfSheet,
  readSheets,
} from './sheets.service'

const PATH = '/api/projects/:projectId/sheets'
const ONE = `${PATH}/:sheetId`
const SETTINGS = '/api/projects/:projectId/sheet-settings'

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  sheetId: pathPart(req, 'sheetId'),
})

/** Where a move led: the sheet to look at next; null after a draft was deleted. */
const movedSchema = z.strictObject({ sheetId: z.string().nullable() })

export function sheetsOperations(work: SheetWork): readonly Operation[] {
  return [
    ...listOperations(work),
    ...oneOperations(work),
    ...settingsOperations(work),
    ...checkingOperations(work),
    ...sheetFilesOperations(work),
  ]
}

function listOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listSheets',
      summary: 'Calculation sheets of a project, every revision of them',
      rule: 'read-project',
      query: sheetsQuerySchema,
      response: sheetsPageSchema,
      problems: [],
      handle: ({ req }) =>
        readSheets(work.db, pathPart(req, 'projectId'), parseQuery(sheetsQuerySchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'addSheet',
      summary: 'Make a draft of a scenario; its figures are computed here',
      rule: 'edit-project',
      request: newSheetSchema,
      response: sheetRecordSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: async ({ req, actor }) => {
        const projectId = pathPart(req, 'projectId')
        const sheetId = await createSheet(work, actor, projectId, parseBody(newSheetSchema, req))
        return readSheet(work, actor, { projectId, sheetId })
      },
    }),
    defineOperation({
      method: 'get',
      path: '/api/sheets/:sheetId',
      id: 'findSheet',
      summary: 'In which of my projects a sheet is',
      rule: 'signed-in',
      response: sheetPlaceSchema,
      problems: ['not-found'],
      handle: ({ req, actor }) => placeOfSheet(work.db, actor.accountId, pathPart(req, 'sheetId')),
    }),
  ]
}

function oneOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readSheet',
      summary: 'A sheet with marks, comments, issue list and history, and what I may do with it',
      rule: 'read-project',
      response: sheetRecordSchema,
      problems: [],
      handle: ({ req, actor }) => readSheet(work, actor, placeOf(req)),
    }),
    defineOperation({
      method: 'patch',
      path: ONE,
      id: 'changeSheet',
      summary: 'Change words of a draft, or take its figures from a scenario anew',
      rule: 'read-project',
      request: sheetChangeSchema,
      response: sheetRecordSchema,
      problems: ['forbidden', 'conflict', 'out-of-range'],
      handle: async ({ req, actor }) => {
        await changeSheet(work, actor, placeOf(req), parseBody(sheetChangeSchema, req))
        return readSheet(work, actor, placeOf(req))
      },
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/moves`,
      id: 'moveSheet',
      summary: 'Submit, check, return, approve, issue, withdraw, revise or delete a sheet',
      rule: 'read-project',
      request: sheetMoveSchema,
      response: movedSchema,
      problems: ['forbidden', 'conflict'],
      handle: async ({ req, actor }) => ({
        sheetId: await makeMove(work, actor, placeOf(req), parseBody(sheetMoveSchema, req)),
      }),
    }),
  ]
}

function settingsOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: SETTINGS,
      id: 'readSheetSettings',
      summary: 'How sheets of a project are numbered, and who may approve them',
      rule: 'read-project',
      response: sheetSettingsSchema,
      problems: [],
      handle: ({ req }) => settingsOf(work.db, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'put',
      path: SETTINGS,
      id: 'changeSheetSettings',
      summary: 'Change the pattern of sheet numbers, or who may approve',
      rule: 'lead-project',
      request: sheetSettingsSchema,
      response: sheetSettingsSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        changeSettings(
          work,
          actor,
          pathPart(req, 'projectId'),
          parseBody(sheetSettingsSchema, req),
        ),
    }),
  ]
}
