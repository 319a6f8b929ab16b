import { randomBytes } from 'node:crypto'
import { isDeepStrictEqual } from 'node:util'
import { classCodeFrom, readClassCode } from '../../../shared/class/class-code'
import { isOnScale, onStep } from '../../../shared/class/room'
import { OutOfRangeError, rangeFault } from '../../../shared/errors'
import {
  CLASS_LASTS,
  type ClassGuess,
  type ClassItem,
  type ClassScene,
  GUESS_UNITS,
  type GuessScale,
  MOST_PARTICIPANTS,
} from '../../../shared/schemas/class'
import { beginAttempt } from '../../auth/attempts/attempts'
import { newId } from '../../auth/tokens'
import type { Db } from '../../db/client'
import { write } from '../../db/write'
import { ConflictError, NotFoundError } from '../../errors'
import type { SignedIn } from '../../http/operation'
import { unknownIn } from '../../http/unknown-reference'
import type { ServerParts } from '../../parts'
import { recordAudit } from '../audit/record-audit'
import { classStatus, sceneKey } from './class-state'
import {
  type ClassRow,
  countGuesses,
  findClassByCode,
  findGuess,
  insertClass,
  listOpenClasses,
  putGuess,
  updateClass,
} from './classes.queries'

export type ClassWork = Pick<ServerParts, 'db' | 'now' | 'keyedHash' | 'appUrl'>

/** Classes that one trainer has open at a time. */
const MOST_OPEN = 10

/** Bytes for one code: enough that six of them are fair. */
const CODE_BYTES = 24

/** A code that no class has. */
function freeCode(db: Db): string {
  for (;;) {
    const code = classCodeFrom(randomBytes(CODE_BYTES))
    if (code !== null && !findClassByCode(db, code)) return code
  }
}

function item({ appUrl }: ClassWork, { code, openedAt, expiresAt }: ClassRow): ClassItem {
  return { code, address: new URL(`/class/${code}`, appUrl).href, openedAt, expiresAt }
}

const author = ({ accountId, name }: SignedIn) => ({ accountId, name })

function note(action: 'class.opened' | 'class.closed', { id, code }: ClassRow) {
  return { action, subjectType: 'class', subjectId: id, subjectName: code }
}

/** @throws ConflictError for a trainer with too many open classes. */
export function openClass(work: ClassWork, actor: SignedIn): ClassItem {
  return write(work.db, (tx) => {
    const at = work.now()
    if (listOpenClasses(tx, actor.accountId, at).length >= MOST_OPEN) {
      throw new ConflictError(`${MOST_OPEN} classes of yours are open; close one first.`)
    }
    const row: ClassRow = {
      ...{ id: newId(), code: freeCode(tx), openedBy: actor.accountId, openedAt: at },
      ...{ expiresAt: at + CLASS_LASTS, closedAt: null, step: 0, scene: null },
    }
    insertClass(tx, row)
    recordAudit(tx, author(actor), at, note('class.opened', row))
    return item(work, row)
  })
}

export function ownClasses(work: ClassWork, actor: SignedIn): readonly ClassItem[] {
  return listOpenClasses(work.db, actor.accountId, work.now()).map((row) => item(work, row))
}

/**
 * The class of a code. Whoever guesses codes is slowed down.
 *
 * @throws NotFoundError; TooManyRequestsError after many codes that do not exist.
 */
export function classOfCode(work: ClassWork, typed: string, sender: string): ClassRow {
  const code = readClassCode(typed.slice(0, 40))
  const row = code === null ? undefined : findClassByCode(work.db, code)
  if (row) return row
  beginAttempt(work, { purpose: 'class', target: typed.slice(0, 40), sender })
  throw new NotFoundError(
    `code: "${typed.slice(0, 40)}" opens no class. It has six signs and stands on the trainer's screen.`,
  )
}

/** @throws NotFoundError for a class of somebody else; ConflictError for one that is over. */
function assertOwnAndOpen(row: ClassRow, actor: SignedIn, at: number): void {
  if (row.openedBy !== actor.accountId) {
    throw new NotFoundError(`code: "${row.code}" is no class of yours; whoever opened it leads it`)
  }
  assertOpen(row, at)
}

function assertOpen(row: ClassRow, at: number): void {
  const status = classStatus(row, at)
  if (status === 'closed') throw new ConflictError(`Class ${row.code} was closed.`)
  if (status === 'over') throw new ConflictError(`Class ${row.code} is over.`)
}

/** Says where the trainer is; saying the same again changes nothing. */
export function tellScene(
  work: ClassWork,
  actor: SignedIn,
  { code, sender, scene }: { code: string; sender: string; scene: ClassScene },
): ClassRow {
  const row = classOfCode(work, code, sender)
  return write(work.db, (tx) => {
    assertOwnAndOpen(row, actor, work.now())
    if (isDeepStrictEqual(row.scene, scene)) return row
    const told = { scene, step: row.step + 1 }
    updateClass(tx, row.id, told)
    return { ...row, ...told }
  })
}

export function closeClass(
  work: ClassWork,
  actor: SignedIn,
  { code, sender }: { code: string; sender: string },
): ClassRow {
  const row = classOfCode(work, code, sender)
  return write(work.db, (tx) => {
    const at = work.now()
    assertOwnAndOpen(row, actor, at)
    updateClass(tx, row.id, { closedAt: at })
    recordAudit(tx, author(actor), at, note('class.closed', row))
    return { ...row, closedAt: at }
  })
}

/**
 * Takes the guess of a phone; the latest counts until the answer is shown.
 *
 * @throws OutOfRangeError for a unit or a value that is not on the scale; ConflictError for a class that
 * is over, a scene that has gone by, an answer that is shown, or a full room.
 */
export function takeGuess(work: ClassWork, row: ClassRow, guess: ClassGuess): void {
  write(work.db, (tx) => {
    assertOpen(row, work.now())
    const scene = askedScene(row, guess)
    const value = valueOnScale(scene.guess, guess)
    const place = { classId: row.id, scene: sceneKey(scene), participant: guess.participant }
    const isFull = countGuesses(tx, row.id, place.scene) >= MOST_PARTICIPANTS
    if (isFull && !findGuess(tx, place)) {
      throw new ConflictError(`The room is full: ${MOST_PARTICIPANTS} have guessed.`)
    }
    putGuess(tx, { ...place, value })
  })
}

function askedScene({ scene }: ClassRow, guess: ClassGuess): ClassScene {
  if (scene?.scene !== guess.scene) {
    throw new ConflictError('The trainer has gone on to another scene.')
  }
  if (scene.phase === 'shown') throw new ConflictError('The answer is shown already.')
  return scene
}

function valueOnScale(scale: GuessScale, { value, unit }: ClassGuess): number {
  const expected = GUESS_UNITS[scale.kind]
  if (unit !== expected) throw unknownIn('unit', unit, `"${expected}", the unit of this scene`)
  const { min, max } = scale
  if (!isOnScale(value, scale)) {
    throw new OutOfRangeError([rangeFault('value', value, { min, max, unit: expected })])
  }
  return onStep(value, scale)
}
