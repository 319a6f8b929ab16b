import { Worker } from 'node:worker_threads'
import type { SentError, TaskAnswer, TaskRequest, Tasks } from './task-messages'

/** Makes an error of a class that travelled as name and fields. */
export type Revive = (error: SentError) => Error

interface Waiting {
  readonly resolve: (value: unknown) => void
  readonly reject: (error: Error) => void
}

type Input<Task> = Task extends (input: infer Value) => unknown ? Value : never
type Output<Task> = Task extends (input: never) => infer Value ? Awaited<Value> : never

export interface TaskThread<Known extends Tasks> {
  /** @throws What the task throws; Error where the thread itself ends. */
  readonly run: <Name extends keyof Known & string>(
    name: Name,
    input: Input<Known[Name]>,
  ) => Promise<Output<Known[Name]>>
  /** Ends the thread; the next task would begin another. */
  readonly stop: () => Promise<void>
}

const FIRST = new URL('thread.mjs', import.meta.url)

/** The error as it was thrown, or at least its words and where it came from. */
export function plainError({ name, message, stack }: SentError): Error {
  return Object.assign(new Error(message), { name, stack })
}

/**
 * One thread beside that of the server, so that long computations hold up nobody. It begins with the
 * first task, does one after the other, and keeps no process alive while it has nothing to do.
 *
 * @param program The TypeScript that the thread runs; it answers through `answerTasks`.
 */
export function createTaskThread<Known extends Tasks>(
  program: URL,
  revive: Revive = plainError,
): TaskThread<Known> {
  const waiting = new Map<number, Waiting>()
  let worker: Worker | null = null
  let lastId = 0

  function settle(answer: TaskAnswer): void {
    const asked = waiting.get(answer.id)
    waiting.delete(answer.id)
    if (waiting.size === 0) worker?.unref()
    if ('error' in answer) asked?.reject(revive(answer.error))
    else asked?.resolve(answer.value)
  }

  /** Whatever waits for a thread that ended learns why. */
  function ended(which: Worker, error: Error): void {
    if (worker !== which) return
    worker = null
    for (const { reject } of waiting.values()) reject(error)
    waiting.clear()
  }

  function begin(): Worker {
    // Flags of this process, such as loaders of a test runner, are not for the thread.
    const begun = new Worker(FIRST, { execArgv: [], workerData: { program: program.href } })
    begun.on('message', settle)
    begun.on('error', (error) => ended(begun, error))
    begun.on('exit', () => ended(begun, new Error('the thread ended before it answered')))
    return begun
  }

  return {
    run: (name, input) =>
      new Promise((resolve, reject) => {
        worker ??= begin()
        worker.ref()
        lastId += 1
        waiting.set(lastId, { resolve: resolve as Waiting['resolve'], reject })
        worker.postMessage({ id: lastId, name, input } satisfies TaskRequest)
      }),
    stop: async () => {
      await worker?.terminate()
    },
  }
}
