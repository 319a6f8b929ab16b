import { DEMO_PASSWORD, DEMO_PEOPLE } from '../../server/demo/demo-people'
import type { Person } from './project-server'

/** A client over real HTTP that carries its session as a browser does. */
export interface ApiClient {
  readonly get: (path: string) => Promise<Response>
  readonly send: (method: 'POST' | 'PUT' | 'PATCH', path: string, body: object) => Promise<Response>
}

/** A client with a session that was opened before, at this or an earlier run of the server. */
export function clientWith(address: string, cookie: string): ApiClient {
  const session = { Origin: address, Cookie: cookie }
  return {
    get: (path) => fetch(`${address}${path}`, { headers: session }),
    send: (method, path, body) =>
      fetch(`${address}${path}`, {
        method,
        headers: { ...session, 'Content-Type': 'application/json' },
        body: JSON.stringify(body),
      }),
  }
}

/** Signs one of the demonstration's people in at a running server; gives the cookie. */
export async function signIn(address: string, person: Person): Promise<string> {
  const { email } = DEMO_PEOPLE[person]
  const body = { email, password: DEMO_PASSWORD }
  const answer = await clientWith(address, '').send('POST', '/api/session', body)
  if (!answer.ok) throw new Error(`Nobody is signed in: ${await answer.text()}`)
  const cookies = answer.headers.getSetCookie()
  return cookies.map((cookie) => cookie.split(';')[0]).join('; ')
}

export async function signedInClient(address: string, person: Person): Promise<ApiClient> {
  return clientWith(address, await signIn(address, person))
}
