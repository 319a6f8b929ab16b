import type { Request, Response } from 'express'

/** A browser that lost its stream comes back after so long [ms]. */
const RETRY = 2000

/** What may wait in the socket of somebody who does not read [bytes]; then the stream is cut. */
const MOST_WAITING = 256 * 1024

/** One stream of server-sent events (WHATWG HTML, "Server-sent events"). */
export interface EventStream {
  /** Writes an event that was put together by `eventText`, once for all who get the same. */
  readonly send: (text: string) => void
  readonly end: () => void
}

/** An event as it travels. The data must be one line, as JSON is. */
export function eventText(event: string, data: string): string {
  return `event: ${event}\ndata: ${data}\n\n`
}

/**
 * True where somebody stays to listen. Whoever does not ask for events by name, such as a program that
 * reads the answer as a whole, gets one event and the end.
 */
export function staysToListen(req: Request): boolean {
  return req.method === 'GET' && /\btext\/event-stream\b/.test(req.get('accept') ?? '')
}

/** Every stream of this process that is open. */
const open = new Set<Response>()

/** Ends every stream, so that a server that was told to stop does not wait for who listens. */
export function endEventStreams(): void {
  for (const res of open) res.end()
}

/** Begins a stream. No cache keeps it, no proxy or compression holds it back. */
export function openEventStream(res: Response): EventStream {
  res.status(200).set({
    'Content-Type': 'text/event-stream; charset=utf-8',
    'Cache-Control': 'no-store, no-transform',
    'X-Accel-Buffering': 'no',
  })
  res.socket?.setNoDelay(true)
  open.add(res)
  res.on('close', () => open.delete(res))
  res.flushHeaders()
  res.write(`retry: ${RETRY}\n\n`)
  return {
    send: (text) => {
      if (res.writableEnded || res.destroyed) return
      if (res.writableLength > MOST_WAITING) res.destroy()
      else res.write(text)
    },
    end: () => {
      res.end()
    },
  }
}
