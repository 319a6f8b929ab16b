import { onBeforeUnmount } from 'vue'

export interface DragHandlers {
  start: () => void
  /** Distance from where the drag began, downwards [px]; at most once for each frame. */
  move: (distance: number) => void
  end: () => void
}

interface Drag {
  readonly pointer: number
  readonly from: number
  /** Where the pointer is now. */
  y: number
  /** The frame that will tell about it; null: told. */
  frame: number | null
}

/** Dragging up and down with any pointer; moves are gathered until the next frame. */
export function useVerticalDrag(handlers: DragHandlers) {
  let drag: Drag | null = null

  function tell(): void {
    if (!drag) return
    drag.frame = null
    handlers.move(drag.y - drag.from)
  }

  function onPointerdown(event: PointerEvent): void {
    if (drag || event.button !== 0) return
    const target = event.currentTarget as Element
    target.setPointerCapture(event.pointerId)
    drag = { pointer: event.pointerId, from: event.clientY, y: event.clientY, frame: null }
    handlers.start()
  }

  function onPointermove(event: PointerEvent): void {
    if (!drag || event.pointerId !== drag.pointer) return
    drag.y = event.clientY
    drag.frame ??= requestAnimationFrame(tell)
  }

  /** The last move is told at once, so that the value rests where the pointer was let go. */
  function onPointerup(event: PointerEvent): void {
    if (!drag || event.pointerId !== drag.pointer) return
    if (drag.frame !== null) {
      cancelAnimationFrame(drag.frame)
      tell()
    }
    drag = null
    handlers.end()
  }

  onBeforeUnmount(() => {
    if (drag?.frame) cancelAnimationFrame(drag.frame)
    drag = null
  })

  return {
    pointerdown: onPointerdown,
    pointermove: onPointermove,
    pointerup: onPointerup,
    pointercancel: onPointerup,
  }
}
