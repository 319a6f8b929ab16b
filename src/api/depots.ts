import type { Store } from '@shared/schemas/depot'
import { projectPath } from './projects'
import { getJson } from './request'

/** The store that counts in a project. */
export async function fetchProjectStore(projectId: string, signal?: AbortSignal): Promise<Store> {
  return (await getJson(`${projectPath(projectId)}/store`, signal)) as Store
}
