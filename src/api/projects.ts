import type { z } from 'zod'
import type {
  deskSchema,
  newProjectSchema,
  Project,
  projectChangeSchema,
  projectsPageSchema,
} from '@shared/schemas/project'
import { queryOf, type ListQuery } from './list-query'
import { getJson, sendJson } from './request'

export type Desk = z.output<typeof deskSchema>
export type ProjectsPage = z.output<typeof projectsPageSchema>
export type NewProject = z.input<typeof newProjectSchema>
export type ProjectChange = z.input<typeof projectChangeSchema>

const PATH = '/api/projects'

/** Address of a project at the API. */
export function projectPath(projectId: string): string {
  return `${PATH}/${encodeURIComponent(projectId)}`
}

export async function fetchDesk(signal?: AbortSignal): Promise<Desk> {
  return (await getJson('/api/desk', signal)) as Desk
}

export async function fetchProjects(query: ListQuery, signal?: AbortSignal): Promise<ProjectsPage> {
  return (await getJson(PATH + queryOf(query), signal)) as ProjectsPage
}

export async function fetchProject(projectId: string, signal?: AbortSignal): Promise<Project> {
  return (await getJson(projectPath(projectId), signal)) as Project
}

export async function createProject(project: NewProject): Promise<Project> {
  return (await sendJson('POST', PATH, project)) as Project
}

export async function changeProject(projectId: string, change: ProjectChange): Promise<Project> {
  return (await sendJson('PATCH', projectPath(projectId), change)) as Project
}

export async function duplicateProject(projectId: string, name: string): Promise<Project> {
  return (await sendJson('POST', `${projectPath(projectId)}/duplicates`, { name })) as Project
}

export async function archiveProject(projectId: string): Promise<Project> {
  return (await sendJson('POST', `${projectPath(projectId)}/archive`)) as Project
}

export async function restoreProject(projectId: string): Promise<Project> {
  return (await sendJson('POST', `${projectPath(projectId)}/restoration`)) as Project
}

export async function deleteProject(projectId: string): Promise<void> {
  await sendJson('DELETE', projectPath(projectId))
}
