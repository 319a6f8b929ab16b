import type { ClassState } from '../../../shared/schemas/class'
import type { Clock } from '../../clock'
import type { Db } from '../../db/client'
import { type EventStream, eventText } from '../../http/event-stream'
import { type Audience, classStates, classStatus } from './class-state'
import { type ClassRow, findClass } from './classes.queries'

/** Guesses and phones that come and go are told together, at most so often [ms]. */
const TOGETHER = 200

/** A sign of life, so that neither proxy nor phone takes silence for the end [ms]. */
const BEAT = 15_000

const BEAT_TEXT = eventText('beat', '{}')

/** Somebody who follows a class. */
export interface Follower {
  readonly audience: Audience
  /** The phone's own number; null for a stage. */
  readonly participant: string | null
  readonly stream: EventStream
  /** Takes what went wrong while the follower was told. */
  readonly fail: (error: unknown) => void
}

interface Room {
  readonly followers: Set<Follower>
  /** Set while a change waits to be told. */
  waiting: NodeJS.Timeout | null
}

/** Who follows which class, and what they are told. */
export interface ClassStreams {
  /** Tells where the class is, and everything from then on; returns what ends it. */
  readonly follow: (row: ClassRow, follower: Follower) => () => void
  /** Phones that follow now; two windows of one phone count once. */
  readonly participants: (classId: string) => number
  /** The trainer went on: told at once. */
  readonly stepped: (classId: string) => void
  /** The room changed: told together with what else changes at that moment. */
  readonly roomChanged: (classId: string) => void
}

export interface StreamParts {
  readonly db: Db
  readonly now: Clock
}

/** Streams of all classes of one server. */
export function createClassStreams(parts: StreamParts): ClassStreams {
  const rooms = new Map<string, Room>()
  const beats = createBeats(() => {
    for (const [id, room] of rooms) beat(parts, id, room)
  })

  function roomChanged(classId: string): void {
    const room = rooms.get(classId)
    if (!room || room.waiting) return
    room.waiting = setTimeout(() => {
      guarded(room, () => tell(parts, classId, room))
    }, TOGETHER).unref()
  }

  function leave(classId: string, follower: Follower): void {
    const room = rooms.get(classId)
    if (!room?.followers.delete(follower)) return
    if (room.followers.size > 0) return roomChanged(classId)
    if (room.waiting) clearTimeout(room.waiting)
    rooms.delete(classId)
    if (rooms.size === 0) beats.stop()
  }

  function follow(row: ClassRow, follower: Follower): () => void {
    const room = rooms.get(row.id) ?? { followers: new Set(), waiting: null }
    room.followers.add(follower)
    rooms.set(row.id, room)
    beats.start()
    const state = statesOf(parts, row, room)[follower.audience]
    follower.stream.send(stateText(state))
    if (state.status !== 'open') follower.stream.end()
    else if (follower.participant !== null) roomChanged(row.id)
    return () => leave(row.id, follower)
  }

  return {
    follow,
    roomChanged,
    participants: (classId) => phonesIn(rooms.get(classId)),
    stepped: (classId) => {
      const room = rooms.get(classId)
      if (room) tell(parts, classId, room)
    },
  }
}

const stateText = (state: ClassState): string => eventText('state', JSON.stringify(state))

/** Two windows of one phone count once. */
function phonesIn(room: Room | undefined): number {
  const phones = [...(room?.followers ?? [])].map(({ participant }) => participant)
  return new Set(phones.filter((phone) => phone !== null)).size
}

function statesOf({ db, now }: StreamParts, row: ClassRow, room: Room) {
  return classStates(db, row, { at: now(), participants: phonesIn(room) })
}

/** Tells everybody in a room where its class is. What is over or gone ends. */
function tell(parts: StreamParts, classId: string, room: Room): void {
  if (room.waiting) clearTimeout(room.waiting)
  room.waiting = null
  const row = findClass(parts.db, classId)
  if (!row) return endRoom(room)
  const states = statesOf(parts, row, room)
  const texts = { trainer: stateText(states.trainer), phone: stateText(states.phone) }
  for (const { audience, stream } of room.followers) stream.send(texts[audience])
  if (states.phone.status !== 'open') endRoom(room)
}

function beat(parts: StreamParts, classId: string, room: Room): void {
  for (const { stream } of room.followers) stream.send(BEAT_TEXT)
  guarded(room, () => {
    const row = findClass(parts.db, classId)
    if (!row || classStatus(row, parts.now()) !== 'open') tell(parts, classId, room)
  })
}

/** Ends every stream; each leaves by itself once it is closed. */
function endRoom({ followers }: Room): void {
  for (const { stream } of followers) stream.end()
}

/** Nothing that goes wrong beside a request may end the server; the next change tells again. */
function guarded({ followers }: Pick<Room, 'followers'>, run: () => void): void {
  try {
    run()
  } catch (error) {
    for (const { fail } of [...followers].slice(0, 1)) fail(error)
  }
}

/** A timer that runs only while somebody listens. */
function createBeats(run: () => void) {
  let timer: NodeJS.Timeout | null = null
  return {
    start: (): void => {
      timer ??= setInterval(run, BEAT).unref()
    },
    stop: (): void => {
      if (timer) clearInterval(timer)
      timer = null
    },
  }
}
