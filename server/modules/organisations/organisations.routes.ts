import {
  organisationNameSchema,
  organisationSchema,
  organisationsSchema,
} from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ServerParts } from '../../parts'
import { listOrganisations } from './organisations.queries'
import { changeOrganisation, createOrganisation } from './organisations.service'

export function organisationsOperations(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/admin/organisations',
      id: 'listOrganisations',
      summary: 'All organisations, each with how many people belong to it',
      rule: 'administer',
      response: organisationsSchema,
      problems: [],
      handle: () => ({ organisations: listOrganisations(parts.db) }),
    }),
    defineOperation({
      method: 'post',
      path: '/api/admin/organisations',
      id: 'createOrganisation',
      summary: 'A new organisation',
      rule: 'administer',
      status: 201,
      request: organisationNameSchema,
      response: organisationSchema,
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        createOrganisation(parts, actor, parseBody(organisationNameSchema, req).name),
    }),
    defineOperation({
      method: 'patch',
      path: '/api/admin/organisations/:organisationId',
      id: 'renameOrganisation',
      summary: 'Rename an organisation',
      rule: 'administer',
      request: organisationNameSchema,
      response: organisationSchema,
      problems: ['not-found', 'conflict'],
      handle: ({ req, actor }) =>
        changeOrganisation(parts, actor, {
          id: pathPart(req, 'organisationId'),
          name: parseBody(organisationNameSchema, req).name,
        }),
    }),
  ]
}
