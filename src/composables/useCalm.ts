import { onScopeDispose, shallowReadonly, shallowRef, watch } from 'vue'

/** Often enough to be followed by eye, seldom enough to leave the frames to what is under the hand [ms]. */
const INTERVAL = 120

const whenIdle = (run: () => void): void => {
  if ('requestIdleCallback' in window) window.requestIdleCallback(run, { timeout: INTERVAL })
  else setTimeout(run)
}

/** When a calm value follows. */
export interface CalmPace {
  /** Changes when the source may have; the source itself where it is cheap. */
  readonly changes?: () => unknown
  /** What must never be seen beside an older value: its change is followed before the next paint. */
  readonly urgent?: () => unknown
}

/**
 * A value that follows another at its own pace: a change after a rest at once, a stream of changes at
 * most every 120 ms, and always the last one. For what is read beside a drag, not under the hand.
 */
export function useCalm<T>(source: () => T, { changes = source, urgent }: CalmPace = {}) {
  const value = shallowRef(source())
  let isWaiting = false
  let lastChange = -Infinity
  let isOver = false

  function follow(): void {
    if (!isOver) value.value = source()
  }

  function followLater(): void {
    isWaiting = false
    follow()
  }

  watch(changes, () => {
    const now = performance.now()
    const isRested = now - lastChange > INTERVAL
    lastChange = now
    if (isRested && !isWaiting) follow()
    if (isRested || isWaiting) return
    isWaiting = true
    setTimeout(() => whenIdle(followLater), INTERVAL)
  })
  if (urgent) watch(urgent, () => requestAnimationFrame(follow))
  onScopeDispose(() => (isOver = true))
  return shallowReadonly(value)
}
