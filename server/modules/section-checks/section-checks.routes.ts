import { z } from 'zod'
import { sectionCommand } from '../../batch/commands'
import { jsonBody } from '../../http/json-body'
import { defineOperation, type Operation } from '../../http/operation'
import { answerSectionChecks, MOST_CASES } from './section-checks.service'

export function sectionChecksOperations(): readonly Operation[] {
  const { inputSchema, outputSchema, summary } = sectionCommand
  return [
    defineOperation({
      method: 'post',
      path: '/api/check/section',
      id: 'checkSection',
      summary: `${summary}; one case or a list, as the batch command`,
      rule: 'open',
      request: z.union([inputSchema, z.array(inputSchema).max(MOST_CASES)]),
      response: z.union([outputSchema, z.array(outputSchema)]),
      problems: ['out-of-range'],
      handle: ({ req }) => answerSectionChecks(jsonBody(req)),
    }),
  ]
}
