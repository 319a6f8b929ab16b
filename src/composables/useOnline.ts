import { onScopeDispose, readonly, ref } from 'vue'

/** Whether the browser has a network; that the server answers is another question. */
export function useOnline() {
  const isOnline = ref(navigator.onLine)
  const follow = () => (isOnline.value = navigator.onLine)
  window.addEventListener('online', follow)
  window.addEventListener('offline', follow)
  onScopeDispose(() => {
    window.removeEventListener('online', follow)
    window.removeEventListener('offline', follow)
  })
  return readonly(isOnline)
}
