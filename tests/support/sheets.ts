import { expect } from 'vitest'
import type { SheetRecord } from '../../shared/schemas/sheet-api'
import { addMember, as, type Person, type ProjectServer, startedProject } from './project-server'

/** Figures that hold narrowly on 10 m of turf, so that a sheet of them has something to say. */
export const SHEET_WORDS = {
  category: 2,
  purpose: 'Check of the tube on Low road.',
  conditions: ['the gully at chainage 5 is plugged'],
} as const

/** A project with a draft of Engineer A, and everybody whom a sheet needs as a member. */
export async function startedSheet(server: ProjectServer, words: object = {}) {
  const started = await startedProject(server)
  const { lead, projectPath, line, scenario } = started
  await addMember(server, projectPath, 'engineerB', 'editor')
  for (const person of ['approver', 'checker', 'viewer'] as const) {
    await addMember(server, projectPath, person, 'reader')
  }
  const body = { lineId: line.id, scenarioId: scenario.id, ...SHEET_WORDS, ...words }
  const sheet = (await lead.post(`${projectPath}/sheets`, body).expect(201)).body as SheetRecord
  const path = `${projectPath}/sheets/${sheet.id}`
  return { ...started, sheet, path, ...stepsOf(server, path) }
}

/** Reads a sheet, and moves it on the version that is there. */
export function stepsOf(server: ProjectServer, path: string) {
  const read = async (person: Person = 'engineerA') =>
    (await as(server, person).get(path).expect(200)).body as SheetRecord
  const move = async (person: Person, name: string, reason = '') => {
    const { version } = await read()
    return as(server, person).post(`${path}/moves`, { move: name, version, reason })
  }
  const moved = async (person: Person, name: string, reason = '') => {
    const answer = await move(person, name, reason)
    expect(answer.status, answer.text).toBe(200)
    return (answer.body as { sheetId: string | null }).sheetId
  }
  return { read, move, moved }
}
