import { cpSync, mkdtempSync, rmSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { sql } from 'drizzle-orm'
import { onTestFinished } from 'vitest'
import {
  ACCOUNT_ROLES,
  MEMBER_ROLES,
  type AccountRole,
  type MemberRole,
} from '../../shared/access/roles'
import { operationsOf } from '../../server/app'
import type { Db } from '../../server/db/client'
import { projectMembers } from '../../server/db/schema'
import type { OrderItem } from '../../shared/schemas/order-api'
import type { SheetRecord } from '../../shared/schemas/sheet-api'
import { lowRoadContent, SHORT_STATIONS } from './ferry-quay'
import { insertClass } from '../../server/modules/classes/classes.queries'
import { linkFor, tokenOf } from './links'
import { browser, makePerson, ORIGIN, PASSWORD, signedIn, type TestPerson } from './people'
import { type AtEnd, freshApp } from './server-app'

/** Somebody of each account role, as member of each kind and as none. */
export interface Visitor {
  /** Such as "engineer, editor", or "nobody". */
  readonly what: string
  readonly role: AccountRole | null
  readonly member: MemberRole | null
  /** Value of the cookie header; empty for nobody. */
  readonly cookie: string
}

export const SHORT_CONTENT = lowRoadContent({ place: 5, waterLevel: 3.2 })

/** Folder that goes with the test. */
function temporaryFolder(atEnd: AtEnd): string {
  const folder = mkdtempSync(join(tmpdir(), 'toehold-whole-'))
  atEnd(() => {
    rmSync(folder, { recursive: true })
  })
  return folder
}

async function cookieOf(app: ReturnType<typeof freshApp>['app'], { email }: TestPerson) {
  const answer = await browser(app).post('/api/session').send({ email, password: PASSWORD })
  const [cookie = ''] = answer.headers['set-cookie'] as unknown as string[]
  return cookie.split(';')[0]!
}

/** A project with a gauge, a line, a scenario and a file, and people who wait for an answer. */
async function furnish(server: ReturnType<typeof freshApp>) {
  const { app, db, parts } = server
  const lead = makePerson(parts, { id: 'the-lead', email: 'lead@people.test' })
  const admin = makePerson(parts, { id: 'the-admin', email: 'admin@people.test', role: 'admin' })
  const [agent, office] = [await signedIn(app, lead), await signedIn(app, admin)]
  const post = async (path: string, body: object) =>
    ((await agent.post(path).send(body).expect(201)).body as { id: string }).id
  const projectId = await post('/api/projects', { name: 'Quay', datum: 'QD' })
  const project = `/api/projects/${projectId}`
  const gaugeId = await post(`${project}/gauges`, { name: 'Lock', zero: 0.6 })
  const readings = [0, 1, 2].map((hour) => ({
    time: 1_930_000_000_000 + hour * 3_600_000,
    expected: 2,
  }))
  const issue = { origin: 'typed', issuedAt: 1_930_000_000_000, readings }
  const forecastId = await post(`${project}/gauges/${gaugeId}/forecasts`, issue)
  const stations = SHORT_STATIONS.map((row) => ({ ...row, x: row.chainage, y: 0 }))
  const lineId = await post(`${project}/lines`, { name: 'Low road', stations })
  const depotId = await post('/api/depots', { name: 'Mill Lane' })
  const scenario = { name: 'As asked', content: SHORT_CONTENT }
  const scenarioId = await post(`${project}/lines/${lineId}/scenarios`, scenario)
  const sheetId = await post(`${project}/sheets`, { lineId, scenarioId })
  const wanted = { lineId, scenarioId, version: 1, meetAt: 'Slipway head' }
  const expiresAt = Date.now() + 20 * 24 * 3_600_000
  const ordered = await agent
    .post(`${project}/orders`)
    .send({ ...wanted, expiresAt })
    .expect(201)
  const order = ordered.body as OrderItem
  const comment = { text: 'Where is the friction from?' }
  const commented = await agent
    .post(`${project}/sheets/${sheetId}/comments`)
    .send(comment)
    .expect(201)
  const uploaded = await agent
    .post(`${project}/files`)
    .attach('file', Buffer.from('Low road, 28 stations'), 'note.txt')
    .expect(201)
  const invited = { email: 'invited@people.test', role: 'viewer', organisationId: 'tests' }
  const invitation = await office.post('/api/admin/invitations').send(invited).expect(201)
  await browser(app).post('/api/password-resets').send({ email: lead.email }).expect(202)
  return {
    ...{ projectId, gaugeId, forecastId, lineId, scenarioId, sheetId, depotId },
    commentId: (commented.body as SheetRecord).comments[0]!.id,
    line: '2.1',
    orderId: order.id,
    fileId: (uploaded.body as { id: string }).id,
    version: '1',
    accountId: lead.id,
    organisationId: 'tests',
    invitationId: (invitation.body as { id: string }).id,
    mailId: mailTo(db, invited.email),
    tokens: [
      ...[tokenOf(linkFor(db, invited.email)), tokenOf(linkFor(db, lead.email)), order.token],
    ] as const,
  }
}

function mailTo(db: Db, recipient: string): string {
  return db.get<{ id: string }>(sql`select id from mails where recipient = ${recipient}`).id
}

async function visitorsOf({ app, db, parts }: ReturnType<typeof freshApp>, projectId: string) {
  const visitors: Visitor[] = [{ what: 'nobody', role: null, member: null, cookie: '' }]
  for (const role of ACCOUNT_ROLES) {
    for (const member of [null, ...MEMBER_ROLES]) {
      const person = makePerson(parts, { id: `${role}-${member ?? 'none'}`, role })
      if (member) {
        db.insert(projectMembers)
          .values({ projectId, accountId: person.id, role: member, addedAt: 0 })
          .run()
      }
      const cookie = await cookieOf(app, person)
      visitors.push({ what: `${role}, ${member ?? 'no member'}`, role, member, cookie })
    }
  }
  return visitors
}

/** A class that asks, on a scale that most figures lie on. */
function classOf(db: Db, trainer: string): string {
  const code = 'CDF347'
  const guess = { kind: 'count', min: -1e9, max: 1e9, step: 1 } as const
  insertClass(db, {
    ...{ id: 'the-class', code, openedBy: trainer, openedAt: 0, expiresAt: 4_102_444_800_000 },
    scene: {
      ...{ course: 'short', scene: 'grip', phase: 'question', title: '', question: 'How many?' },
      ...{ units: 'metric', guess, answer: null },
    },
  })
  return code
}

/** The whole server, furnished and listening, with somebody of each kind at its door. */
export async function wholeServer(atEnd: AtEnd = onTestFinished) {
  const folder = temporaryFolder(atEnd)
  const server = freshApp({
    atEnd,
    // Nothing is sent: no worker runs.
    environment: {
      DATA_DIR: join(folder, 'data'),
      SMTP_URL: 'smtp://127.0.0.1:1',
      MAIL_FROM: 'toehold@mail.test',
    },
  })
  const furnished = await furnish(server)
  cpSync(join(folder, 'data'), join(folder, 'kept'), { recursive: true })
  const visitors = await visitorsOf(server, furnished.projectId)
  const ids = { ...furnished, code: classOf(server.db, 'trainer-none') }
  const listener = createServer(server.app)
  await new Promise<void>((resolve) => listener.listen(0, '127.0.0.1', resolve))
  atEnd(() => {
    listener.closeAllConnections()
    listener.close()
  })
  const address = `http://127.0.0.1:${(listener.address() as AddressInfo).port}`
  const operations = operationsOf(server.app)
  /** Runs something and takes back whatever it wrote to the database and deleted from the disk. */
  const undone = async <T>(run: () => Promise<T>): Promise<T> => {
    server.db.run(sql`begin immediate`)
    try {
      return await run()
    } finally {
      server.db.run(sql`rollback`)
      cpSync(join(folder, 'kept'), join(folder, 'data'), { recursive: true })
    }
  }
  return { ...server, ids, visitors, address, operations, undone }
}

export type WholeServer = Awaited<ReturnType<typeof wholeServer>>

export interface Sent {
  readonly method: string
  readonly path: string
  readonly cookie: string
  readonly body?: BodyInit
  readonly mediaType?: string
}

/** Sends a request as a browser of the program would. */
export function send(address: string, { method, path, cookie, body, mediaType }: Sent) {
  const headers: Record<string, string> = { Origin: ORIGIN }
  if (cookie !== '') headers.Cookie = cookie
  if (mediaType !== undefined) headers['Content-Type'] = mediaType
  const hasBody = body !== undefined && method !== 'get'
  return fetch(address + path, {
    method: method.toUpperCase(),
    headers,
    redirect: 'manual',
    ...(hasBody ? { body } : {}),
  })
}

/** The path with everything in it that it names; what is not known stands for what is not there. */
export function filledPath(path: string, values: Readonly<Record<string, string>>): string {
  return path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(values[name] ?? 'nothing'))
}
