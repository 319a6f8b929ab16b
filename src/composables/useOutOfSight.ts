import { onMounted, onUnmounted, readonly, ref, type Ref } from 'vue'

/** True while the element has left the window upwards. */
export function useOutOfSight(element: Ref<HTMLElement | null>) {
  const isOut = ref(false)
  let observer: IntersectionObserver | undefined
  onMounted(() => {
    if (!element.value || !('IntersectionObserver' in window)) return
    observer = new IntersectionObserver(([entry]) => {
      if (entry) isOut.value = !entry.isIntersecting && entry.boundingClientRect.top < 0
    })
    observer.observe(element.value)
  })
  onUnmounted(() => observer?.disconnect())
  return readonly(isOut)
}
