import type { Request, RequestHandler } from 'express'
import { ForbiddenError } from '../errors'

export interface OriginCheckParts {
  /** Address at which people reach the program. */
  readonly appUrl: string
  /** True where a request carries the cookie of a session. */
  readonly carriesSession: (req: Request) => boolean
}

const READING = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses changes that a page of somebody else has a browser send, besides `SameSite`.
 *
 * Every browser names the origin of a change. It must be the address of the program, or the host that
 * the request came to. Without an origin the browser's word on where the request starts counts
 * (`Sec-Fetch-Site`). Without both it is no browser: such a program may send what needs no session;
 * with a session it has to say its origin, as a browser would.
 */
export function originCheck({ appUrl, carriesSession }: OriginCheckParts): RequestHandler {
  const own = new URL(appUrl).origin
  return (req, _res, next) => {
    if (!READING.has(req.method) && !isOurs(req, own, carriesSession)) {
      throw new ForbiddenError(
        `A change must come from a page of this program; the header "Origin" must be ${own}.`,
      )
    }
    next()
  }
}

function isOurs(
  req: Request,
  own: string,
  carriesSession: OriginCheckParts['carriesSession'],
): boolean {
  const origin = req.get('origin')
  if (origin !== undefined) return origin === own || hostOf(origin) === req.get('host')
  const site = req.get('sec-fetch-site')
  if (site !== undefined) return site === 'same-origin' || site === 'none'
  return !carriesSession(req)
}

/** Host with port; "null" and whatever else is no address have none. */
function hostOf(origin: string): string | undefined {
  return URL.canParse(origin) ? new URL(origin).host || undefined : undefined
}
