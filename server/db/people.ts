import type { Role } from '@shared/access/permissions'
import type { Person } from '@shared/schemas/people'
import { asc, eq } from 'drizzle-orm'
import { notFound } from '../errors'
import type { Connection, Tx } from './client'
import { people, personRoles } from './schema/people'

/** Everybody with an account, by name; never with the hash of their password. */
export function selectPeople(db: Connection): Person[] {
  const roles = db.select().from(personRoles).all()
  return db
    .select()
    .from(people)
    .orderBy(asc(people.name), asc(people.id))
    .all()
    .map((row) =>
      toPerson(
        row,
        roles.filter(({ personId }) => personId === row.id).map(({ role }) => role),
      ),
    )
}

export function requirePerson(db: Connection, id: string): Person {
  const row = db.select().from(people).where(eq(people.id, id)).get()
  if (!row) throw notFound('person')
  return toPerson(row, selectRoles(db, id))
}

export function writeRoles(tx: Tx, personId: string, roles: readonly Role[]): void {
  tx.delete(personRoles).where(eq(personRoles.personId, personId)).run()
  tx.insert(personRoles)
    .values([...new Set(roles)].map((role) => ({ personId, role })))
    .run()
}

function selectRoles(db: Connection, personId: string): Role[] {
  return db
    .select({ role: personRoles.role })
    .from(personRoles)
    .where(eq(personRoles.personId, personId))
    .all()
    .map(({ role }) => role)
}

function toPerson(row: typeof people.$inferSelect, roles: Role[]): Person {
  const { passwordHash: _passwordHash, ...person } = row
  return { ...person, roles: roles.sort() }
}
