import { onScopeDispose, shallowReadonly, shallowRef } from 'vue'

const SECOND = 1000

/** Whole seconds that are left of a wait. */
export function useCountdown() {
  const left = shallowRef(0)
  let timer: ReturnType<typeof setInterval> | undefined

  function start(seconds: number): void {
    clearInterval(timer)
    const end = performance.now() + seconds * SECOND
    left.value = Math.ceil(seconds)
    timer = setInterval(() => {
      left.value = Math.max(0, Math.ceil((end - performance.now()) / SECOND))
      if (left.value === 0) clearInterval(timer)
    }, SECOND / 4)
  }

  onScopeDispose(() => clearInterval(timer))
  return { left: shallowReadonly(left), start }
}
