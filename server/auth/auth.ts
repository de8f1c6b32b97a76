import { eq } from 'drizzle-orm'
import { Lucia, TimeSpan } from 'lucia'
import type { Db } from '../db/client'
import { personRoles } from '../db/schema/people'
import type { Actor } from './actor'
import { createPasswords, type Passwords } from './passwords'
import { createSessionAdapter } from './session-adapter'

const sessionDays = 14

export interface Auth {
  lucia: ReturnType<typeof createLucia>
  passwords: Passwords
}

declare module 'lucia' {
  interface Register {
    Lucia: ReturnType<typeof createLucia>
    DatabaseUserAttributes: { name: string; active: boolean }
  }
}

export function createAuth(db: Db, passwords: Passwords = createPasswords()): Auth {
  return { lucia: createLucia(db), passwords }
}

function createLucia(db: Db) {
  return new Lucia(createSessionAdapter(db), {
    sessionExpiresIn: new TimeSpan(sessionDays, 'd'),
    sessionCookie: { name: 'lapwing_session', attributes: { sameSite: 'lax', path: '/' } },
    getUserAttributes: ({ name, active }) => ({ name, active }),
  })
}

/** Who a cookie's string stands for; null when it is unknown, has run out, or the person is no longer active. */
export async function findActor(
  { lucia }: Auth,
  db: Db,
  token: string,
): Promise<{ actor: Actor; extended: boolean } | null> {
  const { user, session } = await lucia.validateSession(token)
  if (!session || !user.active) return null
  const roles = db
    .select({ role: personRoles.role })
    .from(personRoles)
    .where(eq(personRoles.personId, user.id))
    .all()
  return {
    actor: { id: user.id, name: user.name, roles: roles.map((row) => row.role) },
    extended: session.fresh,
  }
}
