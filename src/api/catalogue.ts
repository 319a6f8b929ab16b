import type { Catalogue } from '@shared/schemas/catalogue'
import { getJson } from './request'

export async function fetchCatalogue(signal?: AbortSignal): Promise<Catalogue> {
  return (await getJson('/api/catalogue', signal)) as Catalogue
}
