import type { z } from 'zod'
import type { SheetMove } from '../../shared/access/sheet-moves'
import type { newSheetSchema } from '../../shared/schemas/sheet-api'
import type { MemberRole } from '../../shared/access/roles'
import type { SlowDemoSeed } from '../db/demo-seed'
import type { SignedIn } from '../http/operation'
import { addComment, addIssue, markLine } from '../modules/sheets/checking.service'
import { sheetAt } from '../modules/sheets/open-sheet'
import { makeMove } from '../modules/sheets/sheet-moves.service'
import type { SheetWork } from '../modules/sheets/sheet-work'
import { changeSettings, changeSheet, createSheet } from '../modules/sheets/sheets.service'
import { DEMO_PEOPLE, type DemoPerson } from './demo-people'
import { FERRY_QUAY } from './ferry-quay'

const { project: projectId, lowRoad, offTheGravel, behindTheKerb } = FERRY_QUAY

function signedIn(person: DemoPerson, member: MemberRole): SignedIn {
  const { id: accountId, name, role, mayCheck, mayApprove, organisationId } = person
  const account = { accountId, name, role, mayCheck, mayApprove, organisationId }
  return { ...account, sessionId: 'seed', member }
}

const lead = signedIn(DEMO_PEOPLE.engineerA, 'lead')
const editor = signedIn(DEMO_PEOPLE.engineerB, 'editor')
const approver = signedIn(DEMO_PEOPLE.approver, 'reader')
const checker = signedIn(DEMO_PEOPLE.checker, 'reader')

type NewSheet = z.output<typeof newSheetSchema>

function source(lineId: string, scenario: string, place: number) {
  return { lineId, scenarioId: `${lineId}-${scenario}`, place }
}

const FRICTION = {
  text: 'The friction of turf is judgement; a drag test on the wet ground is wanted.',
  isToBeConfirmed: true,
}

const LOW_ROAD_WORDS = {
  category: 2,
  purpose: 'Check of the tube on Low road, chainage 60 to 90, for the flood plan.',
  conditions: [
    'the gully at chainage 95 is plugged',
    'both closures at the turn of chainage 60 are fitted and tight',
    'both ends tie into ground at 3.52\u00a0m\u00a0QD or higher',
  ],
  assumptions: [FRICTION],
  inputSources: { waterLevel: 'forecast of the lock, 21:45', groundLevel: 'survey of Low road' },
} satisfies Partial<NewSheet>

/** What can be done with the sheet that was made last. */
interface Desk {
  readonly work: SheetWork
  readonly make: (by: SignedIn, sheet: NewSheet) => Promise<string>
  /** Makes moves one after the other; the id to go on with. */
  readonly move: (sheetId: string, ...moves: readonly Step[]) => Promise<string>
}

type Step = readonly [by: SignedIn, move: SheetMove, reason?: string]

function deskOf(work: SheetWork): Desk {
  const moveOnce = async (sheetId: string, [by, move, reason = '']: Step) => {
    const place = { projectId, sheetId }
    const { version } = sheetAt(work.db, place)
    return (await makeMove(work, by, place, { move, version, reason })) ?? sheetId
  }
  return {
    work,
    make: (by, sheet) => createSheet(work, by, projectId, sheet),
    move: async (sheetId, ...moves) => {
      let at = sheetId
      for (const step of moves) at = await moveOnce(at, step)
      return at
    },
  }
}

const TO_APPROVED: readonly Step[] = [
  [lead, 'submit'],
  [checker, 'check'],
  [approver, 'approve'],
]

/** Two revisions: the second puts a larger tube where the first does not hold. */
async function lowRoadSheet({ work, make, move }: Desk): Promise<void> {
  const first = await make(lead, { ...LOW_ROAD_WORDS, ...source(offTheGravel, 'as-asked', 65) })
  const reason = 'Tube 1.00 m instead of 0.70 m after the forecast of 21:45'
  const second = await move(first, ...TO_APPROVED, [lead, 'revise', reason])
  const place = { projectId, sheetId: second }
  const { version } = sheetAt(work.db, place)
  const change = { version, source: source(offTheGravel, 'open-edge', 65) }
  await changeSheet(work, lead, place, change)
  await move(second, ...TO_APPROVED)
  const given = { recipient: 'Ferry Quay Harbour Office', note: 'with the flood plan' }
  addIssue(work, lead, place, given)
}

async function slipwayInChecking({ work, make, move }: Desk): Promise<void> {
  const sheetId = await make(lead, {
    ...source(offTheGravel, 'edges-weighed', 45),
    category: 2,
    purpose: 'Check of the lowest place, at the slipway head, with its edge weighed.',
    conditions: ['the skirt edge is weighed with sandbags from chainage 40 to 60'],
  })
  await move(sheetId, [lead, 'submit'])
  const place = { projectId, sheetId }
  const tick = { isTicked: true, figure: null, note: '' }
  for (const line of ['1.1', '1.2', '2.1', '2.2']) {
    await markLine(work, checker, { ...place, line }, tick)
  }
  const friction =
    'Where does the friction of concrete come from? It decides the answer; a drag test on site, or a source.'
  const basis =
    'Basis 1.5 for a flood of 1 in 50 years: is that the usual case, or the unusual one at 1.3?'
  await addComment(work, checker, place, { line: '5.1', text: friction })
  await addComment(work, checker, place, { line: null, text: basis })
}

async function returnedSheet({ make, move }: Desk): Promise<void> {
  const sheetId = await make(editor, {
    ...source(offTheGravel, 'open-edge', 95),
    category: 1,
    purpose: 'Check of the 0.70 m tube beside the gully.',
  })
  const reason = 'It rests on a plugged gully and does not say so. Add it to the conditions.'
  await move(sheetId, [editor, 'submit'], [checker, 'return', reason])
}

async function withdrawnSheet({ make, move }: Desk): Promise<void> {
  const sheetId = await make(lead, {
    ...source(lowRoad, 'open-edge', 130),
    category: 1,
    purpose: 'Check of the 0.70 m tube on the car park, along the line as first surveyed.',
  })
  const reason = 'The line swings off the loose gravel at chainage 142; this one is not laid.'
  await move(sheetId, ...TO_APPROVED, [lead, 'withdraw', reason])
}

async function forInformation({ make, move }: Desk): Promise<void> {
  const sheetId = await make(editor, {
    ...source(offTheGravel, 'upper-band', 45),
    category: 1,
    purpose: 'What the upper band of the forecast would mean at the slipway head; for information.',
  })
  await move(sheetId, [editor, 'issue-for-information'])
}

async function openDraft({ work, make }: Desk): Promise<void> {
  const sheetId = await make(lead, {
    ...source(behindTheKerb, 'kerb', 20),
    category: 1,
    purpose: 'Would the shorter way behind the kerb do with the 0.70 m tube?',
  })
  await addComment(
    work,
    editor,
    { projectId, sheetId },
    {
      line: '5.1',
      text: 'This line needs a condition: concrete and turf are swept clean of silt before laying.',
    },
  )
}

/** The six sheets of Ferry Quay, made and moved as people would. Seed its project first. */
export function ferryQuaySheetsSeed(work: SheetWork): SlowDemoSeed {
  return {
    name: 'ferry-quay-sheets',
    run: async () => {
      const settings = { numberPattern: 'FQ-###', separateApprover: 'by-category' } as const
      changeSettings(work, lead, projectId, settings)
      const desk = deskOf(work)
      await lowRoadSheet(desk)
      await slipwayInChecking(desk)
      await returnedSheet(desk)
      await withdrawnSheet(desk)
      await forInformation(desk)
      await openDraft(desk)
    },
  }
}
