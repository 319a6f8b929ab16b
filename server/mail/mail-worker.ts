import type { Logger } from 'pino'
import { type QueueParts, runMailQueue } from './mail-queue'

/** Pause between two looks into the queue [ms]. */
const PAUSE = 3000

export interface MailWorker {
  /** Resolves when nothing is under way any more. */
  readonly stop: () => Promise<void>
}

/** Looks into the queue again and again, beside the requests and never inside one. */
export function startMailWorker(
  parts: QueueParts & { readonly logger: Pick<Logger, 'error'> },
  pause = PAUSE,
): MailWorker {
  let isStopped = false
  let timer: NodeJS.Timeout | undefined
  const look = async (): Promise<void> => {
    await runMailQueue(parts).catch((error: unknown) => {
      parts.logger.error({ err: error }, 'the mail queue failed')
    })
    if (!isStopped) timer = setTimeout(next, pause)
  }
  let underWay = Promise.resolve()
  const next = () => {
    underWay = look()
  }
  next()
  return {
    stop: () => {
      isStopped = true
      clearTimeout(timer)
      return underWay
    },
  }
}
