import type { JobOutcome } from '@shared/checks/line-event/job-outcome'
import { sharesOf, workOf } from '@shared/checks/line-event/line-event'
import { lineEventAnswer, type LineEventAnswer } from '@shared/checks/line-event/line-event-answer'
import type { LineEventInput } from '@shared/checks/line-event/line-event-input'
import { planLineEvent } from '@shared/checks/line-event/line-event-plan'
import {
  LineEventRun,
  lineEventFaults,
  type LineEventWork,
} from '@shared/checks/line-event/line-event-run'
import { OutOfRangeError } from '@shared/errors'
import type { EventMessage } from './messages'

/** Workers that share one event. */
export const WORKERS = 2

/** Time for which the page is held up at once where there are no workers [ms]. */
const SLICE = 12
const STEPS = 100

/** What of a worker is used, so that a test can stand in for it. */
export type EventWorker = Pick<Worker, 'postMessage' | 'terminate' | 'onmessage' | 'onerror'>

export interface ComputeOptions {
  /** Share that is done, 0 to 1. */
  readonly onProgress?: (share: number) => void
  /** Stops the work; the promise is refused with the reason of the signal. */
  readonly signal?: AbortSignal
  /** Starts a worker; null: the work is done here, a slice at a time. */
  readonly startWorker?: (() => EventWorker) | null
}

/** Starts a worker of an event, where the browser has any. */
export const startEventWorker: (() => EventWorker) | null =
  typeof Worker === 'undefined'
    ? null
    : () => new Worker(new URL('./line-event.worker.ts', import.meta.url), { type: 'module' })

/**
 * A line through an event, in two workers where there are any.
 *
 * @throws OutOfRangeError with every fault of series and settings, before any work.
 */
export async function computeLineEvent(
  input: LineEventInput,
  options: ComputeOptions = {},
): Promise<LineEventAnswer> {
  const { onProgress, signal, startWorker = startEventWorker } = options
  const plan = planLineEvent(input)
  const faults = lineEventFaults(workOf(input, plan.jobs))
  if (faults.length > 0) throw new OutOfRangeError(faults)
  const shares = sharesOf(plan, WORKERS)
  const told = shares.map(() => 0)
  const tell = (index: number) => (share: number) => {
    told[index] = share
    onProgress?.(told.reduce((sum, one) => sum + one, 0) / told.length)
  }
  const parts = await Promise.all(
    shares.map((share, i) => {
      // What the query library hands out is watched, and what is watched cannot be sent.
      const jobs = share.map((place) => plan.jobs[place]!)
      const work = JSON.parse(JSON.stringify(workOf(input, jobs))) as LineEventWork
      const run = startWorker ? inWorker(startWorker(), work) : inSlices(work)
      return run({ onProgress: tell(i), signal })
    }),
  )
  const outcomes: JobOutcome[] = []
  shares.forEach((share, i) =>
    share.forEach((place, n) => {
      outcomes[place] = parts[i]![n]!
    }),
  )
  return lineEventAnswer(plan, outcomes, input.water)
}

interface Watching {
  readonly onProgress: (share: number) => void
  readonly signal: AbortSignal | undefined
}
type Run = (watching: Watching) => Promise<readonly JobOutcome[]>

function inWorker(worker: EventWorker, work: LineEventWork): Run {
  return ({ onProgress, signal }) =>
    new Promise((resolve, reject) => {
      const end = () => {
        worker.terminate()
        signal?.removeEventListener('abort', stop)
      }
      const stop = () => {
        end()
        reject(signal!.reason as Error)
      }
      if (signal?.aborted) return stop()
      signal?.addEventListener('abort', stop)
      worker.onmessage = ({ data }: MessageEvent<EventMessage>) => {
        if (data.kind === 'progress') return onProgress(data.share)
        onProgress(1)
        end()
        resolve(data.outcomes)
      }
      worker.onerror = (event) => {
        end()
        reject(new Error(event.message))
      }
      worker.postMessage(work)
    })
}

function inSlices(work: LineEventWork): Run {
  return async ({ onProgress, signal }) => {
    const run = new LineEventRun(work)
    let isLeft = true
    while (isLeft) {
      signal?.throwIfAborted()
      const until = performance.now() + SLICE
      while (isLeft && performance.now() < until) isLeft = run.advance(STEPS)
      onProgress(run.progress)
      await new Promise((resume) => setTimeout(resume))
    }
    signal?.throwIfAborted()
    return run.answer()
  }
}
