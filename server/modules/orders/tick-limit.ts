import type { Clock } from '../../clock'
import { type BucketLimit, createBucketLimit } from '../../http/bucket-limit'

/** So many deliveries at once, and one more each second: a whole crew behind one token. */
const RULE = {
  atOnce: 60,
  refill: 1000,
  message: 'Too many ticks at once. They are kept; try again.',
} as const

/** Keeps one token from filling the database. */
export function createTickLimit(now: Clock): BucketLimit {
  return createBucketLimit(now, RULE)
}
