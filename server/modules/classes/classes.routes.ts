import type { Request, Response } from 'express'
import {
  classesSchema,
  classEventsQuerySchema,
  classGuessSchema,
  classItemSchema,
  classSceneSchema,
  classStateSchema,
} from '../../../shared/schemas/class'
import { createBucketLimit } from '../../http/bucket-limit'
import { eventText, openEventStream, staysToListen } from '../../http/event-stream'
import { defineOperation, type Operation, type SignedIn } from '../../http/operation'
import { parseBody, parseQuery, pathPart } from '../../http/parse-input'
import { senderOf } from '../../http/sender'
import { type Audience, classStates } from './class-state'
import { type ClassStreams, createClassStreams } from './class-streams'
import type { ClassRow } from './classes.queries'
import {
  classOfCode,
  type ClassWork,
  closeClass,
  openClass,
  ownClasses,
  takeGuess,
  tellScene,
} from './classes.service'

const PATH = '/api/classes'
const ONE = `${PATH}/:code`

/** Generous: a room of thirty phones, or of two hundred, has one address in the network. */
const LIMIT = {
  atOnce: 400,
  refill: 25,
  message: 'Too many requests at once from where you are. Try again.',
} as const

const asked = (req: Request) => ({ code: pathPart(req, 'code'), sender: senderOf(req) })

const audienceOf = (actor: SignedIn | null, row: ClassRow): Audience =>
  actor?.accountId === row.openedBy ? 'trainer' : 'phone'

/** Classes: opened and led by a trainer, followed by phones without an account. */
export function classesOperations(work: ClassWork): readonly Operation[] {
  const streams = createClassStreams(work)
  return [
    ...trainerOperations(work),
    ...leadingOperations(work, streams),
    ...openOperations(work, streams),
  ]
}

function trainerOperations(work: ClassWork): readonly Operation[] {
  return [
    defineOperation({
      method: 'get',
      path: PATH,
      id: 'listClasses',
      summary: 'Your open classes, the newest first',
      rule: 'run-classes',
      response: classesSchema,
      problems: [],
      handle: ({ actor }) => ({ classes: ownClasses(work, actor) }),
    }),
    defineOperation({
      method: 'post',
      path: PATH,
      id: 'openClass',
      summary: 'Open a class for four hours',
      rule: 'run-classes',
      response: classItemSchema,
      status: 201,
      problems: ['conflict'],
      handle: ({ actor }) => openClass(work, actor),
    }),
  ]
}

function leadingOperations(work: ClassWork, streams: ClassStreams): readonly Operation[] {
  return [
    defineOperation({
      method: 'put',
      path: `${ONE}/scene`,
      id: 'tellClassScene',
      summary:
        'Say where you are: the scene, its question and scale, and whether the answer is shown',
      rule: 'run-classes',
      request: classSceneSchema,
      response: classStateSchema,
      problems: ['not-found', 'conflict', 'out-of-range', 'too-many-requests'],
      handle: ({ req, actor }) => {
        const scene = parseBody(classSceneSchema, req)
        const row = tellScene(work, actor, { ...asked(req), scene })
        streams.stepped(row.id)
        return stateOf(work, streams, row).trainer
      },
    }),
    defineOperation({
      method: 'post',
      path: `${ONE}/closing`,
      id: 'closeClass',
      summary: 'Close a class; its phones are told',
      rule: 'run-classes',
      response: classStateSchema,
      problems: ['not-found', 'conflict', 'too-many-requests'],
      handle: ({ req, actor }) => {
        const row = closeClass(work, actor, asked(req))
        streams.stepped(row.id)
        return stateOf(work, streams, row).trainer
      },
    }),
  ]
}

/** For phones: no account, only the code. */
function openOperations(work: ClassWork, streams: ClassStreams): readonly Operation[] {
  const takeRead = createBucketLimit(work.now, LIMIT)
  return [
    defineOperation({
      method: 'get',
      path: ONE,
      id: 'readClass',
      summary: 'Where a class is; the guesses of the room once the answer is shown',
      rule: 'open',
      response: classStateSchema,
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req, actor }) => {
        takeRead(senderOf(req))
        const row = rowOf(work, req)
        return stateOf(work, streams, row)[audienceOf(actor, row)]
      },
    }),
    defineOperation({
      method: 'get',
      path: `${ONE}/events`,
      id: 'followClass',
      summary: 'The same as it changes, as server-sent events "state"; the whole state each time',
      rule: 'open',
      query: classEventsQuerySchema,
      mediaType: 'text/event-stream',
      problems: ['not-found', 'too-many-requests'],
      handle: ({ req, res, actor }) => {
        takeRead(senderOf(req))
        followClass({ work, streams }, { req, res, actor })
      },
    }),
    guessOperation(work, streams),
  ]
}

function guessOperation(work: ClassWork, streams: ClassStreams): Operation {
  const takeOne = createBucketLimit(work.now, LIMIT)
  return defineOperation({
    method: 'put',
    path: `${ONE}/guess`,
    id: 'guessInClass',
    summary: 'The guess of a phone; the latest counts until the answer is shown',
    rule: 'open',
    request: classGuessSchema,
    response: classStateSchema,
    problems: ['not-found', 'conflict', 'out-of-range', 'too-many-requests'],
    handle: ({ req }) => {
      takeOne(senderOf(req))
      const row = rowOf(work, req)
      takeGuess(work, row, parseBody(classGuessSchema, req))
      streams.roomChanged(row.id)
      return stateOf(work, streams, row).phone
    },
  })
}

function rowOf(work: ClassWork, req: Request): ClassRow {
  const { code, sender } = asked(req)
  return classOfCode(work, code, sender)
}

function stateOf({ db, now }: ClassWork, streams: ClassStreams, row: ClassRow) {
  return classStates(db, row, { at: now(), participants: streams.participants(row.id) })
}

interface Following {
  readonly work: ClassWork
  readonly streams: ClassStreams
}

function followClass(
  { work, streams }: Following,
  { req, res, actor }: { req: Request; res: Response; actor: SignedIn | null },
): void {
  const { participant = null } = parseQuery(classEventsQuerySchema, req)
  const row = rowOf(work, req)
  const audience = audienceOf(actor, row)
  const stream = openEventStream(res)
  if (!staysToListen(req)) {
    stream.send(eventText('state', JSON.stringify(stateOf(work, streams, row)[audience])))
    stream.end()
    return
  }
  const fail = (error: unknown) => req.log.error({ err: error }, 'a class could not be told')
  res.on('close', streams.follow(row, { audience, participant, stream, fail }))
}
