import type { OwnPasswordChange } from '@shared/schemas/people'
import { eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import { confirmPassword } from '../../auth/confirm-password'
import { endSessions } from '../../auth/end-sessions'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { people } from '../../db/schema/people'

export interface OwnSession {
  token: string
  address: string
}

/** Sets a new password and ends every session but this one. Guesses at the old one are counted like sign-ins. */
export async function changeOwnPassword(
  context: AppContext,
  actor: Actor,
  { current, next }: OwnPasswordChange,
  session: OwnSession,
): Promise<void> {
  const { db, auth, now } = context
  await confirmPassword(context, actor, { password: current, address: session.address, field: 'current' })

  const passwordHash = await auth.passwords.hash(next)
  inTransaction(db, (tx) => {
    tx.update(people).set({ passwordHash }).where(eq(people.id, actor.id)).run()
    endSessions(tx, actor.id, session.token)
    recordEvent(tx, {
      kind: 'person.passwordChanged',
      subject: { type: 'person', id: actor.id },
      actor,
      at: now(),
    })
  })
}
