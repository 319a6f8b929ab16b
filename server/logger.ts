import { randomUUID } from 'node:crypto'
import { pino, type Logger } from 'pino'
import { type HttpLogger, pinoHttp } from 'pino-http'
import type { Env } from './env'

export function createLogger(level: Env['logLevel']): Logger {
  return pino({ level, redact: ['req.headers.authorization', 'req.headers.cookie'] })
}

/** One line per request: faults of the server as errors, everything else as information. */
export function requestLog(logger: Logger): HttpLogger {
  return pinoHttp({
    logger,
    genReqId: () => randomUUID(),
    customLogLevel: (_req, res) => (res.statusCode >= 500 ? 'error' : 'info'),
  })
}
