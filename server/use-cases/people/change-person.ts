import type { Person, PersonChange } from '@shared/schemas/people'
import { and, eq } from 'drizzle-orm'
import type { Actor } from '../../auth/actor'
import { forgetAttempts } from '../../auth/attempts'
import { endSessions } from '../../auth/end-sessions'
import type { AppContext } from '../../context'
import { inTransaction, type Tx } from '../../db/client'
import { differences } from '../../db/differences'
import { recordEvent } from '../../db/events'
import { requirePerson, writeRoles } from '../../db/people'
import { people, personRoles } from '../../db/schema/people'
import { AppError } from '../../errors'

/** Name, roles, whether they may sign in, and a new password. Losing either of the last ends their sessions. */
export async function changePerson(
  { db, auth, now }: AppContext,
  actor: Actor,
  id: string,
  { password, roles, ...plain }: PersonChange,
): Promise<Person> {
  if (id === actor.id && plain.active === false) throw new AppError('ownDeactivation')
  const passwordHash = password === undefined ? undefined : await auth.passwords.hash(password)

  return inTransaction(db, (tx) => {
    const before = requirePerson(tx, id)
    const changes = differences(before, { ...plain, ...(roles && { roles: [...new Set(roles)].sort() }) })
    if (!changes && !passwordHash) return before

    tx.update(people)
      .set({ name: plain.name ?? before.name, active: plain.active ?? before.active, passwordHash })
      .where(eq(people.id, id))
      .run()
    if (roles) writeRoles(tx, id, roles)
    assertAdministratorLeft(tx)
    if (plain.active === false || passwordHash) endSessions(tx, id)
    if (passwordHash) forgetAttempts(tx, before.email)
    recordChange(tx, { actor, id, changes, newPassword: passwordHash !== undefined, at: now() })
    return requirePerson(tx, id)
  })
}

function assertAdministratorLeft(tx: Tx): void {
  const administrator = tx
    .select({ id: people.id })
    .from(people)
    .innerJoin(personRoles, eq(personRoles.personId, people.id))
    .where(and(eq(people.active, true), eq(personRoles.role, 'admin')))
    .limit(1)
    .get()
  if (!administrator) throw new AppError('lastAdministrator')
}

interface RecordedChange {
  actor: Actor
  id: string
  changes: ReturnType<typeof differences>
  newPassword: boolean
  at: Date
}

function recordChange(tx: Tx, { actor, id, changes, newPassword, at }: RecordedChange): void {
  const subject = { type: 'person' as const, id }
  if (changes) recordEvent(tx, { kind: 'person.changed', subject, actor, data: { changes }, at })
  if (newPassword) recordEvent(tx, { kind: 'person.passwordChanged', subject, actor, at })
}
