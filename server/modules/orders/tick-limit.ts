import type { Clock } from '../../clock'
import { TooManyRequestsError } from '../../errors'

/** So many deliveries at once, and one more each second: a whole crew behind one token. */
const AT_ONCE = 60
const REFILL = 1000

/** Tokens that are remembered; the one that was quiet for longest goes first. */
const MOST_TOKENS = 1000

interface Bucket {
  left: number
  at: number
}

/** Takes one delivery of a token. */
export type TickLimit = (token: string) => void

/**
 * Keeps one token from filling the database.
 *
 * @returns A function that throws TooManyRequestsError while the token has to wait.
 */
export function createTickLimit(now: Clock): TickLimit {
  const buckets = new Map<string, Bucket>()
  return (token) => {
    const at = now()
    const before = buckets.get(token) ?? { left: AT_ONCE, at }
    const left = Math.min(AT_ONCE, before.left + Math.max(0, at - before.at) / REFILL)
    if (left < 1) {
      throw new TooManyRequestsError('Too many ticks at once. They are kept; try again.', 1)
    }
    buckets.delete(token)
    buckets.set(token, { left: left - 1, at })
    const [oldest] = buckets.keys()
    if (buckets.size > MOST_TOKENS && oldest !== undefined) buckets.delete(oldest)
  }
}
