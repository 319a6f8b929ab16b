import { LineEventRun, type LineEventWork } from '@shared/checks/line-event/line-event-run'
import type { EventMessage } from './messages'

/** Steps between two looks at the clock, and time between two messages of progress [ms]. */
const STEPS = 500
const BEAT = 80

function say(message: EventMessage, transfer: Transferable[] = []): void {
  self.postMessage(message, { transfer })
}

/** One share of an event; whoever wants to stop it ends the worker. */
self.onmessage = ({ data }: MessageEvent<LineEventWork>) => {
  const run = new LineEventRun(data)
  let told = performance.now()
  while (run.advance(STEPS)) {
    const now = performance.now()
    if (now - told < BEAT) continue
    say({ kind: 'progress', share: run.progress })
    told = now
  }
  const outcomes = run.answer()
  const buffers = outcomes.flatMap(({ trace }) =>
    trace ? [trace.figures.buffer, trace.verdicts.buffer, trace.governs.buffer] : [],
  )
  say({ kind: 'done', outcomes }, buffers as ArrayBuffer[])
}
