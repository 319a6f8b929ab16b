import type { z } from 'zod'
import type { fileChangeSchema, ProjectFile, projectFilesSchema } from '@shared/schemas/project'
import { projectPath } from './projects'
import { ApiError, errorOf, getJson, sendJson, withSession } from './request'

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
 * Sends a file and tells how far it is; once more from its beginning where the session had ended and
 * the person has signed in again.
 *
 * @param tell Share that is sent, 0 to 1.
 */
export function uploadFile(
  projectId: string,
  file: File,
  tell: (share: number) => void,
): Promise<ProjectFile> {
  return withSession(() => {
    tell(0)
    return sendFile(path(projectId), file, tell)
  })
}

/** Only the older way of asking a server reports how much is sent. */
function sendFile(to: string, file: File, tell: (share: number) => void): Promise<ProjectFile> {
  const form = new FormData()
  form.append('file', file)
  const request = new XMLHttpRequest()
  request.open('POST', to)
  request.setRequestHeader('accept', 'application/json')
  request.upload.addEventListener('progress', ({ loaded, total }) => tell(loaded / total))
  return new Promise((resolve, reject) => {
    request.addEventListener('load', () => {
      const { status, responseText: text } = request
      const retryAfter = request.getResponseHeader('retry-after')
      if (status < 300) resolve(JSON.parse(text) as ProjectFile)
      else reject(errorOf(file.name, { status, text, retryAfter }))
    })
    request.addEventListener('error', () => reject(new ApiError(`${file.name}: no answer`, null)))
    request.send(form)
  })
}
