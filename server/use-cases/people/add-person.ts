import type { NewPerson, Person } from '@shared/schemas/people'
import type { Actor } from '../../auth/actor'
import type { AppContext } from '../../context'
import { inTransaction } from '../../db/client'
import { recordEvent } from '../../db/events'
import { newId } from '../../db/ids'
import { requirePerson, writeRoles } from '../../db/people'
import { people } from '../../db/schema/people'
import { withUniqueClash } from '../../db/unique'
import { alreadyThere } from '../../errors'

/** `actor` is null when the program itself makes the first accounts. */
export async function addPerson(
  { db, auth, now }: AppContext,
  actor: Actor | null,
  { name, email, password, roles }: NewPerson,
): Promise<Person> {
  const id = newId()
  const passwordHash = await auth.passwords.hash(password)
  const at = now()
  const insert = () =>
    inTransaction(db, (tx) => {
      tx.insert(people).values({ id, name, email, passwordHash, createdAt: at.toISOString() }).run()
      writeRoles(tx, id, roles)
      recordEvent(tx, {
        kind: 'person.added',
        subject: { type: 'person', id },
        actor,
        data: { name, email, roles },
        at,
      })
    })
  withUniqueClash(insert, () => alreadyThere('email', { key: 'people.email.taken', params: { email } }))
  return requirePerson(db, id)
}
