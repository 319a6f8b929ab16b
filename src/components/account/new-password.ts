/** Shortest password; the same bound as in the contract of the API, which would bring zod along. */
export const SHORTEST_PASSWORD = 12

export function isLongEnough(password: string): boolean {
  return password.length >= SHORTEST_PASSWORD
}
