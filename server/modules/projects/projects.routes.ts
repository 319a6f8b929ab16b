import {
  duplicateSchema,
  newProjectSchema,
  projectChangeSchema,
  projectSchema,
  projectsPageSchema,
  projectsQuerySchema,
} from '../../../shared/schemas/project'
import { defineOperation, type Operation } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import type { ProjectWork } from './deed'
import { duplicateProject } from './duplicate-project.service'
import { changeProject, createProject, listProjects, readProject } from './projects.service'
import {
  archiveProject,
  deleteProjectForGood,
  type DeletionParts,
  restoreProject,
} from './put-away-project.service'

const PATH = '/api/projects'
const ONE = `${PATH}/:projectId`

export function projectsOperations(
  work: ProjectWork,
  deletion: DeletionParts,
): readonly Operation[] {
  return [
    ...listOperations(work),
    ...oneOperations(work),
    ...keepingOperations(work),
    defineOperation({
      method: 'delete',
      path: ONE,
      id: 'deleteProject',
      summary: 'Delete an archived project for good, with everything in it',
      rule: 'lead-project',
      problems: ['conflict'],
      handle: ({ req, actor }) =>
        deleteProjectForGood(work, actor, pathPart(req, 'projectId'), deletion),
    }),
  ]
}

function listOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listProjects',
      summary: 'Projects that whoever asks is a member of',
      rule: 'signed-in',
      query: projectsQuerySchema,
      response: projectsPageSchema,
      problems: ['invalid-input', 'out-of-range'],
      handle: ({ req, actor }) =>
        listProjects(work.db, actor, parseQuery(projectsQuerySchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'createProject',
      summary: 'Make a project; whoever makes it leads it',
      rule: 'make-project',
      request: newProjectSchema,
      response: projectSchema,
      status: 201,
      problems: [],
      handle: ({ req, actor }) => createProject(work, actor, parseBody(newProjectSchema, req)),
    }),
  ]
}

function oneOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readProject',
      summary: 'A project, and the role of whoever asks in it',
      rule: 'read-project',
      response: projectSchema,
      problems: [],
      handle: ({ req, actor }) => readProject(work.db, actor, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'patch',
      path: ONE,
      id: 'changeProject',
      summary: 'Change a project on the version that was read',
      rule: 'edit-project',
      request: projectChangeSchema,
      response: projectSchema,
      problems: ['conflict', 'out-of-range'],
      handle: ({ req, actor }) =>
        changeProject(work, actor, pathPart(req, 'projectId'), parseBody(projectChangeSchema, req)),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/duplicates`,
      id: 'duplicateProject',
      summary: 'A copy with gauges, lines and scenarios; members and files stay behind',
      rule: 'copy-project',
      request: duplicateSchema,
      response: projectSchema,
      status: 201,
      problems: [],
      handle: ({ req, actor }) => {
        const { name } = parseBody(duplicateSchema, req)
        return duplicateProject(work, actor, pathPart(req, 'projectId'), name)
      },
    }),
  ]
}

function keepingOperations(work: ProjectWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'post',
      path: `${ONE}/archive`,
      id: 'archiveProject',
      summary: 'Put a project away: it can be read, and nothing in it changes',
      rule: 'lead-project',
      response: projectSchema,
      problems: [],
      handle: ({ req, actor }) => archiveProject(work, actor, pathPart(req, 'projectId')),
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/restoration`,
      id: 'restoreProject',
      summary: 'Take a project up again',
      rule: 'lead-project',
      response: projectSchema,
      problems: [],
      handle: ({ req, actor }) => restoreProject(work, actor, pathPart(req, 'projectId')),
    }),
  ]
}
