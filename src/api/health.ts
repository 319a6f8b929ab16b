import type { Health } from '@shared/schemas/health'
import { getJson } from './request'

/** Whether the server runs in demonstration mode. */
export async function fetchMode(signal?: AbortSignal): Promise<Health['mode']> {
  const health = (await getJson('/api/health', signal)) as Health
  return health.mode
}
