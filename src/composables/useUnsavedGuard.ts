import { onMounted, onUnmounted, type Ref } from 'vue'
import { onBeforeRouteLeave } from 'vue-router'

/** Asks before a page with unsaved work is left, by the program or by the browser. */
export function useUnsavedGuard(isUnsaved: Readonly<Ref<boolean>>, question: () => string) {
  onBeforeRouteLeave(() => !isUnsaved.value || window.confirm(question()))

  function warn(event: BeforeUnloadEvent): void {
    if (isUnsaved.value) event.preventDefault()
  }
  onMounted(() => window.addEventListener('beforeunload', warn))
  onUnmounted(() => window.removeEventListener('beforeunload', warn))
}
