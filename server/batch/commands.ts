import { checkSection } from '../../shared/checks/section-check'
import { parseSectionCase } from '../../shared/schemas/parse-section-case'
import { sectionCaseSchema } from '../../shared/schemas/section-case'
import { sectionResultSchema } from '../../shared/schemas/section-result'
import type { BatchCommand } from './batch-command'
import { dutyCommand, eventCommand, pondingCommand, seepageCommand } from './flow-commands'

export const sectionCommand: BatchCommand = {
  name: 'section',
  summary: 'Check one cross-section: does it hold, up to what depth, what gives way first',
  inputSchema: sectionCaseSchema,
  outputSchema: sectionResultSchema,
  answer: (input) => checkSection(parseSectionCase(input)),
}

/** What `npm run calc -- COMMAND` can do; a further calculation is one further entry. */
export const COMMANDS: readonly BatchCommand[] = [
  sectionCommand,
  seepageCommand,
  dutyCommand,
  pondingCommand,
  eventCommand,
]
