import { Router } from 'express'
import { z } from 'zod'
import { allowOnly, type ApiModule, type Operation } from '../../http/api-module'
import { describeApi } from './openapi.service'

const PATH = '/api/openapi.json'

/** Describes the modules that it is given, and itself. */
export function openapiModule(version: string, modules: readonly ApiModule[]): ApiModule {
  const own: Operation = {
    method: 'get',
    path: PATH,
    id: 'readOpenApi',
    summary: 'This document',
    response: z.looseObject({ openapi: z.string() }),
    problems: ['method-not-allowed'],
  }
  const operations = [...modules.flatMap((module) => module.operations), own]
  const document = describeApi(version, operations)

  const router = Router()
  router
    .route(PATH)
    .get((_req, res) => {
      res.json(document)
    })
    .all(allowOnly('GET', 'HEAD'))
  return { router, operations: [own] }
}
