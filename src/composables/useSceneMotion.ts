import { onScopeDispose } from 'vue'

/** What happens while a script runs. */
export interface Motion {
  /** How long it takes [s]. */
  readonly duration: number
  /** Called for each frame with the time since the start [s]. */
  readonly frame: (seconds: number) => void
  readonly end: () => void
}

/** A step that took longer was a pause of the browser, not of the water [s]. */
const LONGEST_STEP = 0.1

/** Who asked for less motion gets the end at once. */
const isCalm = (): boolean => window.matchMedia('(prefers-reduced-motion: reduce)').matches

/** Runs one script at a time, frame by frame. */
export function useSceneMotion() {
  let handle: number | null = null
  let running: Motion | null = null

  function stop(): void {
    if (handle !== null) cancelAnimationFrame(handle)
    handle = null
    running = null
  }

  /** Jumps to the end of what runs. */
  function finish(): void {
    const motion = running
    stop()
    if (!motion) return
    motion.frame(motion.duration)
    motion.end()
  }

  function start(motion: Motion): void {
    stop()
    running = motion
    if (isCalm()) {
      finish()
      return
    }
    let last: number | null = null
    let seconds = 0
    const tick = (now: number): void => {
      seconds += last === null ? 0 : Math.min(LONGEST_STEP, (now - last) / 1000)
      last = now
      if (seconds >= motion.duration) {
        finish()
        return
      }
      motion.frame(seconds)
      handle = requestAnimationFrame(tick)
    }
    handle = requestAnimationFrame(tick)
  }

  onScopeDispose(stop)
  return { start, stop, finish }
}
