import { onBeforeUnmount, onMounted } from 'vue'

/** What keys, clicker and swipes do on a stage. */
export interface StageActions {
  readonly next: () => void
  readonly back: () => void
  readonly black: () => void
  readonly reset: () => void
  readonly fullScreen: () => void
  /** Moves the guess by so many steps. */
  readonly nudge: (steps: number) => void
}

const KEYS: Readonly<Record<string, (actions: StageActions) => void>> = {
  ArrowRight: ({ next }) => next(),
  PageDown: ({ next }) => next(),
  ' ': ({ next }) => next(),
  ArrowLeft: ({ back }) => back(),
  PageUp: ({ back }) => back(),
  ArrowUp: ({ nudge }) => nudge(1),
  ArrowDown: ({ nudge }) => nudge(-1),
  b: ({ black }) => black(),
  '.': ({ black }) => black(),
  r: ({ reset }) => reset(),
  f: ({ fullScreen }) => fullScreen(),
}

/** Keys of a clicker act wherever the focus is. */
const CLICKER = ['PageDown', 'PageUp']

/** A swipe is so long at least [px], and so much longer than high. */
const SWIPE = { length: 60, slope: 2 } as const

function usesKeys(target: EventTarget | null): boolean {
  if (!(target instanceof HTMLElement)) return false
  return target.closest('input, select, textarea, [role="slider"]') !== null
}

/** A button or a link takes the space bar itself. */
function isPressed(target: EventTarget | null, key: string): boolean {
  return key === ' ' && target instanceof HTMLElement && target.closest('button, a') !== null
}

/** Keys of the window and swipes, as long as the page is there. */
export function useStageKeys(actions: StageActions) {
  let from: { x: number; y: number } | null = null

  function onKey(event: KeyboardEvent): void {
    if (event.altKey || event.ctrlKey || event.metaKey) return
    const { key, target } = event
    const isClicker = CLICKER.includes(key)
    if (!isClicker && (usesKeys(target) || isPressed(target, key))) return
    const act = KEYS[key.length === 1 ? key.toLowerCase() : key]
    if (!act) return
    event.preventDefault()
    act(actions)
  }

  function onDown({ pointerType, target, clientX, clientY }: PointerEvent): void {
    from = pointerType === 'touch' && !usesKeys(target) ? { x: clientX, y: clientY } : null
  }

  function onUp({ clientX, clientY }: PointerEvent): void {
    if (!from) return
    const [dx, dy] = [clientX - from.x, clientY - from.y]
    from = null
    if (Math.abs(dx) < SWIPE.length || Math.abs(dx) < SWIPE.slope * Math.abs(dy)) return
    if (dx < 0) actions.next()
    else actions.back()
  }

  onMounted(() => {
    window.addEventListener('keydown', onKey)
    window.addEventListener('pointerdown', onDown)
    window.addEventListener('pointerup', onUp)
  })
  onBeforeUnmount(() => {
    window.removeEventListener('keydown', onKey)
    window.removeEventListener('pointerdown', onDown)
    window.removeEventListener('pointerup', onUp)
  })
}
