import type { MemberRole } from '../../shared/access/roles'
import type { Station } from '../../shared/schemas/line'
import type { LineEnds, LineMark } from '../../shared/schemas/mark'
import type { Clock } from '../clock'
import type { DemoSeed } from '../db/demo-seed'
import { makeForecast } from '../modules/forecasts/forecasts.service'
import { makeGauge } from '../modules/gauges/gauges.service'
import { makeLine } from '../modules/lines/line-rows'
import { insertMember } from '../modules/members/members.queries'
import { change, type Deed, noteChange } from '../modules/projects/deed'
import { makeProject } from '../modules/projects/projects.service'
import { makeScenario } from '../modules/scenarios/scenario-rows'
import { DEMO_PEOPLE } from './demo-people'
import { FERRY_QUAY_OBSERVED, FERRY_QUAY_READINGS, LOCK_ISSUE } from './ferry-quay-forecast'
import { FERRY_QUAY } from './ferry-quay-ids'
import {
  BEHIND_THE_KERB_STATIONS,
  LOW_ROAD_STATIONS,
  OFF_THE_GRAVEL_STATIONS,
} from './ferry-quay-lines'
import { JOINED_ENDS, LOW_ROAD_ENDS, LOW_ROAD_MARKS } from './ferry-quay-marks'
import {
  BEHIND_THE_KERB_SCENARIOS,
  type DemoScenario,
  LOW_ROAD_SCENARIOS,
} from './ferry-quay-scenarios'

export { FERRY_QUAY } from './ferry-quay-ids'

const { engineerA, engineerB, approver, checker, viewer } = DEMO_PEOPLE

/** The trainer and the administrator are no members: they see nothing of it. */
const MEMBERS: readonly (readonly [{ readonly id: string }, MemberRole])[] = [
  [engineerB, 'editor'],
  [approver, 'reader'],
  [checker, 'reader'],
  [viewer, 'reader'],
]

interface DemoLine {
  readonly id: string
  readonly name: string
  readonly note: string
  readonly stations: readonly Station[]
  readonly marks: readonly LineMark[]
  readonly ends: LineEnds
  readonly scenarios: readonly DemoScenario[]
}

const LINES: readonly DemoLine[] = [
  {
    id: FERRY_QUAY.lowRoad,
    name: 'Low road',
    note: 'From the flood wall along the quay and Low road to high ground. Gravel at ch 142 to 148.',
    stations: LOW_ROAD_STATIONS,
    marks: LOW_ROAD_MARKS,
    ends: LOW_ROAD_ENDS,
    scenarios: LOW_ROAD_SCENARIOS,
  },
  {
    id: FERRY_QUAY.offTheGravel,
    name: 'Low road, off the gravel',
    note: 'Low road as it can be laid: swung 3 m landward at ch 142 to 148, onto asphalt.',
    stations: OFF_THE_GRAVEL_STATIONS,
    marks: LOW_ROAD_MARKS,
    ends: LOW_ROAD_ENDS,
    scenarios: LOW_ROAD_SCENARIOS,
  },
  {
    id: FERRY_QUAY.behindTheKerb,
    name: 'Behind the kerb',
    note: 'Leaves Low road at ch 30 and meets it again at ch 70, landward of the lowest ground.',
    stations: BEHIND_THE_KERB_STATIONS,
    marks: [],
    ends: JOINED_ENDS,
    scenarios: BEHIND_THE_KERB_SCENARIOS,
  },
]

/** Ferry Quay, an invented river town; its figures are computed as any other. Seed the people first. */
export function ferryQuaySeed(now: Clock): DemoSeed {
  const maker = { accountId: engineerA.id, name: engineerA.name }
  return { name: 'ferry-quay', run: (db) => change({ db, now }, maker, seedProject) }
}

function seedProject(deed: Deed): void {
  const project = {
    name: 'Ferry Quay',
    site: 'Quay and Low road, right bank',
    client: 'Ferry Quay Harbour Office',
    datum: 'Quay datum (QD)',
    timeZone: 'UTC',
    note: 'An invented town. Forecast at the lock by telephone at 21:45: stage 2.86 at 07:00, ±0.12.',
  }
  makeProject(deed, project, FERRY_QUAY.project)
  noteMade(deed, 'project', FERRY_QUAY.project, project.name)
  for (const [person, role] of MEMBERS) {
    const member = { projectId: FERRY_QUAY.project, accountId: person.id, role }
    insertMember(deed.tx, { ...member, addedAt: deed.at })
  }
  seedGauges(deed)
  for (const line of LINES) seedLine(deed, line)
}

function seedGauges(deed: Deed): void {
  const lock = {
    name: 'Lock',
    zero: 0.6,
    correction: -0.04,
    note: 'The forecast is given here; the correction carries it to Ferry Quay.',
  }
  const board = { name: 'Quay board', zero: 0, correction: 0, note: 'What the crew can see.' }
  makeGauge(deed, FERRY_QUAY.project, lock, FERRY_QUAY.lockGauge)
  noteMade(deed, 'gauge', FERRY_QUAY.lockGauge, lock.name)
  makeGauge(deed, FERRY_QUAY.project, board, FERRY_QUAY.boardGauge)
  noteMade(deed, 'gauge', FERRY_QUAY.boardGauge, board.name)
  seedForecast(deed, { id: FERRY_QUAY.lockGauge, ...lock })
}

function seedForecast(deed: Deed, gauge: Parameters<typeof makeForecast>[1]): void {
  const { id, issuedAt } = LOCK_ISSUE
  const forecast = {
    ...({ origin: 'typed', issuedAt, reference: 'siteLevel', call: null } as const),
    readings: [...FERRY_QUAY_READINGS],
    observed: [...FERRY_QUAY_OBSERVED],
    note: 'By telephone at 21:45: stage 2.86 at 07:00, ±0.12. Levels at Ferry Quay.',
  }
  makeForecast(deed, gauge, forecast, id)
  noteMade(deed, 'forecast', id, gauge.name)
}

function seedLine(deed: Deed, line: DemoLine): void {
  const { id, name, note, stations, scenarios, ends } = line
  const survey = { stations: [...stations], sectionLength: 10, marks: [...line.marks] }
  makeLine(deed, FERRY_QUAY.project, { name, note, ...survey, ends, background: null }, id)
  noteMade(deed, 'line', id, name)
  for (const { key, ...text } of scenarios) {
    const scenarioId = makeScenario(deed, { id, ...survey }, text, `${id}-${key}`)
    noteMade(deed, 'scenario', scenarioId, text.name)
  }
}

function noteMade(deed: Deed, subjectType: string, subjectId: string, subjectName: string): void {
  noteChange(deed, FERRY_QUAY.project, {
    action: `${subjectType}.created`,
    ...{ subjectType, subjectId, subjectName },
    toVersion: 1,
    detail: { seed: 'ferry-quay' },
  })
}
