import type { Request } from 'express'
import {
  forecastSchema,
  forecastsSchema,
  newForecastSchema,
  newObservedSchema,
} from '../../../shared/schemas/forecast'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import {
  addObserved,
  createForecast,
  readForecast,
  readForecasts,
  readNewestForecasts,
  removeForecast,
} from './forecasts.service'

const PATH = '/api/projects/:projectId/gauges/:gaugeId/forecasts'
const ONE = `${PATH}/:forecastId`

const gaugeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  gaugeId: pathPart(req, 'gaugeId'),
})
const placeOf = (req: Request) => ({ ...gaugeOf(req), forecastId: pathPart(req, 'forecastId') })

export function forecastsOperations(work: ProjectWork): readonly Operation[] {
  return [...readOperations(work), ...changeOperations(work)]
}

function readOperations({ db }: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/projects/:projectId/forecasts',
      id: 'listNewestForecasts',
      summary: 'The newest forecast issue of each gauge of a project',
      rule: 'read-project',
      response: forecastsSchema,
      problems: [],
      handle: ({ req }) => readNewestForecasts(db, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listForecasts',
      summary: 'Forecast issues of a gauge, the newest first',
      rule: 'read-project',
      response: forecastsSchema,
      problems: [],
      handle: ({ req }) => readForecasts(db, gaugeOf(req)),
    }),
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readForecast',
      summary: 'A forecast issue with its readings and what was observed',
      rule: 'read-project',
      response: forecastSchema,
      problems: [],
      handle: ({ req }) => readForecast(db, placeOf(req)),
    }),
  ]
}

function changeOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'createForecast',
      summary: 'Add a forecast issue: a call, typed readings or those of a file',
      rule: 'edit-project',
      request: newForecastSchema,
      response: forecastSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        createForecast(work, actor, gaugeOf(req), parseBody(newForecastSchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/observed`,
      id: 'addObserved',
      summary: 'Add observed levels, which shift every later hour of the issue',
      rule: 'edit-project',
      request: newObservedSchema,
      response: forecastSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        addObserved(work, actor, placeOf(req), parseBody(newObservedSchema, req)),
    }),
    defineOperation({
      method: 'delete',
      path: ONE,
      id: 'removeForecast',
      summary: 'Delete a forecast issue; what rests on it keeps its level',
      rule: 'edit-project',
      problems: ['conflict'],
      handle: ({ req, actor }) => {
        removeForecast(work, actor, placeOf(req))
      },
    }),
  ]
}
