import type { ProblemCode } from '@shared/schemas/problem'
import type { ApiError } from '@/api/request'

const WORDS: Readonly<Partial<Record<ProblemCode, string>>> = {
  'sign-in-required': 'signedOut',
  forbidden: 'forbidden',
  'not-found': 'missing',
  conflict: 'conflict',
  'invalid-input': 'invalid',
  'out-of-range': 'invalid',
  'too-large': 'tooLarge',
  'too-many-requests': 'tooMany',
  internal: 'failed',
  unavailable: 'failed',
}

/** Names a failure by what the person in front of it can do; the part of a key of its texts. */
export function problemWord({ code, isOffline }: Pick<ApiError, 'code' | 'isOffline'>): string {
  if (isOffline) return 'offline'
  return code === null ? 'failed' : (WORDS[code] ?? 'refused')
}
