import { z } from 'zod'
import { defineOperation, type Operation } from '../../http/operation'
import { describeApi } from './openapi.service'

/** Describes the operations that it is given, and itself. */
export function openapiOperations(
  version: string,
  operations: readonly Operation[],
): readonly Operation[] {
  const own: Operation = defineOperation({
    method: 'get',
    path: '/api/openapi.json',
    id: 'readOpenApi',
    summary: 'This document',
    rule: 'open',
    response: z.looseObject({ openapi: z.string() }),
    problems: [],
    handle: (): unknown => document,
  })
  const document = describeApi(version, [...operations, own])
  return [own]
}
