import type { Clock } from '../clock'
import { TooManyRequestsError } from '../errors'

/** Keys that are remembered; the one that was quiet for longest goes first. */
const MOST_KEYS = 1000

interface Bucket {
  left: number
  at: number
}

export interface BucketRule {
  /** Requests at once. */
  readonly atOnce: number
  /** Time until there is one more [ms]. */
  readonly refill: number
  /** What is said to whoever has to wait. */
  readonly message: string
}

/** Takes one request of a key; throws TooManyRequestsError while the key has to wait. */
export type BucketLimit = (key: string) => void

/** So many requests of one key at once, and one more after each refill. */
export function createBucketLimit(
  now: Clock,
  { atOnce, refill, message }: BucketRule,
): BucketLimit {
  const buckets = new Map<string, Bucket>()
  return (key) => {
    const at = now()
    const before = buckets.get(key) ?? { left: atOnce, at }
    const left = Math.min(atOnce, before.left + Math.max(0, at - before.at) / refill)
    if (left < 1) throw new TooManyRequestsError(message, 1)
    buckets.delete(key)
    buckets.set(key, { left: left - 1, at })
    const [oldest] = buckets.keys()
    if (buckets.size > MOST_KEYS && oldest !== undefined) buckets.delete(oldest)
  }
}
