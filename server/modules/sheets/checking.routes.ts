import type { Request } from 'express'
import { scenarioSchema } from '../../../shared/schemas/project'
import {
  commentChangeSchema,
  newCommentSchema,
  newIssueSchema,
  sheetCopySchema,
  sheetMarkChangeSchema,
  sheetRecordSchema,
} from '../../../shared/schemas/sheet-api'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import { addComment, addIssue, changeComment, markLine, openCopy } from './checking.service'
import { readSheet } from './sheet-record.service'
import type { SheetWork } from './sheet-work'

const ONE = '/api/projects/:projectId/sheets/:sheetId'

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  sheetId: pathPart(req, 'sheetId'),
})

/** What a checker and others do beside a sheet. Membership lets in; the service says who may what. */
export function checkingOperations(work: SheetWork): readonly Operation[] {
  return [...markOperations(work), ...commentOperations(work)]
}

function markOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'put',
      path: `${ONE}/marks/:line`,
      id: 'markSheetLine',
      summary: 'Tick a line of a sheet in checking, or put an own figure beside it',
      rule: 'read-project',
      request: sheetMarkChangeSchema,
      response: sheetRecordSchema,
      problems: ['forbidden', 'conflict'],
      handle: async ({ req, actor }) => {
        const at = { ...placeOf(req), line: pathPart(req, 'line') }
        await markLine(work, actor, at, parseBody(sheetMarkChangeSchema, req))
        return readSheet(work, actor, placeOf(req))
      },
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/issues`,
      id: 'addSheetIssue',
      summary: 'Note to whom a sheet in force was given',
      rule: 'read-project',
      request: newIssueSchema,
      response: sheetRecordSchema,
      status: 201,
      problems: ['forbidden', 'conflict'],
      handle: ({ req, actor }) => {
        addIssue(work, actor, placeOf(req), parseBody(newIssueSchema, req))
        return readSheet(work, actor, placeOf(req))
      },
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/scenarios`,
      id: 'copySheetInputs',
      summary: 'Put the inputs of a sheet into a scenario of their own',
      rule: 'read-project',
      request: sheetCopySchema,
      response: scenarioSchema,
      status: 201,
      problems: ['forbidden', 'conflict'],
      handle: ({ req, actor }) =>
        openCopy(work, actor, placeOf(req), parseBody(sheetCopySchema, req).name),
    }),
  ]
}

function commentOperations(work: SheetWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: `${ONE}/comments`,
      id: 'addSheetComment',
      summary: 'Comment on a line of a sheet, or on the sheet',
      rule: 'read-project',
      request: newCommentSchema,
      response: sheetRecordSchema,
      status: 201,
      problems: ['forbidden', 'conflict'],
      handle: async ({ req, actor }) => {
        await addComment(work, actor, placeOf(req), parseBody(newCommentSchema, req))
        return readSheet(work, actor, placeOf(req))
      },
    }),
    defineOperation({
      method: 'patch',
      path: `${ONE}/comments/:commentId`,
      id: 'changeSheetComment',
      summary: 'Answer a comment, or say that it is resolved',
      rule: 'read-project',
      request: commentChangeSchema,
      response: sheetRecordSchema,
      problems: ['forbidden', 'conflict'],
      handle: ({ req, actor }) => {
        const at = { ...placeOf(req), commentId: pathPart(req, 'commentId') }
        changeComment(work, actor, at, parseBody(commentChangeSchema, req))
        return readSheet(work, actor, placeOf(req))
      },
    }),
  ]
}
