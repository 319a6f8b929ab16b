import { Router } from 'express'
import { z } from 'zod'
import { sectionCommand } from '../../batch/commands'
import { allowOnly, type ApiModule } from '../../http/api-module'
import { jsonBody } from '../../http/json-body'
import { answerSectionChecks, MOST_CASES } from './section-checks.service'

const PATH = '/api/check/section'

export function sectionChecksModule(): ApiModule {
  const router = Router()
  router
    .route(PATH)
    .post((req, res) => {
      res.json(answerSectionChecks(jsonBody(req)))
    })
    .all(allowOnly('POST'))

  const { inputSchema, outputSchema, summary } = sectionCommand
  return {
    router,
    operations: [
      {
        method: 'post',
        path: PATH,
        id: 'checkSection',
        summary: `${summary}; one case or a list, as the batch command`,
        request: z.union([inputSchema, z.array(inputSchema).max(MOST_CASES)]),
        response: z.union([outputSchema, z.array(outputSchema)]),
        problems: [
          'invalid-json',
          'invalid-input',
          'bad-request',
          'method-not-allowed',
          'too-large',
          'unsupported-media-type',
          'out-of-range',
        ],
      },
    ],
  }
}
