import { randomBytes, randomUUID } from 'node:crypto'

/** Random part of a link: 256 bit, safe in an address. */
export function newToken(): string {
  return randomBytes(32).toString('base64url')
}

/** Name of a row; it opens nothing. */
export function newId(): string {
  return randomUUID()
}
