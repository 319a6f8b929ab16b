import { onBeforeUnmount, onMounted, shallowReadonly, shallowRef, type Ref } from 'vue'

export interface ElementSize {
  readonly width: number
  readonly height: number
}

/** Size of an element in whole CSS pixels, kept up to date; null before it is measured. */
export function useElementSize(element: Readonly<Ref<HTMLElement | null>>) {
  const size = shallowRef<ElementSize | null>(null)

  function keep(width: number, height: number): void {
    const next = { width: Math.floor(width), height: Math.floor(height) }
    if (next.width < 1 || next.height < 1) return
    if (next.width === size.value?.width && next.height === size.value.height) return
    size.value = next
  }

  let observer: ResizeObserver | undefined
  onMounted(() => {
    if (!element.value) return
    const { width, height } = element.value.getBoundingClientRect()
    keep(width, height)
    observer = new ResizeObserver((entries) => {
      const box = entries.at(-1)?.contentRect
      if (box) keep(box.width, box.height)
    })
    observer.observe(element.value)
  })
  onBeforeUnmount(() => observer?.disconnect())

  return shallowReadonly(size)
}
