import { onScopeDispose, shallowReadonly, shallowRef, watch } from 'vue'

/** Often enough to be followed by eye, seldom enough to leave the frames to what is under the hand [ms]. */
const INTERVAL = 120

const whenIdle = (run: () => void): void => {
  if ('requestIdleCallback' in window) window.requestIdleCallback(run, { timeout: INTERVAL })
  else setTimeout(run)
}

/**
 * A value that follows another at its own pace: a first change soon, a stream of changes at most
 * every 120 ms, and always the last one. For what is read beside a drag, not under the hand.
 */
export function useCalm<T>(source: () => T) {
  const value = shallowRef(source())
  let isWaiting = false
  let isOver = false

  function follow(): void {
    isWaiting = false
    if (!isOver) value.value = source()
  }

  watch(source, () => {
    if (isWaiting) return
    isWaiting = true
    setTimeout(() => whenIdle(follow), INTERVAL)
  })
  onScopeDispose(() => (isOver = true))
  return shallowReadonly(value)
}
