import { mkdtempSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import express, { type Express, type Request } from 'express'
import { pino } from 'pino'
import request from 'supertest'
import { onTestFinished } from 'vitest'
import type { Db } from '../../server/db/client'
import { accounts, organisations } from '../../server/db/schema'
import { DEMO_ORGANISATIONS, DEMO_PEOPLE, type DemoPerson } from '../../server/demo/demo-people'
import { openFileStore } from '../../server/files/file-store'
import { errorHandler } from '../../server/http/error-handler'
import { receiveJsonText, receiveLongJsonText } from '../../server/http/json-body'
import { type Access, mountOperations } from '../../server/http/mount-operations'
import type { SignedIn } from '../../server/http/operation'
import { requestLog } from '../../server/logger'
import { findMember } from '../../server/modules/members/members.queries'
import { ordersOperations } from '../../server/modules/orders/orders.routes'
import { sheetsOperations } from '../../server/modules/sheets/sheets.routes'
import type { SheetWork } from '../../server/modules/sheets/sheet-work'
import { verificationOperations } from '../../server/modules/verification/verification.routes'
import { projectOperations } from '../../server/project-operations'
import { createKeyedHash } from '../../server/auth/keyed-hash'
import type { Line, Project, Scenario } from '../../shared/schemas/project'
import type { ScenarioContent } from '../../shared/schemas/scenario'
import { lowRoadContent, SHORT_STATIONS } from './ferry-quay'
import { freshDatabase, SECRET } from './server-app'

export type Person = keyof typeof DEMO_PEOPLE

/** Says who sends a request, in place of a session. */
const WHO = 'x-test-person'

/** The moment at which the clock of a test stands, unless it moves it. */
export const NOON = Date.UTC(2031, 2, 3, 12)

export function insertPeople(db: Db): void {
  const createdAt = 0
  for (const organisation of Object.values(DEMO_ORGANISATIONS)) {
    db.insert(organisations)
      .values({ ...organisation, createdAt })
      .run()
  }
  for (const person of Object.values<DemoPerson>(DEMO_PEOPLE)) {
    const { what: _, ...account } = person
    db.insert(accounts)
      .values({ ...account, createdAt })
      .run()
  }
}

/** Access by a header instead of a session; membership is read from the database, as in the product. */
function accessByHeader(db: Db): Access {
  return {
    signedIn: (req: Request): SignedIn | null => {
      const who = req.get(WHO) as Person | undefined
      if (!who) return null
      const { id, name, role, mayCheck, mayApprove, organisationId }: DemoPerson = DEMO_PEOPLE[who]
      const account = { name, role, mayCheck, mayApprove, organisationId }
      return { accountId: id, sessionId: `session-${who}`, ...account, member: null }
    },
    memberRole: (projectId, accountId) => findMember(db, projectId, accountId)?.role ?? null,
  }
}

export interface ProjectServer {
  readonly app: Express
  readonly db: Db
  readonly filesFolder: string
  readonly clock: { now: number }
  /** What services of sheets work with, for seeds. */
  readonly sheetWork: SheetWork
}

/** Routes of desk and projects on a database of their own, with the people of the demonstration. */
export function projectServer(): ProjectServer {
  const { db } = freshDatabase()
  insertPeople(db)
  const folder = mkdtempSync(join(tmpdir(), 'toehold-files-'))
  onTestFinished(() => {
    rmSync(folder, { recursive: true })
  })
  const clock = { now: NOON }
  const filesFolder = join(folder, 'files')
  const work = { db, now: () => clock.now, store: openFileStore(filesFolder) }
  const app = express()
  app.use(requestLog(pino({ level: 'silent' })))
  app.use(receiveLongJsonText)
  app.use(receiveJsonText)
  const sheetWork = {
    ...work,
    ...{ mail: { isSmtp: true, from: 'toehold@mail.test' }, appUrl: 'https://toehold.test' },
    ...{ keyedHash: createKeyedHash(SECRET), software: 'Toehold of the tests' },
  }
  const operations = [
    ...projectOperations(work),
    ...sheetsOperations(sheetWork),
    ...verificationOperations(sheetWork),
    ...ordersOperations(sheetWork),
  ]
  app.use(mountOperations(operations, accessByHeader(db)))
  app.use(errorHandler)
  return { app, db, filesFolder, clock, sheetWork }
}

type Method = 'get' | 'post' | 'put' | 'patch' | 'delete'

/** A request as somebody; null: as nobody. */
export function as(server: ProjectServer, person: Person | null) {
  const send = (method: Method, path: string) => {
    const sent = request(server.app)[method](path)
    return person ? sent.set(WHO, person) : sent
  }
  return {
    get: (path: string) => send('get', path),
    post: (path: string, body?: object) => send('post', path).send(body),
    put: (path: string, body: object) => send('put', path).send(body),
    patch: (path: string, body: object) => send('patch', path).send(body),
    delete: (path: string) => send('delete', path),
  }
}

export const content = (changes: Partial<ScenarioContent> = {}): ScenarioContent =>
  lowRoadContent({ place: 5, waterLevel: 3.2, ...changes })

/** A project of Engineer A with a short line and one scenario, and the addresses of all three. */
export async function startedProject(server: ProjectServer) {
  const lead = as(server, 'engineerA')
  const made = await lead.post('/api/projects', { name: 'Quay', datum: 'QD' }).expect(201)
  const project = made.body as Project
  const projectPath = `/api/projects/${project.id}`
  const lineBody = { name: 'Low road', stations: SHORT_STATIONS }
  const line = (await lead.post(`${projectPath}/lines`, lineBody).expect(201)).body as Line
  const linePath = `${projectPath}/lines/${line.id}`
  const scenarioBody = { name: 'As asked', content: content() }
  const answer = await lead.post(`${linePath}/scenarios`, scenarioBody).expect(201)
  const scenario = answer.body as Scenario
  const scenarioPath = `${linePath}/scenarios/${scenario.id}`
  return { lead, project, projectPath, line, linePath, scenario, scenarioPath }
}

/** Makes somebody a member of a project that Engineer A leads. */
export async function addMember(
  server: ProjectServer,
  projectPath: string,
  person: Person,
  role: string,
) {
  const { email } = DEMO_PEOPLE[person]
  await as(server, 'engineerA').post(`${projectPath}/members`, { email, role }).expect(201)
}
