import type { z } from 'zod'
import type { Depot, depotChangeSchema, NewDepot, Store } from '@shared/schemas/depot'
import { projectPath } from './projects'
import { getJson, sendJson } from './request'

const PATH = '/api/depots'
const one = (depotId: string) => `${PATH}/${encodeURIComponent(depotId)}`

export type DepotChange = z.input<typeof depotChangeSchema>

/** Depots of my organisation. */
export async function fetchStore(signal?: AbortSignal): Promise<Store> {
  return (await getJson(PATH, signal)) as Store
}

export async function createDepot(depot: NewDepot): Promise<Depot> {
  return (await sendJson('POST', PATH, depot)) as Depot
}

export async function changeDepot(depotId: string, change: DepotChange): Promise<Depot> {
  return (await sendJson('PATCH', one(depotId), change)) as Depot
}

export async function removeDepot(depotId: string): Promise<void> {
  await sendJson('DELETE', one(depotId))
}

/** The store that counts in a project. */
export async function fetchProjectStore(projectId: string, signal?: AbortSignal): Promise<Store> {
  return (await getJson(`${projectPath(projectId)}/store`, signal)) as Store
}
