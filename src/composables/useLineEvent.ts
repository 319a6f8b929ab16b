import { computed, onScopeDispose, shallowReadonly, shallowRef, watch, type Ref } from 'vue'
import type { LineEventAnswer } from '@shared/checks/line-event/line-event-answer'
import type { LineEventInput } from '@shared/checks/line-event/line-event-input'
import { OutOfRangeError, type Fault } from '@shared/errors'
import { computeLineEvent } from '@/line-event/compute-line-event'
import { isSameValue } from '@/scenario/same-value'

/** Rest after the last change before the event is computed anew [ms]. */
const REST = 300

/** An answer and what it was computed from. */
interface Computed {
  readonly input: LineEventInput
  readonly answer: LineEventAnswer
}

/**
 * The event of a line, computed anew when anything in it changes: with progress, and stopped when
 * somebody says so. Meanwhile the last answer stands, and is known to be old.
 */
export function useLineEvent(input: Readonly<Ref<LineEventInput | null>>) {
  const work = eventWork(input)
  const { last, progress, faults, compute, cancel } = work
  let timer: ReturnType<typeof setTimeout> | undefined

  watch(
    input,
    (next, before) => {
      if (before && next && isSameValue(next, before)) return
      clearTimeout(timer)
      if (before) timer = setTimeout(() => void compute(), REST)
      else void compute()
    },
    { immediate: true },
  )
  function stop(): void {
    clearTimeout(timer)
    cancel()
  }
  onScopeDispose(stop)

  const isOld = computed(
    () =>
      last.value !== null && (input.value === null || !isSameValue(last.value.input, input.value)),
  )
  return {
    computed: shallowReadonly(last),
    progress: shallowReadonly(progress),
    faults: shallowReadonly(faults),
    isOld,
    compute,
    cancel: stop,
  }
}

/** One computation at a time: the newest call wins. */
function eventWork(input: Readonly<Ref<LineEventInput | null>>) {
  const last = shallowRef<Computed | null>(null)
  const progress = shallowRef<number | null>(null)
  const faults = shallowRef<readonly Fault[]>([])
  let running: AbortController | null = null

  async function compute(): Promise<void> {
    cancel()
    const asked = input.value
    if (!asked) return
    const controller = new AbortController()
    running = controller
    progress.value = 0
    faults.value = []
    const isMine = () => running === controller
    try {
      const onProgress = (share: number) => {
        if (isMine()) progress.value = share
      }
      const answer = await computeLineEvent(asked, { signal: controller.signal, onProgress })
      if (isMine()) last.value = { input: asked, answer }
    } catch (error) {
      if (controller.signal.aborted) return
      if (!(error instanceof OutOfRangeError)) throw error
      faults.value = error.faults
    } finally {
      if (isMine()) {
        running = null
        progress.value = null
      }
    }
  }

  /** Stops what is being computed; the last answer stays. */
  function cancel(): void {
    running?.abort()
    running = null
    progress.value = null
  }

  return { last, progress, faults, compute, cancel }
}
