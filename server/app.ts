import compression from 'compression'
import express, { type Express } from 'express'
import type { Logger } from 'pino'
import type { Db } from './db/client'
import type { Env } from './env'
import { NotFoundError } from './errors'
import { errorHandler } from './http/error-handler'
import { receiveJsonText, receiveLongJsonText } from './http/json-body'
import { mountOperations, type Access } from './http/mount-operations'
import { securityHeaders } from './http/security-headers'
import { site } from './http/site'
import { requestLog } from './logger'
import { catalogueOperations } from './modules/catalogue/catalogue.routes'
import { healthOperations } from './modules/health/health.routes'
import { openapiOperations } from './modules/openapi/openapi.routes'
import { sectionChecksOperations } from './modules/section-checks/section-checks.routes'

export interface AppParts {
  readonly db: Db
  readonly env: Env
  readonly logger: Logger
  readonly version: string
  /** Folder of the built page. */
  readonly siteFolder: string
}

/** Nobody can sign in yet: every route is open. */
const NOBODY: Access = { signedIn: () => null, memberRole: () => null }

/** Builds the server; it listens only where `main.ts` says so. */
export function createApp({ db, env, logger, version, siteFolder }: AppParts): Express {
  const app = express()
  app.use(requestLog(logger))
  app.use(securityHeaders(env.appUrl))
  app.use(compression())
  app.use('/api', (_req, res, next) => {
    res.set('Cache-Control', 'no-store')
    next()
  })
  app.use('/api/projects', receiveLongJsonText)
  app.use(receiveJsonText)

  const operations = [
    ...healthOperations(db, { version, mode: env.mode }),
    ...catalogueOperations(db),
    ...sectionChecksOperations(),
  ]
  const all = [...operations, ...openapiOperations(version, operations)]
  app.use(mountOperations(all, NOBODY))

  app.use(site(siteFolder))
  app.use((req) => {
    throw new NotFoundError(`${req.method} ${req.path}: there is nothing at this address`)
  })
  app.use(errorHandler)
  return app
}
