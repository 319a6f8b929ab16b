import { groundSeepage } from '../../shared/calc/ground/ground-seepage'
import { pondInputOf } from '../../shared/calc/ponding/pond-from-case'
import { pondThroughTime, type PondHistory } from '../../shared/calc/ponding/pond'
import { pumpDuty } from '../../shared/calc/pumping/pump-duty'
import {
  eventCaseFaults,
  eventInputOf,
  eventResultOf,
} from '../../shared/checks/event/event-from-case'
import { sectionEvent } from '../../shared/checks/event/section-event'
import { eventCaseSchema, eventResultSchema } from '../../shared/schemas/event-case'
import {
  dutyCaseSchema,
  dutyFaults,
  dutyResultSchema,
  seepageCaseSchema,
  seepageFaults,
  seepageResultSchema,
} from '../../shared/schemas/flow-case'
import {
  pondingCaseSchema,
  pondingFaults,
  pondingResultSchema,
} from '../../shared/schemas/ponding-case'
import type { BatchCommand } from './batch-command'
import { parseBatchCase } from './parse-batch-case'

export const seepageCommand: BatchCommand = {
  name: 'seepage',
  summary: 'Seepage through pervious ground under a flat base, per metre of line',
  inputSchema: seepageCaseSchema,
  outputSchema: seepageResultSchema,
  answer: (input) => {
    const seepage = parseBatchCase(seepageCaseSchema, input, seepageFaults)
    return { perMetre: groundSeepage(seepage) }
  },
}

export const dutyCommand: BatchCommand = {
  name: 'duty',
  summary: 'Duty point of one or more pumps on a hose: flow, head, and which of three states',
  inputSchema: dutyCaseSchema,
  outputSchema: dutyResultSchema,
  answer: (input) => pumpDuty(parseBatchCase(dutyCaseSchema, input, dutyFaults)),
}

export const pondingCommand: BatchCommand = {
  name: 'ponding',
  summary: 'Water that stands on the dry side: inflow, storage, pumps that start and stop',
  inputSchema: pondingCaseSchema,
  outputSchema: pondingResultSchema,
  answer: (input) => {
    const pond = parseBatchCase(pondingCaseSchema, input, pondingFaults)
    return pondingResult(pondThroughTime(pondInputOf(pond)))
  },
}

function pondingResult(history: PondHistory) {
  const { moments, events, inflowVolume, pumpedVolume, stored, highest, pumps, reaches } = history
  const timesOf = (what: string) =>
    events.filter((event) => event.what === what).map(({ time }) => time)
  const [firstStart = null, secondStart = null] = timesOf('starts')
  const [firstStop = null] = timesOf('stops')
  return {
    levelAtEnd: moments[moments.length - 1]!.level,
    highest,
    firstStart,
    firstStop,
    secondStart,
    inflowVolume,
    pumpedVolume,
    stored,
    events,
    pumps: pumps.map(({ pump, volume, runningTime }) => ({ pump, volume, runningTime })),
    reaches,
  }
}

export const eventCommand: BatchCommand = {
  name: 'event',
  summary: 'One section through a series of levels: when it fails, when everybody leaves',
  inputSchema: eventCaseSchema,
  outputSchema: eventResultSchema,
  answer: (input) => {
    const event = parseBatchCase(eventCaseSchema, input, eventCaseFaults)
    return eventResultOf(sectionEvent(eventInputOf(event)))
  },
}
