import { onScopeDispose, shallowReadonly, shallowRef, watch } from 'vue'

/** A change settles for this long before the work starts, so that no frame of a drag pays for it [ms]. */
const SETTLE = 120
/** The work starts after this long even if the browser is never idle [ms]. */
const LATEST = 400

const whenIdle = (run: () => void): void => {
  if ('requestIdleCallback' in window) window.requestIdleCallback(run, { timeout: LATEST })
  else setTimeout(run)
}

/**
 * A result that is too dear for a frame: it follows once its source has settled. Until then the last
 * one stays, and `isPending` says so.
 */
export function useDeferred<S, R, I extends R | null>(
  source: () => S,
  compute: (source: S) => R,
  initial: I,
) {
  const result = shallowRef<R | I>(initial)
  const isPending = shallowRef(initial === null)
  let timer: ReturnType<typeof setTimeout> | undefined
  let turn = 0

  function start(value: S): void {
    isPending.value = true
    clearTimeout(timer)
    turn += 1
    const mine = turn
    timer = setTimeout(() => whenIdle(() => mine === turn && finish(value)), SETTLE)
  }

  function finish(value: S): void {
    result.value = compute(value)
    isPending.value = false
  }

  watch(source, start, { immediate: initial === null })
  onScopeDispose(() => {
    clearTimeout(timer)
    turn += 1
  })
  return { result: shallowReadonly(result), isPending: shallowReadonly(isPending) }
}
