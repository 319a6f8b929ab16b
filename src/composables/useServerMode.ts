import { onScopeDispose, shallowReadonly, shallowRef } from 'vue'
import type { Health } from '@shared/schemas/health'
import { fetchMode } from '@/api/health'
import { ApiError } from '@/api/request'

/**
 * The mode of the server, null until it answers. Everything on the Quick check works without a
 * server, so a server that does not answer leaves the mode unknown and disturbs nothing.
 */
export function useServerMode(ask: typeof fetchMode = fetchMode) {
  const mode = shallowRef<Health['mode'] | null>(null)
  const leaving = new AbortController()
  onScopeDispose(() => leaving.abort())

  ask(leaving.signal).then(
    (answer) => (mode.value = answer),
    (error: unknown) => {
      if (!(error instanceof ApiError || error instanceof SyntaxError)) throw error
    },
  )
  return shallowReadonly(mode)
}
