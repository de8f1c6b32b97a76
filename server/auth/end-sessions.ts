import { and, eq, ne } from 'drizzle-orm'
import type { Tx } from '../db/client'
import { sessions } from '../db/schema/people'
import { hashOf } from './session-adapter'

/** Ends the person's sessions, save the one whose cookie carries `exceptToken`. */
export function endSessions(tx: Tx, personId: string, exceptToken?: string): void {
  const others = exceptToken === undefined ? undefined : ne(sessions.id, hashOf(exceptToken))
  tx.delete(sessions)
    .where(and(eq(sessions.userId, personId), others))
    .run()
}
