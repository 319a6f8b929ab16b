import fc from 'fast-check'
import { DEMO_PASSWORD } from '../../server/demo/demo-people'
import type { Operation } from '../../server/http/operation'
import { arbitraryOf, type Hints } from './arbitrary-json'
import { SHORT_STATIONS } from './ferry-quay'
import { PASSWORD } from './people'
import {
  filledPath,
  type Sent,
  SHORT_CONTENT,
  type Visitor,
  type WholeServer,
} from './whole-server'

/** A request with what it was made from. */
export interface Drawn {
  readonly operation: Operation
  readonly visitor: Visitor
  readonly sent: Sent
  /** True where query and body have the shape that the route asks for. */
  readonly isShaped: boolean
}

const ADDRESSES = ['lead@people.test', 'invited@people.test', 'new@people.test', 'no address']

const FIRST_MOMENT = 1_930_000_000_000

/** Levels hour by hour. */
const LEVELS = [2, 2.4, null, 2.2].map((expected, hour) => ({
  ...{ time: FIRST_MOMENT + hour * 3_600_000, expected },
  ...{ low: null, high: null },
}))

/** Values that a stranger to the program could not guess. */
function hintsFor({ ids, visitors }: WholeServer): Hints {
  const people = ['the-lead', 'the-admin', ...visitors.map(({ what }) => what), 'nobody']
  return {
    version: fc.constantFrom(1, 1, 1, 2),
    email: fc.constantFrom(...ADDRESSES),
    password: fc.constantFrom(PASSWORD, DEMO_PASSWORD),
    current: fc.constant(PASSWORD),
    timeZone: fc.constantFrom('UTC', 'Europe/Lisbon', 'Quay/Low'),
    organisationId: fc.constantFrom(ids.organisationId, 'nowhere'),
    handOverTo: fc.constantFrom('the-lead', 'engineer-none', 'viewer-none', ...people),
    name: fc.string({ minLength: 1, maxLength: 30 }).map((text) => `N${text}`),
    accountId: fc.constantFrom('engineer-none', 'viewer-none', ...people),
    lineId: fc.constantFrom(ids.lineId, 'nowhere'),
    scenarioId: fc.constantFrom(ids.scenarioId, 'nowhere'),
    expiresAt: fc.constant(Date.now() + 24 * 3_600_000),
    ticks: fc.constantFrom(
      [{ id: 'phone-a-0001', item: 'section-1', isDone: true, at: FIRST_MOMENT }],
      [{ id: 'phone-a-0002', item: 'section-99', isDone: false, at: FIRST_MOMENT }],
    ),
    stations: fc.constant(SHORT_STATIONS),
    content: fc.constant(SHORT_CONTENT),
    from: fc.constantFrom('0', '1930000000000'),
    to: fc.constantFrom('0', '1930000000000'),
    origin: fc.constantFrom('typed', 'csv', 'waterml', 'typed', 'csv', 'call'),
    call: fc.constant(null),
    readings: fc.constantFrom(LEVELS.slice(0, 1), LEVELS),
    observed: fc.constantFrom(
      [],
      LEVELS.map(({ time, expected }) => ({ time, level: expected })),
    ),
    issuedAt: fc.constant(FIRST_MOMENT),
    participant: fc.constantFrom('a-phone-of-the-tests', 'another-phone-of-them', 'short'),
    scene: fc.constantFrom('grip', 'grip', 'leave'),
    unit: fc.constantFrom('–', '–', 'm'),
    guess: fc.constantFrom({ kind: 'length', min: 0, max: 0.7, step: 0.01 }),
    page: fc.constantFrom('1', '2', '100000'),
  }
}

/** Parts of addresses: mostly what is there, now and then anything. */
function pathOf({ path }: Operation, { ids }: WholeServer): fc.Arbitrary<string> {
  const { tokens, ...known } = ids
  const stray = fc.constantFrom(
    'nothing',
    '../up',
    '%',
    '\u0000',
    '💧',
    "' or 1=1 --",
    'a'.repeat(300),
  )
  const people = fc.constantFrom(ids.accountId, 'engineer-reader', 'trainer-none', 'the-admin')
  return fc
    .record({
      token: fc.constantFrom(...tokens, 'nothing'),
      accountId: people,
      // One part at most is stray: two would hide what the second one does.
      stray: fc.option(fc.record({ value: stray, at: fc.nat({ max: 3 }) }), { freq: 8 }),
    })
    .map(({ stray: odd, ...drawn }) => {
      const values: Record<string, string> = { ...known, ...drawn }
      const names = [...path.matchAll(/:(\w+)/g)].map(([, name]) => name!)
      const name = odd && names[odd.at]
      if (name !== undefined && name !== null) values[name] = odd!.value
      return filledPath(path, values)
    })
}

function queryOf({ query }: Operation, hints: Hints): fc.Arbitrary<Record<string, string>> {
  if (!query) return fc.constant({})
  const stray = fc.dictionary(
    fc.constantFrom(...Object.keys(query.shape), 'more'),
    fc.string({ maxLength: 12 }),
    { maxKeys: 3 },
  )
  const shaped = arbitraryOf(query, hints).map((drawn) =>
    Object.fromEntries(
      Object.entries(drawn as object).map(([key, value]) => [key, String(value)] as const),
    ),
  )
  return fc.oneof({ weight: 5, arbitrary: shaped }, { weight: 1, arbitrary: stray })
}

interface Body {
  readonly body?: BodyInit
  readonly mediaType?: string
  readonly isShaped: boolean
}

function bodyOf(operation: Operation, hints: Hints): fc.Arbitrary<Body> {
  const { request, requestMediaType } = operation
  if (!request) return fc.constant({ isShaped: true })
  if (requestMediaType !== undefined) return formWithFile
  const asJson = (value: unknown): Body => ({
    body: JSON.stringify(value),
    mediaType: 'application/json',
    isShaped: request.safeParse(JSON.parse(JSON.stringify(value))).success,
  })
  const shaped = arbitraryOf(request, hints).map(asJson)
  const stray = fc.jsonValue({ maxDepth: 3 }).map(asJson)
  const noJson = fc.record({
    body: fc.oneof(fc.string(), fc.constantFrom('{', '[1e999]', '{"__proto__":{"a":1}}')),
    mediaType: fc.constantFrom('application/json', 'text/plain', 'multipart/form-data; boundary=x'),
    isShaped: fc.constant(false),
  })
  return fc.oneof(
    { weight: 10, arbitrary: shaped },
    { weight: 1, arbitrary: stray },
    { weight: 1, arbitrary: noJson },
  )
}

const CONTENTS = ['plain text', '%PDF-1.7\n', '\u0089PNG\r\n\u001a\n', '\u0000\u0001', '']

/** A form with a file: some of a kind that is taken, some only named so. */
const formWithFile: fc.Arbitrary<Body> = fc
  .record({
    name: fc.constantFrom('note.txt', 'report.pdf', 'quay.png', '../../up.txt', 'x'),
    content: fc.oneof(fc.constantFrom(...CONTENTS), fc.string()),
    caption: fc.string({ maxLength: 320 }),
  })
  .map(({ name, content, caption }) => {
    const body = new FormData()
    body.append('file', new Blob([content]), name)
    body.append('caption', caption)
    return { body, isShaped: caption.trim().length <= 300 }
  })

/** A request to any route, from anybody. */
export function arbitraryRequest(server: WholeServer): fc.Arbitrary<Drawn> {
  const hints = hintsFor(server)
  const [nobody, ...people] = server.visitors as [Visitor, ...Visitor[]]
  const forged = { ...nobody, what: 'forger', cookie: 'toehold-session=forged' }
  const mighty = people.filter(({ role, member }) => role === 'admin' || member === 'lead')
  const visitors = fc.oneof(
    { weight: 1, arbitrary: fc.constantFrom(nobody, forged) },
    { weight: 4, arbitrary: fc.constantFrom(...people) },
    { weight: 4, arbitrary: fc.constantFrom(...mighty) },
  )
  const routes = server.operations.map((operation) =>
    fc.record({
      operation: fc.constant(operation),
      visitor: visitors,
      path: pathOf(operation, server),
      query: queryOf(operation, hints),
      body: bodyOf(operation, hints),
    }),
  )
  return fc.oneof(...routes).map(({ operation, visitor, path, query, body }) => {
    const { isShaped: hasShape, ...content } = body
    const words = new URLSearchParams(query).toString()
    const { method } = operation
    return {
      ...{ operation, visitor },
      sent: { method, path: words ? `${path}?${words}` : path, cookie: visitor.cookie, ...content },
      isShaped: hasShape && (operation.query?.safeParse(query).success ?? true),
    }
  })
}
