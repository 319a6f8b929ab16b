import compression from 'compression'
import express, { type Express } from 'express'
import type { Logger } from 'pino'
import { createAccess } from './auth/create-access'
import type { Env } from './env'
import { NotFoundError } from './errors'
import { errorHandler } from './http/error-handler'
import { receiveJsonText, receiveLongJsonText } from './http/json-body'
import { mountOperations } from './http/mount-operations'
import type { Operation } from './http/operation'
import { originCheck } from './http/origin-check'
import { securityHeaders } from './http/security-headers'
import { site } from './http/site'
import { requestLog } from './logger'
import { allOperations } from './operations'
import { pages } from './pages/pages'
import type { RouteParts } from './parts'

export interface AppParts {
  readonly parts: RouteParts
  readonly env: Env
  readonly logger: Logger
  readonly version: string
  /** Folder of the built page. */
  readonly siteFolder: string
}

/** Builds the server; it listens only where `main.ts` says so. */
export function createApp({ parts, env, logger, version, siteFolder }: AppParts): Express {
  const app = express()
  app.set('trust proxy', env.trustedProxies)
  app.use(requestLog(logger))
  app.use(securityHeaders(env.appUrl))
  app.use(compression())
  app.use('/api', (_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  app.use('/api', originCheck({ appUrl: env.appUrl, carriesSession: parts.sessions.isCarriedBy }))
  app.use('/api/projects', receiveLongJsonText)
  app.use(receiveJsonText)

  const operations = allOperations(parts, { version, mode: env.mode })
  app.use(mountOperations(operations, createAccess(parts.db, parts.sessions)))
  app.locals.operations = operations

  app.use(pages(parts))
  app.use(site(siteFolder))
  app.use((req) => {
    throw new NotFoundError(`${req.method} ${req.path}: there is nothing at this address`)
  })
  app.use(errorHandler)
  return app
}

/** The routes of a server, for its documents and for tests that walk all of them. */
export function operationsOf(app: Express): readonly Operation[] {
  return app.locals.operations as readonly Operation[]
}
