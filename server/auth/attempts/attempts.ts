import type { Db } from '../../db/client'
import { TooManyRequestsError } from '../../errors'
import type { KeyedHash } from '../keyed-hash'
import { deleteAttempts, findAttempts, writeAttempts } from './attempts.queries'

const SECOND = 1000
const MINUTE = 60 * SECOND

/** After so long without an attempt all of them are forgotten. */
export const ATTEMPTS_FORGOTTEN_AFTER = 60 * MINUTE

interface Limit {
  /** Attempts without any delay. */
  readonly free: number
  /** The delay doubles with each further attempt, up to this [ms]. */
  readonly longest: number
}

/**
 * The hard limit counts one address from one sender: whoever guesses slows only themselves, never the
 * owner of the address, who comes from elsewhere. The soft limit counts all addresses of one sender; it
 * stays short, for many people may share a sender.
 */
export const LIMITS = {
  pair: { free: 4, longest: 5 * MINUTE },
  sender: { free: 30, longest: 30 * SECOND },
} as const satisfies Record<string, Limit>

export interface AttemptParts {
  readonly db: Db
  readonly keyedHash: KeyedHash
  readonly now: () => number
}

/** What is attempted, on which address or link, and from which address of the network. */
export interface AttemptOn {
  readonly purpose: 'sign-in' | 'password' | 'reset' | 'link' | 'verify' | 'order' | 'class'
  readonly target: string
  readonly sender: string
}

export interface Attempt {
  readonly pairKey: string
  readonly senderKey: string
  /** Attempts on the same target from the same sender, this one included. */
  readonly count: number
  /** True for the attempt after which the next one has to wait. */
  readonly startsToSlow: boolean
}

/**
 * Counts an attempt before its outcome is known, so that attempts at the same moment count as well.
 *
 * @throws TooManyRequestsError while the sender has to wait; such a request does not count.
 */
export function beginAttempt(parts: AttemptParts, on: AttemptOn): Attempt {
  const { db, keyedHash, now } = parts
  const pairKey = keyedHash('attempt', `${on.purpose} ${on.sender} ${on.target}`)
  const senderKey = keyedHash('attempt', `${on.purpose} ${on.sender}`)
  return db.transaction((tx) => {
    const at = now()
    const pair = countedSoFar(tx, pairKey, at)
    const sender = countedSoFar(tx, senderKey, at)
    const wait = Math.max(waitFor(LIMITS.pair, pair, at), waitFor(LIMITS.sender, sender, at))
    if (wait > 0) refuse(wait)
    const count = pair.count + 1
    writeAttempts(tx, { key: pairKey, count, lastAt: at })
    writeAttempts(tx, { key: senderKey, count: sender.count + 1, lastAt: at })
    return { pairKey, senderKey, count, startsToSlow: count === LIMITS.pair.free }
  })
}

/** Takes an attempt back that succeeded: the owner starts afresh. */
export function forgiveAttempt(db: Db, { pairKey, senderKey }: Attempt): void {
  deleteAttempts(db, pairKey)
  const sender = findAttempts(db, senderKey)
  if (sender) writeAttempts(db, { ...sender, count: Math.max(0, sender.count - 1) })
}

interface Counted {
  readonly count: number
  readonly lastAt: number
}

function countedSoFar(db: Db, key: string, at: number): Counted {
  const found = findAttempts(db, key)
  const isForgotten = !found || at - found.lastAt > ATTEMPTS_FORGOTTEN_AFTER
  return isForgotten ? { count: 0, lastAt: 0 } : found
}

function waitFor({ free, longest }: Limit, { count, lastAt }: Counted, at: number): number {
  if (count < free) return 0
  const delay = Math.min(longest, SECOND * 2 ** (count - free))
  return lastAt + delay - at
}

function refuse(wait: number): never {
  const seconds = Math.ceil(wait / SECOND)
  throw new TooManyRequestsError(
    `Too many attempts. Try again in ${seconds} ${seconds === 1 ? 'second' : 'seconds'}.`,
    seconds,
  )
}
