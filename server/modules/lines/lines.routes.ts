import type { Request } from 'express'
import {
  duplicateSchema,
  lineChangeSchema,
  lineSchema,
  linesPageSchema,
  linesQuerySchema,
  newLineSchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import { lineAsGeoJson, surveyAsCsv } from './line-files.service'
import {
  archiveLine,
  changeLine,
  createLine,
  duplicateLine,
  readLine,
  readLines,
  restoreLine,
} from './lines.service'

const PATH = '/api/projects/:projectId/lines'
const ONE = `${PATH}/:lineId`

const projectOf = (req: Request) => pathPart(req, 'projectId')
const placeOf = (req: Request) => ({ projectId: projectOf(req), lineId: pathPart(req, 'lineId') })

export function linesOperations(work: ProjectWork): readonly Operation[] {
  return [
    ...listOperations(work),
    ...oneOperations(work),
    ...fileOperations(work),
    ...keepingOperations(work),
  ]
}

function listOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listLines',
      summary: 'Lines of a project',
      rule: 'read-project',
      query: linesQuerySchema,
      response: linesPageSchema,
      problems: ['invalid-input', 'out-of-range'],
      handle: ({ req }) => readLines(work.db, projectOf(req), parseQuery(linesQuerySchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'createLine',
      summary: 'Add a line with its survey; without a survey it has one station',
      rule: 'edit-project',
      request: newLineSchema,
      response: lineSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        createLine(work, actor, projectOf(req), parseBody(newLineSchema, req)),
    }),
  ]
}

function oneOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readLine',
      summary: 'A line with its survey, and what looks like a slip in it',
      rule: 'read-project',
      response: lineSchema,
      problems: [],
      handle: ({ req }) => readLine(work.db, placeOf(req)),
    }),
    defineOperation({
      method: 'patch',
      path: ONE,
      id: 'changeLine',
      summary:
        'Change a line on the version that was read; a new survey computes its scenarios again',
      rule: 'edit-project',
      request: lineChangeSchema,
      response: lineSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeLine(work, actor, placeOf(req), parseBody(lineChangeSchema, req)),
    }),
  ]
}

function fileOperations({ db }: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: `${ONE}/stations.csv`,
      id: 'readSurveyCsv',
      summary: 'The survey as CSV; the datum stands in its heading',
      rule: 'read-project',
      mediaType: 'text/csv',
      problems: [],
      handle: ({ req, res }) => {
        const text = surveyAsCsv(db, placeOf(req))
        res.attachment('survey.csv').type('text/csv; charset=utf-8').send(text)
      },
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/line.geojson`,
      id: 'readLineGeoJson',
      summary: 'Line, stations and marks as GeoJSON, in coordinates of the local grid',
      rule: 'read-project',
      mediaType: 'application/geo+json',
      problems: ['conflict'],
      handle: ({ req, res }) => {
        const file = lineAsGeoJson(db, placeOf(req))
        res
          .attachment('line-local-grid.geojson')
          .type('application/geo+json')
          .send(JSON.stringify(file))
      },
    }),
  ]
}

function keepingOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: `${ONE}/duplicates`,
      id: 'duplicateLine',
      summary: 'A copy of the line with its survey and scenarios',
      rule: 'edit-project',
      request: duplicateSchema,
      response: lineSchema,
      status: 201,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        duplicateLine(work, actor, placeOf(req), parseBody(duplicateSchema, req).name),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/archive`,
      id: 'archiveLine',
      summary: 'Put a line away with its scenarios',
      rule: 'edit-project',
      response: lineSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) => archiveLine(work, actor, placeOf(req)),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/restoration`,
      id: 'restoreLine',
      summary: 'Take a line up again',
      rule: 'edit-project',
      response: lineSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) => restoreLine(work, actor, placeOf(req)),
    }),
  ]
}
