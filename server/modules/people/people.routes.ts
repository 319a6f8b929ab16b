import {
  deactivationSchema,
  peoplePageSchema,
  peopleQuerySchema,
  personChangeSchema,
  personSchema,
} from '../../../shared/schemas/account'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import type { ServerParts } from '../../parts'
import { deactivatePerson, eraseAddress } from './deactivate-person.service'
import { changePerson, pageOfPeople } from './people.service'

export function peopleOperations(parts: ServerParts): readonly Operation[] {
  return [...peopleInOffice(parts), ...peopleLeaving(parts)]
}

function peopleInOffice(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: '/api/admin/people',
      id: 'listPeople',
      summary: 'People by name, with what they alone lead',
      rule: 'administer',
      query: peopleQuerySchema,
      response: peoplePageSchema,
      problems: [],
      handle: ({ req }) => pageOfPeople(parts, parseQuery(peopleQuerySchema, req)),
    }),
    defineOperation({
      method: 'patch',
      path: '/api/admin/people/:accountId',
      id: 'changePerson',
      summary: 'Change role, permissions or organisation',
      rule: 'administer',
      request: personChangeSchema,
      response: personSchema,
      problems: ['not-found', 'conflict', 'out-of-range'],
      handle: ({ req, actor }) => {
        const change = parseBody(personChangeSchema, req)
        return changePerson(parts, actor, pathPart(req, 'accountId'), change)
      },
    }),
  ]
}

function peopleLeaving(parts: ServerParts): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: '/api/admin/people/:accountId/deactivation',
      id: 'deactivatePerson',
      summary: 'Deactivate somebody and hand over what they lead',
      rule: 'administer',
      request: deactivationSchema,
      response: personSchema,
      problems: ['not-found', 'conflict', 'out-of-range'],
      handle: ({ req, actor }) => {
        const { handOverTo } = parseBody(deactivationSchema, req)
        return deactivatePerson(parts, actor, pathPart(req, 'accountId'), handOverTo)
      },
    }),
    defineOperation({
      method: 'delete',
      path: '/api/admin/people/:accountId/address',
      id: 'eraseAddress',
      summary: 'Erase the address of somebody deactivated; the name stays',
      rule: 'administer',
      response: personSchema,
      problems: ['not-found', 'conflict'],
      handle: ({ req, actor }) => eraseAddress(parts, actor, pathPart(req, 'accountId')),
    }),
  ]
}
