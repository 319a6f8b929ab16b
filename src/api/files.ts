import type { z } from 'zod'
import type { fileChangeSchema, ProjectFile, projectFilesSchema } from '@shared/schemas/project'
import type { Problem } from '@shared/schemas/problem'
import { projectPath } from './projects'
import { ApiError, getJson, sendJson } from './request'

export type FileChange = z.input<typeof fileChangeSchema>

const path = (projectId: string) => `${projectPath(projectId)}/files`
const one = (projectId: string, fileId: string) =>
  `${path(projectId)}/${encodeURIComponent(fileId)}`

export async function fetchFiles(projectId: string, signal?: AbortSignal): Promise<ProjectFile[]> {
  const answer = (await getJson(path(projectId), signal)) as z.output<typeof projectFilesSchema>
  return answer.files
}

export async function changeFile(
  projectId: string,
  fileId: string,
  change: FileChange,
): Promise<ProjectFile> {
  return (await sendJson('PATCH', one(projectId, fileId), change)) as ProjectFile
}

export async function removeFile(projectId: string, fileId: string): Promise<void> {
  await sendJson('DELETE', one(projectId, fileId))
}

/** Address of the file itself. */
export function fileContent(projectId: string, fileId: string): string {
  return `${one(projectId, fileId)}/content`
}

/** Address of a small picture of a photograph. */
export function filePreview(projectId: string, fileId: string): string {
  return `${one(projectId, fileId)}/preview`
}

/**
 * Sends a file and tells how far it is. Only the older way of asking a server reports that.
 *
 * @param tell Share that is sent, 0 to 1.
 */
export function uploadFile(
  projectId: string,
  file: File,
  tell: (share: number) => void,
): Promise<ProjectFile> {
  const form = new FormData()
  form.append('file', file)
  const request = new XMLHttpRequest()
  request.open('POST', path(projectId))
  request.setRequestHeader('accept', 'application/json')
  request.upload.addEventListener('progress', ({ loaded, total }) => tell(loaded / total))
  return new Promise((resolve, reject) => {
    request.addEventListener('load', () => {
      const answer = jsonOf(request.responseText)
      if (request.status < 300) resolve(answer as ProjectFile)
      else
        reject(new ApiError(`${file.name}: ${request.status}`, request.status, problemOf(answer)))
    })
    request.addEventListener('error', () => reject(new ApiError(`${file.name}: no answer`, null)))
    request.send(form)
  })
}

function jsonOf(text: string): unknown {
  try {
    return JSON.parse(text)
  } catch {
    return null
  }
}

function problemOf(answer: unknown): Problem | null {
  return typeof answer === 'object' && answer !== null && 'code' in answer
    ? (answer as Problem)
    : null
}
