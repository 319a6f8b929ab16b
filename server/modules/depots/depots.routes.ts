import {
  depotChangeSchema,
  depotSchema,
  newDepotSchema,
  storeSchema,
} from '../../../shared/schemas/depot'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import {
  changeDepot,
  createDepot,
  readProjectStore,
  readStore,
  removeDepot,
} from './depots.service'

const PATH = '/api/depots'
const ONE = `${PATH}/:depotId`

export function depotsOperations(work: ProjectWork): readonly Operation[] {
  return [...readOperations(work), ...keepOperations(work)]
}

function readOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listDepots',
      summary: 'Depots of my organisation, and what they hold',
      rule: 'signed-in',
      response: storeSchema,
      problems: [],
      handle: ({ actor }) => readStore(work.db, actor.organisationId),
    }),
    defineOperation({
      method: 'get',
      path: '/api/projects/:projectId/store',
      id: 'readProjectStore',
      summary: 'The store that counts in a project: that of the organisation that made it',
      rule: 'read-project',
      response: storeSchema,
      problems: [],
      handle: ({ req }) => readProjectStore(work.db, pathPart(req, 'projectId')),
    }),
  ]
}

function keepOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'createDepot',
      summary: 'Add a depot to my organisation',
      rule: 'keep-store',
      request: newDepotSchema,
      response: depotSchema,
      status: 201,
      problems: ['out-of-range'],
      handle: ({ req, actor }) => createDepot(work, actor, parseBody(newDepotSchema, req)),
    }),
    defineOperation({
      method: 'patch',
      path: ONE,
      id: 'changeDepot',
      summary: 'Change a depot on the version that was read; its items replace all that were there',
      rule: 'keep-store',
      request: depotChangeSchema,
      response: depotSchema,
      problems: ['not-found', 'conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeDepot(work, actor, pathPart(req, 'depotId'), parseBody(depotChangeSchema, req)),
    }),
    defineOperation({
      method: 'delete',
      path: ONE,
      id: 'removeDepot',
      summary: 'Delete a depot; the audit trail keeps what it held',
      rule: 'keep-store',
      problems: ['not-found'],
      handle: ({ req, actor }) => {
        removeDepot(work, actor, pathPart(req, 'depotId'))
      },
    }),
  ]
}
