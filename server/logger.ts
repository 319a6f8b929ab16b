import { randomUUID } from 'node:crypto'
import { pino, type Logger } from 'pino'
import { type HttpLogger, pinoHttp } from 'pino-http'
import type { Env } from './env'

export function createLogger(level: Env['logLevel']): Logger {
  return pino({ level })
}

interface Logged {
  readonly id: string
  readonly method: string
  readonly url: string
}

/** One line per request: faults of the server as errors, everything else as information. */
export function requestLog(logger: Logger): HttpLogger {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    // No headers: they carry what opens a session.
    serializers: {
      req: ({ id, method, url }: Logged) => ({ id, method, url }),
      res: ({ statusCode }: { statusCode: number }) => ({ statusCode }),
    },
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'error' : 'info'),
  })
}
