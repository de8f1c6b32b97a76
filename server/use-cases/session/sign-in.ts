import type { SignIn } from '@shared/schemas/people'
import { eq } from 'drizzle-orm'
import { beginAttempt, succeedAttempt } from '../../auth/attempts'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { people } from '../../db/schema/people'
import { readSettings } from '../../db/settings'
import { AppError } from '../../errors'

export interface SignInFrom {
  address: string
  plainConnection: boolean
}

/** Begins a session; says the same, after the same work, whatever it was that didn't fit. */
export async function signIn(
  context: AppContext,
  { email, password }: SignIn,
  from: SignInFrom,
): Promise<{ personId: string; token: string }> {
  const { db, auth, now } = context
  if (from.plainConnection && !readSettings(db).allowPlainNetwork) throw new AppError('plainNetwork')
  const attempt = { account: email, address: from.address, at: now() }
  beginAttempt(db, attempt)

  const person = await findByPassword(context, email, password)
  if (!person) throw new AppError('badCredentials')

  succeedAttempt(db, attempt)
  const session = await auth.lucia.createSession(person.id, {})
  inTransaction(db, (tx) =>
    recordEvent(tx, {
      kind: 'session.started',
      subject: { type: 'person', id: person.id },
      actor: person,
      data: { address: from.address },
      at: now(),
    }),
  )
  return { personId: person.id, token: session.id }
}

async function findByPassword({ db, auth }: AppContext, email: string, password: string) {
  const person = db.select().from(people).where(eq(people.email, email)).get()
  const matches = await auth.passwords.verify(person?.passwordHash ?? null, password)
  return person && matches && person.active ? person : null
}
