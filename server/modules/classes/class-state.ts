import type { ClassScene, ClassState, ClassStatus } from '../../../shared/schemas/class'
import { countGuesses as total } from '../../../shared/class/room'
import type { Db } from '../../db/client'
import { type ClassRow, listDots } from './classes.queries'

/** The trainer sees guesses as they come; phones once the answer is shown, so that nobody follows. */
export type Audience = 'trainer' | 'phone'

/** Where a class stands at a moment. */
export function classStatus(row: ClassRow, at: number): ClassStatus {
  if (row.closedAt !== null) return 'closed'
  return at >= row.expiresAt ? 'over' : 'open'
}

/** Name under which guesses of a scene are kept. */
export function sceneKey({ course, scene }: Pick<ClassScene, 'course' | 'scene'>): string {
  return `${course}/${scene}`
}

export interface Around {
  readonly at: number
  readonly participants: number
}

/** What trainer and phones see of a class; the database is asked once for both. */
export function classStates(
  db: Db,
  row: ClassRow,
  { at, participants }: Around,
): Readonly<Record<Audience, ClassState>> {
  const { code, expiresAt, step, scene } = row
  const dots = scene ? [...listDots(db, row.id, sceneKey(scene))] : []
  const room = { participants, guesses: total(dots), dots }
  const state = { code, status: classStatus(row, at), expiresAt, step, scene, room }
  if (scene?.phase === 'shown') return { trainer: state, phone: state }
  const hidden = scene && { ...scene, answer: null }
  return { trainer: state, phone: { ...state, scene: hidden, room: { ...room, dots: [] } } }
}
