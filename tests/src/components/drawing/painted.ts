import { createPinia } from 'pinia'
import { vi } from 'vitest'
import { nextTick } from 'vue'
import { createTexts } from '../../../../src/i18n'

/** Plugins that every painted component needs. */
export function plugins() {
  return [createPinia(), createTexts()]
}

/** What jsdom lacks: a size for the figure, pointer capture, and frames that a test lets happen. */
export function stubBrowser(size: { width: number; height: number }) {
  localStorage.clear()
  const frames: FrameRequestCallback[] = []
  vi.stubGlobal('matchMedia', () => ({ matches: false, addEventListener: () => undefined }))
  vi.stubGlobal('requestAnimationFrame', (frame: FrameRequestCallback) => frames.push(frame))
  vi.stubGlobal('cancelAnimationFrame', (id: number) => {
    frames[id - 1] = () => undefined
  })
  vi.stubGlobal(
    'ResizeObserver',
    class {
      observe = () => undefined
      disconnect = () => undefined
    },
  )
  vi.spyOn(HTMLElement.prototype, 'getBoundingClientRect').mockReturnValue(
    DOMRect.fromRect({ x: 0, y: 0, ...size }),
  )
  Element.prototype.setPointerCapture = () => undefined
  return {
    /** Lets the frames happen that were asked for. */
    nextFrame: () => frames.splice(0).forEach((frame) => frame(0)),
  }
}

interface Touch {
  readonly clientY: number
  readonly button?: number
  readonly pointerId?: number
}

/** A pointer event with the fields that jsdom leaves out. */
export async function point(
  type: 'pointerdown' | 'pointermove' | 'pointerup',
  target: Element,
  { clientY, button = 0, pointerId = 1 }: Touch,
): Promise<void> {
  const event = new MouseEvent(type, { clientY, button, bubbles: true })
  target.dispatchEvent(Object.assign(event, { pointerId }))
  await nextTick()
}
