import type { Adapter, DatabaseSession } from 'lucia'

export interface AdapterParts {
  /** Name of a session in the database; nobody gets from it to the session. */
  readonly handleOf: (sessionId: string) => string
  readonly now: () => number
}

/**
 * Stands between Lucia and its adapter. The database holds the hash of a session id instead of the id,
 * so that reading it opens no session; and Lucia, which reads the clock of the machine, follows ours.
 */
export function guardedAdapter(inner: Adapter, { handleOf, now }: AdapterParts): Adapter {
  const shifted = (moment: Date, by: number) => new Date(moment.getTime() + by)
  const forLucia = (moment: Date) => shifted(moment, Date.now() - now())
  const forUs = (moment: Date) => shifted(moment, now() - Date.now())
  const shown = (session: DatabaseSession, id: string) => ({
    ...session,
    id,
    expiresAt: forLucia(session.expiresAt),
  })
  return {
    getSessionAndUser: async (id) => {
      const [session, user] = await inner.getSessionAndUser(handleOf(id))
      return [session && shown(session, id), user]
    },
    getUserSessions: async (userId) => {
      const sessions = await inner.getUserSessions(userId)
      return sessions.map((session) => shown(session, session.id))
    },
    setSession: (session) =>
      inner.setSession({
        ...session,
        id: handleOf(session.id),
        expiresAt: forUs(session.expiresAt),
      }),
    updateSessionExpiration: (id, expiresAt) =>
      inner.updateSessionExpiration(handleOf(id), forUs(expiresAt)),
    deleteSession: (id) => inner.deleteSession(handleOf(id)),
    deleteUserSessions: (userId) => inner.deleteUserSessions(userId),
    deleteExpiredSessions: () => inner.deleteExpiredSessions(),
  }
}
