import { vi } from 'vitest'
import type { Account } from '../../../shared/schemas/account'
import type { Problem } from '../../../shared/schemas/problem'

/** What a faked route answers: a body, or a whole response. */
type Answer = (call: ApiCall) => unknown

export interface ApiCall {
  readonly method: string
  readonly path: string
  readonly query: URLSearchParams
  readonly body: unknown
}

/** Answers of the server by `METHOD /path`; whatever else is asked for is refused with 404. */
export function fakeApi(routes: Readonly<Record<string, Answer>>) {
  const calls: ApiCall[] = []
  vi.stubGlobal('fetch', async (input: string, init: RequestInit = {}) => {
    const { pathname: path, searchParams: query } = new URL(input, 'http://localhost')
    const method = init.method ?? 'GET'
    const body: unknown = typeof init.body === 'string' ? JSON.parse(init.body) : init.body
    const call = { method, path, query, body }
    calls.push(call)
    const answer = routes[`${method} ${path}`]
    const given: unknown = answer ? await answer(call) : refuse(404, 'not-found')
    if (given instanceof Response) return given
    return given === undefined ? new Response(null, { status: 204 }) : Response.json(given)
  })
  return {
    calls,
    /** Bodies that were sent to one route. */
    sent: (route: string) =>
      calls.filter(({ method, path }) => `${method} ${path}` === route).map(({ body }) => body),
  }
}

/** A problem as the server answers it. */
export function refuse(
  status: number,
  code: Problem['code'],
  more: Partial<Problem> & { readonly retryAfter?: number } = {},
): Response {
  const { retryAfter, ...rest } = more
  const headers = new Headers()
  if (retryAfter !== undefined) headers.set('retry-after', String(retryAfter))
  return Response.json({ code, message: code, fields: [], ...rest }, { status, headers })
}

/** A refused field of a problem. */
export function field(path: string, allowed: string): Problem['fields'][number] {
  return { path, value: null, allowed, unit: '–', message: `${path}: it must be ${allowed}` }
}

export function account(change: Partial<Account> = {}): Account {
  return {
    id: 'account-1',
    email: 'engineer@example.invalid',
    name: 'Engineer',
    organisation: { id: 'org-1', name: 'Firm' },
    role: 'engineer',
    mayCheck: false,
    mayApprove: false,
    registrationNumber: '',
    timeZone: 'UTC',
    unitSystem: 'metric',
    ...change,
  }
}
