import { createHmac } from 'node:crypto'

/** A hash that only the holder of the server's secret can make; the purpose keeps uses apart. */
export type KeyedHash = (purpose: string, text: string) => string

/**
 * HMAC-SHA-256 under the server's secret. Sessions, links and attempts stand in the database only as
 * such hashes: who reads the database can neither sign in nor learn which addresses were tried.
 */
export function createKeyedHash(secret: string): KeyedHash {
  return (purpose, text) =>
    createHmac('sha256', secret).update(`${purpose}\u0000${text}`).digest('base64url')
}
