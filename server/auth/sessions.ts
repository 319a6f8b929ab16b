import type { Request, Response } from 'express'
import type { SignedIn } from '../http/operation'
import type { KeyedHash } from './keyed-hash'
import { createLucia, type LuciaParts } from './lucia'

const LONGEST_USER_AGENT = 200

/** Opens, reads and closes the session that a browser carries in its cookie. */
export interface Sessions {
  readonly open: (req: Request, res: Response, accountId: string) => Promise<void>
  /** Whoever is signed in; one read of the database per request, however often it is asked. */
  readonly read: (req: Request, res: Response) => Promise<SignedIn | null>
  readonly close: (req: Request, res: Response) => Promise<void>
  /** True where a request carries the cookie of a session, valid or not. */
  readonly isCarriedBy: (req: Request) => boolean
}

export type SessionParts = Omit<LuciaParts, 'handleOf'> & { readonly keyedHash: KeyedHash }

export function createSessions({ keyedHash, ...parts }: SessionParts): Sessions {
  const handleOf = (sessionId: string) => keyedHash('session', sessionId)
  const lucia = createLucia({ ...parts, handleOf })
  const known = new WeakMap<Request, Promise<SignedIn | null>>()

  const idOf = (req: Request) => cookieOf(req, lucia.sessionCookieName)
  const give = (res: Response, cookie: ReturnType<typeof lucia.createSessionCookie>) =>
    res.append('Set-Cookie', cookie.serialize())

  const validate = async (req: Request, res: Response): Promise<SignedIn | null> => {
    const id = idOf(req)
    if (!id) return null
    const { session, user } = await lucia.validateSession(id)
    if (!session || !user.isActive) {
      if (session) await lucia.invalidateSession(id)
      give(res, lucia.createBlankSessionCookie())
      return null
    }
    if (session.fresh) give(res, lucia.createSessionCookie(id))
    const { id: accountId, isActive: _, ...account } = user
    return { ...account, accountId, sessionId: handleOf(id), member: null }
  }

  const read: Sessions['read'] = (req, res) => {
    const found = known.get(req) ?? validate(req, res)
    known.set(req, found)
    return found
  }

  return {
    read,
    open: async (req, res, accountId) => {
      const before = idOf(req)
      if (before) await lucia.invalidateSession(before)
      const { id } = await lucia.createSession(accountId, {
        created_at: parts.now(),
        user_agent: (req.get('user-agent') ?? '').slice(0, LONGEST_USER_AGENT),
      })
      known.delete(req)
      give(res, lucia.createSessionCookie(id))
    },
    close: async (req, res) => {
      const id = idOf(req)
      if (id) await lucia.invalidateSession(id)
      known.delete(req)
      give(res, lucia.createBlankSessionCookie())
    },
    isCarriedBy: (req) => idOf(req) !== undefined,
  }
}

/** Read here instead of by Lucia, whose parser throws at a cookie of somebody else that is malformed. */
function cookieOf(req: Request, name: string): string | undefined {
  const pairs = (req.get('cookie') ?? '').split(';').map((pair) => pair.trim())
  return pairs.find((pair) => pair.startsWith(`${name}=`))?.slice(name.length + 1)
}
