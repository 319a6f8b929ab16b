import { onScopeDispose, shallowReadonly, shallowRef, watch } from 'vue'

/** Long enough that a drag is announced once, when it rests [ms]. */
const SETTLE = 900

/** The latest sentence, once it has not changed for a while; nothing before the first change. */
export function useAnnouncement(sentence: () => string) {
  const announced = shallowRef('')
  let timer: ReturnType<typeof setTimeout> | undefined
  watch(sentence, (next) => {
    clearTimeout(timer)
    timer = setTimeout(() => (announced.value = next), SETTLE)
  })
  onScopeDispose(() => clearTimeout(timer))
  return shallowReadonly(announced)
}
