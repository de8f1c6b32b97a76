import { createHash } from 'node:crypto'
import { DrizzleSQLiteAdapter } from '@lucia-auth/adapter-drizzle'
import type { Adapter } from 'lucia'
import type { Db } from '../db/client'
import { people, sessions } from '../db/schema/people'

/**
 * lucia keeps a session under the very string that the cookie carries, so whoever reads the database file
 * could sign in as anybody. Here the file holds only the string's SHA-256; the string has 200 random bits,
 * so it can't be guessed back.
 */
export function createSessionAdapter(db: Db): Adapter {
  const inner = new DrizzleSQLiteAdapter(db, sessions, people)
  return {
    getSessionAndUser: async (token) => {
      const [session, user] = await inner.getSessionAndUser(hashOf(token))
      return [session && { ...session, id: token }, user]
    },
    setSession: (session) => inner.setSession({ ...session, id: hashOf(session.id) }),
    updateSessionExpiration: (token, expiresAt) => inner.updateSessionExpiration(hashOf(token), expiresAt),
    deleteSession: (token) => inner.deleteSession(hashOf(token)),
    getUserSessions: (userId) => inner.getUserSessions(userId),
    deleteUserSessions: (userId) => inner.deleteUserSessions(userId),
    deleteExpiredSessions: () => inner.deleteExpiredSessions(),
  }
}

/** What the sessions table holds for a cookie's string. */
export function hashOf(token: string): string {
  return createHash('sha256').update(token).digest('hex')
}
