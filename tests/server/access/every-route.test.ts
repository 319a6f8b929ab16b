import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { MEMBER_ROLES, type AccountRole, type MemberRole } from '../../../shared/access/roles'
import { ACCESS_RULES, decideAccess, type RuleId } from '../../../shared/access/rules'
import type { Problem } from '../../../shared/schemas/problem'
import { mountOperations } from '../../../server/http/mount-operations'
import { defineOperation, type Operation } from '../../../server/http/operation'
import { routesOf } from '../../support/routes'
import {
  filledPath,
  send,
  type Visitor,
  type WholeServer,
  wholeServer,
} from '../../support/whole-server'

/** One server for the whole file: every request is undone. */
let server: WholeServer
const tidying: (() => void)[] = []
beforeAll(async () => {
  server = await wholeServer((tidy) => tidying.push(tidy))
}, 60_000)
afterAll(() => {
  tidying.reverse().forEach((tidy) => {
    tidy()
  })
})

/** What the server made of a request before the route itself had a say. */
type Outcome = ReturnType<typeof decideAccess>

async function outcomeOf(answer: Response, { id }: Operation): Promise<Outcome> {
  const text = await answer.text()
  if (answer.ok) return 'allowed'
  const { code, message } = JSON.parse(text) as Problem
  if (code === 'sign-in-required' && id !== 'signIn') return 'sign-in'
  if (code === 'not-found' && message.endsWith('does not exist, or not for you')) return 'hidden'
  return code === 'forbidden' ? 'forbidden' : 'allowed'
}

/** An empty body: whoever gets past the rule is told what is missing, and changes little. */
async function knock(operation: Operation, { cookie }: Visitor) {
  const { method, path, request } = operation
  const body = request ? { body: '{}', mediaType: 'application/json' } : {}
  const { tokens: _, ...ids } = server.ids
  const sent = { method, path: filledPath(path, ids), cookie, ...body }
  return server.undone(async () => outcomeOf(await send(server.address, sent), operation))
}

describe('access', { timeout: 120_000 }, () => {
  it('is what the table says, on every route, for every role, as member of each kind or none', async () => {
    const wrong: string[] = []
    let knocks = 0
    for (const operation of server.operations) {
      for (const visitor of server.visitors) {
        const { role, member, what } = visitor
        const inProject = operation.path.includes(':projectId') ? member : null
        const expected = decideAccess(operation.rule, role && { role }, inProject)
        const actual = await knock(operation, visitor)
        knocks++
        if (actual !== expected) {
          wrong.push(
            `${operation.method} ${operation.path} for ${what}: ${actual}, not ${expected}`,
          )
        }
      }
    }
    expect(wrong).toEqual([])
    expect(server.visitors).toHaveLength(21)
    expect(knocks).toBe(routesOf(server.app).length * 21)
  })

  it('is in the walk for every route that Express has', () => {
    const { app, operations } = server
    const walked = operations.map(({ method, path }) => `${method} ${path}`)
    expect(walked.sort()).toEqual([...routesOf(app)].sort())
    expect(walked.length).toBeGreaterThan(70)
  })
})

/** The table once more, as people say it; a change of a rule has to be made in both places. */
const SAID: Readonly<
  Record<RuleId, (role: AccountRole | null, member: MemberRole | null) => boolean>
> = {
  open: () => true,
  'signed-in': (role) => role !== null,
  'make-project': (role) => role === 'engineer',
  'copy-project': (role, member) =>
    role === 'engineer' && (member === 'lead' || member === 'editor'),
  'read-project': (role, member) => role !== null && member !== null,
  'edit-project': (role, member) =>
    role !== null && role !== 'viewer' && (member === 'lead' || member === 'editor'),
  'lead-project': (role, member) => role !== null && role !== 'viewer' && member === 'lead',
  'keep-store': (role) => role === 'admin' || role === 'engineer',
  'run-classes': (role) => role === 'trainer',
  administer: (role) => role === 'admin',
}

describe('the table of rules', () => {
  it.each(Object.keys(ACCESS_RULES) as RuleId[])('means by %s what people say of it', (rule) => {
    const roles = ['admin', 'engineer', 'checker', 'trainer', 'viewer', null] as const
    for (const role of roles) {
      for (const member of [...MEMBER_ROLES, null]) {
        const isAllowed = decideAccess(rule, role && { role }, member) === 'allowed'
        expect(isAllowed, `${role ?? 'nobody'}, ${member ?? 'no member'}`).toBe(
          SAID[rule](role, member),
        )
      }
    }
  })
})

describe('a route', () => {
  const route = defineOperation({
    method: 'get',
    path: '/api/secret',
    id: 'readSecret',
    summary: 'A secret',
    rule: 'administer',
    problems: [],
    handle: () => undefined,
  })
  const mount = (operation: unknown) =>
    mountOperations([operation as Operation], { signedIn: () => null, memberRole: () => null })

  it('is mounted with a rule of the table', () => {
    expect(() => mount(route)).not.toThrow()
  })

  it.each([undefined, null, '', 'everybody', 'toString', '__proto__'])(
    'is not mounted with the rule %s',
    (rule) => {
      expect(() => mount({ ...route, rule })).toThrow(/^readSecret has no rule of the access table/)
    },
  )

  it('of the whole server is under /api, and has a rule of the table', () => {
    const { operations } = server
    for (const { path, rule } of operations) {
      expect(path).toMatch(/^\/api\//)
      expect(Object.keys(ACCESS_RULES)).toContain(rule)
    }
  })

  it('of a project says so in its address, and no other has a rule of members', () => {
    const { operations } = server
    for (const { path, rule } of operations) {
      expect('member' in ACCESS_RULES[rule], path).toBe(path.includes(':projectId'))
    }
  })
})
