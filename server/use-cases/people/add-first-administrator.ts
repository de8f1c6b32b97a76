import { randomInt } from 'node:crypto'
import type { AppContext } from '../../context'
import { selectPeople } from '../../db/people'
import { addPerson } from './add-person'

const alphabet = 'abcdefghjkmnpqrstuvwxyz23456789'
const email = 'admin@shop.example'

/** The account from which an empty shop is set up. Its password is made up here and shown once, at the start. */
export async function addFirstAdministrator(
  context: AppContext,
): Promise<{ email: string; password: string } | null> {
  if (selectPeople(context.db).length > 0) return null
  const password = newPassword()
  await addPerson(context, null, { name: 'Administrator', email, password, roles: ['admin'] })
  return { email, password }
}

/** Four groups of five letters: 99 random bits. */
function newPassword(): string {
  const letter = () => alphabet[randomInt(alphabet.length)]
  const group = () => Array.from({ length: 5 }, letter).join('')
  return Array.from({ length: 4 }, group).join('-')
}
