import type { Request } from 'express'
import {
  memberChangeSchema,
  memberSchema,
  membersSchema,
  newMemberSchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, pathPart } from '../../http/parse-input'
import type { ProjectWork } from '../projects/deed'
import {
  addMember,
  changeMemberRole,
  leaveProject,
  readMembers,
  removeMember,
} from './members.service'

const PATH = '/api/projects/:projectId/members'

const placeOf = (req: Request) => ({
  projectId: pathPart(req, 'projectId'),
  accountId: pathPart(req, 'accountId'),
})

export function membersOperations(work: ProjectWork): readonly Operation[] {
  return [...listOperations(work), ...oneOperations(work)]
}

function listOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listMembers',
      summary: 'Members of a project and their roles',
      rule: 'read-project',
      response: membersSchema,
      problems: [],
      handle: ({ req }) => readMembers(work.db, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'addMember',
      summary: 'Add somebody by the address of their account',
      rule: 'lead-project',
      request: newMemberSchema,
      response: memberSchema,
      status: 201,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        addMember(work, actor, pathPart(req, 'projectId'), parseBody(newMemberSchema, req)),
    }),
  ]
}

function oneOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'patch',
      path: `${PATH}/:accountId`,
      id: 'changeMemberRole',
      summary: 'Change the role of a member; a lead always stays',
      rule: 'lead-project',
      request: memberChangeSchema,
      response: memberSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeMemberRole(work, actor, placeOf(req), parseBody(memberChangeSchema, req).role),
    }),
    defineOperation({
      method: 'delete',
      path: `${PATH}/:accountId`,
      id: 'removeMember',
      summary: 'Remove a member; a lead always stays',
      rule: 'lead-project',
      problems: ['conflict'],
      handle: ({ req, actor }) => {
        removeMember(work, actor, placeOf(req))
      },
    }),
    defineOperation({
      method: 'delete',
      path: '/api/projects/:projectId/membership',
      id: 'leaveProject',
      summary: 'Leave a project; a lead always stays',
      rule: 'read-project',
      problems: ['conflict'],
      handle: ({ req, actor }) => {
        leaveProject(work, actor, pathPart(req, 'projectId'))
      },
    }),
  ]
}
