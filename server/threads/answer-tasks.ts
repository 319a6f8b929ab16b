import type { MessagePort } from 'node:worker_threads'
import type { SentError, TaskAnswer, TaskRequest, Tasks } from './task-messages'

/** Does one task after the other, as they come in through the port of a thread. */
export function answerTasks(port: MessagePort, tasks: Tasks): void {
  let last: Promise<void> = Promise.resolve()
  port.on('message', (request: TaskRequest) => {
    last = last.then(() => answer(port, tasks, request))
  })
}

async function answer(port: MessagePort, tasks: Tasks, request: TaskRequest): Promise<void> {
  const { id, name, input } = request
  try {
    const task = tasks[name] as ((input: unknown) => unknown) | undefined
    if (!task) throw new Error(`there is no task "${name}"`)
    const value = await task(input)
    // Bytes are handed over, not copied.
    const bytes = value instanceof Uint8Array ? [value.buffer as ArrayBuffer] : []
    port.postMessage({ id, value } satisfies TaskAnswer, bytes)
  } catch (error) {
    port.postMessage({ id, error: sent(error) } satisfies TaskAnswer)
  }
}

function sent(thrown: unknown): SentError {
  const error = thrown instanceof Error ? thrown : new Error(String(thrown))
  const { name, message, stack = '' } = error
  const { name: _, ...fields } = { ...error } as Record<string, unknown>
  return { name, message, stack, fields }
}
