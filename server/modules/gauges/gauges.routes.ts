import type { Request } from 'express'
import {
  gaugeChangeSchema,
  gaugeSchema,
  gaugesSchema,
  newGaugeSchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import { changeGauge, createGauge, readGauges, removeGauge } from './gauges.service'

const PATH = '/api/projects/:projectId/gauges'

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  gaugeId: pathPart(req, 'gaugeId'),
})

export function gaugesOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listGauges',
      summary: 'Gauges of a project: zero and correction in its datum',
      rule: 'read-project',
      response: gaugesSchema,
      problems: [],
      handle: ({ req }) => readGauges(work.db, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'createGauge',
      summary: 'Add a gauge',
      rule: 'edit-project',
      request: newGaugeSchema,
      response: gaugeSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        createGauge(work, actor, pathPart(req, 'projectId'), parseBody(newGaugeSchema, req)),
    }),
    defineOperation({
      method: 'patch',
      path: `${PATH}/:gaugeId`,
      id: 'changeGauge',
      summary: 'Change a gauge on the version that was read',
      rule: 'edit-project',
      request: gaugeChangeSchema,
      response: gaugeSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeGauge(work, actor, placeOf(req), parseBody(gaugeChangeSchema, req)),
    }),
    defineOperation({
      method: 'delete',
      path: `${PATH}/:gaugeId`,
      id: 'removeGauge',
      summary: 'Delete a gauge; the audit trail keeps its figures',
      rule: 'edit-project',
      problems: ['conflict'],
      handle: ({ req, actor }) => {
        removeGauge(work, actor, placeOf(req))
      },
    }),
  ]
}
