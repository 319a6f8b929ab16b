import { shallowReadonly, shallowRef } from 'vue'
import { ApiError } from '@/api/request'

/**
 * Calls the server on behalf of a form. The newest call wins: the late answer of an older one is
 * dropped. Errors that are none of the server's travel on.
 */
export function useSubmit<Input extends unknown[], Result>(
  call: (...input: Input) => Promise<Result>,
) {
  const result = shallowRef<Result | null>(null)
  const problem = shallowRef<ApiError | null>(null)
  const isPending = shallowRef(false)
  let newest = 0

  /** The answer; undefined where the server refused or a newer call has taken over. */
  async function submit(...input: Input): Promise<Result | undefined> {
    const mine = (newest += 1)
    isPending.value = true
    problem.value = null
    try {
      const answer = await call(...input)
      if (mine !== newest) return undefined
      result.value = answer
      return answer
    } catch (error) {
      if (!(error instanceof ApiError)) throw error
      if (mine === newest) problem.value = error
      return undefined
    } finally {
      if (mine === newest) isPending.value = false
    }
  }

  /** Forgets what the last call gave, as when a dialog opens anew. */
  function clear(): void {
    newest += 1
    result.value = null
    problem.value = null
    isPending.value = false
  }

  return {
    result: shallowReadonly(result),
    problem: shallowReadonly(problem),
    isPending: shallowReadonly(isPending),
    submit,
    clear,
  }
}
