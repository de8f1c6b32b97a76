import { eq } from 'drizzle-orm'
import type { AppContext } from '../context'
import { people } from '../db/schema/people'
import { invalidField, notFound } from '../errors'
import type { Actor } from './actor'
import { beginAttempt, succeedAttempt } from './attempts'

/** The signed-in person's own password once more. Guesses are counted like sign-ins. */
export async function confirmPassword(
  { db, auth, now }: AppContext,
  actor: Actor,
  { password, address, field }: { password: string; address: string; field: string },
): Promise<void> {
  const person = db.select().from(people).where(eq(people.id, actor.id)).get()
  if (!person) throw notFound('person')
  const attempt = { account: person.email, address, at: now() }
  beginAttempt(db, attempt)
  if (!(await auth.passwords.verify(person.passwordHash, password))) {
    throw invalidField(field, { key: 'people.password.wrong' })
  }
  succeedAttempt(db, attempt)
}
